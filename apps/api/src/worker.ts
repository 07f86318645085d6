import 'reflect-metadata';
import { NestFactory } from '@nestjs/core';
import { Logger } from 'nestjs-pino';
import { readEnv } from './config/env.validation';
import { requirePatchedDriver } from './database/driver';
import { WorkerModule } from './worker.module';
import { WorkerProcess } from './worker-process';

/** As many as there are jobs at once: the database's connections are for requests. */
const MOST_CONNECTIONS = 3;

async function start(): Promise<void> {
  requirePatchedDriver();
  const env = readEnv();
  env.DATABASE_POOL_SIZE = Math.min(env.DATABASE_POOL_SIZE, MOST_CONNECTIONS);
  const app = await NestFactory.createApplicationContext(WorkerModule.register(env), { bufferLogs: true });
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
