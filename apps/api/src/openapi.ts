import 'reflect-metadata';
import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { NestFactory } from '@nestjs/core';
import type { NestFastifyApplication } from '@nestjs/platform-fastify';
import { DocumentBuilder, getSchemaPath, type OpenAPIObject, SwaggerModule } from '@nestjs/swagger';
import { AppModule } from './app.module';
import { configureApp, createAdapter } from './app.setup';
import { ProblemDto } from './common/errors/problem.dto';
import { PROBLEMS } from './common/errors/problem-catalogue';
import { problemPage } from './common/errors/problem-page';
import { readEnv } from './config/env.validation';

/** The same folder from src and from dist. */
const ROOT = join(__dirname, '..', '..', '..');

/** Writes what the api says of itself: its operations for the client, its problems for people. Opens no connection and listens nowhere. */
async function writeDescription(): Promise<void> {
  const env = readEnv({ NODE_ENV: 'test', LOG_LEVEL: 'silent' });
  const app = await NestFactory.create<NestFastifyApplication>(AppModule.register(env), createAdapter(env), { logger: ['error'] });
  await configureApp(app);
  const settings = new DocumentBuilder().setTitle('Proofplate').setVersion('1').addBearerAuth().build();
  const description = withProblems(SwaggerModule.createDocument(app, settings, { extraModels: [ProblemDto] }));
  writeFileSync(join(ROOT, 'packages', 'api-client', 'openapi.json'), `${JSON.stringify(description, null, 2)}\n`);
  writeFileSync(join(ROOT, 'docs', 'problems.md'), problemPage(PROBLEMS));
  await app.close();
}

/** Every operation may answer with a problem. */
function withProblems(description: OpenAPIObject): OpenAPIObject {
  const content = { 'application/problem+json': { schema: { $ref: getSchemaPath(ProblemDto) } } };
  for (const path of Object.values(description.paths)) {
    for (const operation of [path.get, path.put, path.post, path.patch, path.delete]) {
      if (operation !== undefined) operation.responses.default = { description: 'A problem, as docs/problems.md lists them', content };
    }
  }
  return description;
}

writeDescription().catch((error: unknown) => {
  console.error(error);
  process.exit(1);
});
