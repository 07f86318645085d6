import 'reflect-metadata';
import { NestFactory } from '@nestjs/core';
import type { NestFastifyApplication } from '@nestjs/platform-fastify';
import { Logger } from 'nestjs-pino';
import { AppModule } from './app.module';
import { configureApp, createAdapter } from './app.setup';
import { readEnv } from './config/env.validation';
import { requirePatchedDriver } from './database/driver';

async function start(): Promise<void> {
  requirePatchedDriver();
  const env = readEnv();
  const app = await NestFactory.create<NestFastifyApplication>(AppModule.register(env), createAdapter(env), { bufferLogs: true });
  app.useLogger(app.get(Logger));
  await configureApp(app);
  await app.listen({ host: env.HOST, port: env.PORT });
}

start().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  process.exit(1);
});
