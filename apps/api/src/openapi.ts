import 'reflect-metadata';
import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { NestFactory } from '@nestjs/core';
import type { NestFastifyApplication } from '@nestjs/platform-fastify';
import { DocumentBuilder, SwaggerModule } from '@nestjs/swagger';
import { AppModule } from './app.module';
import { configureApp, createAdapter } from './app.setup';
import { readEnv } from './config/env.validation';

/** Same path from src and from dist. */
const TARGET = join(__dirname, '..', '..', '..', 'packages', 'api-client', 'openapi.json');

/** Writes the description of the api. Opens no connection and listens nowhere. */
async function writeDescription(): Promise<void> {
  const env = readEnv({ NODE_ENV: 'test', LOG_LEVEL: 'silent' });
  const app = await NestFactory.create<NestFastifyApplication>(AppModule.register(env), createAdapter(env), { logger: ['error'] });
  await configureApp(app);
  const settings = new DocumentBuilder().setTitle('Proofplate').setVersion('1').addBearerAuth().build();
  const description = SwaggerModule.createDocument(app, settings);
  writeFileSync(TARGET, `${JSON.stringify(description, null, 2)}\n`);
  await app.close();
}

writeDescription().catch((error: unknown) => {
  console.error(error);
  process.exit(1);
});
