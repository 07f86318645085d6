import 'reflect-metadata';
import { NestFactory } from '@nestjs/core';
import { Logger } from 'nestjs-pino';
import { readEnv } from './config/env.validation';
import { requirePatchedDriver } from './database/driver';
import { WorkerModule } from './worker.module';
import { WorkerProcess } from './worker-process';

async function start(): Promise<void> {
  requirePatchedDriver();
  const app = await NestFactory.createApplicationContext(WorkerModule.register(readEnv()), { bufferLogs: true });
  const logger = app.get(Logger);
  app.useLogger(logger);
  app.enableShutdownHooks();
  await app.get(WorkerProcess).start();
  logger.log('taking jobs', 'Worker');
}

start().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  process.exit(1);
});
