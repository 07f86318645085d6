import { Global, Inject, Injectable, Module, type OnApplicationShutdown } from '@nestjs/common';
import { createDb, type DbHandle } from '@proofplate/db';
import { Env } from '../config/env.validation';
import { Codes } from './codes.repository';
import { DATABASE, UnitOfWork } from './unit-of-work';

function openPool(env: Env): DbHandle {
  return createDb(env.DATABASE_URL, {
    max: env.DATABASE_POOL_SIZE,
    statementTimeoutMs: env.DATABASE_STATEMENT_TIMEOUT_MS,
    lockTimeoutMs: env.DATABASE_LOCK_TIMEOUT_MS,
    acquireTimeoutMs: env.DATABASE_ACQUIRE_TIMEOUT_MS,
  });
}

/** Closes the pool after the last request has been answered. */
@Injectable()
class DatabaseShutdown implements OnApplicationShutdown {
  constructor(@Inject(DATABASE) private readonly handle: DbHandle) {}

  async onApplicationShutdown(): Promise<void> {
    await this.handle.end();
  }
}

@Global()
@Module({
  providers: [{ provide: DATABASE, inject: [Env], useFactory: openPool }, DatabaseShutdown, UnitOfWork, Codes],
  exports: [DATABASE, UnitOfWork, Codes],
})
export class DatabaseModule {}
