import type { ModuleMetadata } from '@nestjs/common';
import type { NestFastifyApplication } from '@nestjs/platform-fastify';
import { Test } from '@nestjs/testing';
import { cloneDatabase, type TestDatabase } from '@proofplate/db/testing';
import { AppModule } from '../../src/app.module';
import { configureApp, createAdapter } from '../../src/app.setup';
import { type Env, readEnv } from '../../src/config/env.validation';
import { UnitOfWork } from '../../src/database/unit-of-work';

export type TestApp = {
  readonly app: NestFastifyApplication;
  readonly env: Env;
  readonly database: TestDatabase;
  readonly unitOfWork: UnitOfWork;
  readonly close: () => Promise<void>;
};

/** bcrypt's lowest cost: tests are about behaviour, not about how long guessing takes. */
/** A busy machine must not turn a slow statement into another answer; the deadlines themselves have tests of their own. */
const PATIENT = { DATABASE_STATEMENT_TIMEOUT_MS: '30000', DATABASE_LOCK_TIMEOUT_MS: '20000', DATABASE_ACQUIRE_TIMEOUT_MS: '20000' };
const TEST_PASSWORD_COST = '4';

/** The whole api on a database of its own. Call once per test file, close it in afterAll. */
export async function createTestApp(
  options: {
    readonly env?: Readonly<Record<string, string>>;
    readonly imports?: ModuleMetadata['imports'];
    /** Hears of every route as it is registered. */
    readonly onRoute?: (route: { readonly method: string | string[]; readonly url: string }) => void;
  } = {},
): Promise<TestApp> {
  const database = await cloneDatabase();
  const env = readEnv({
    NODE_ENV: 'test',
    LOG_LEVEL: 'silent',
    PASSWORD_COST: TEST_PASSWORD_COST,
    ...PATIENT,
    DATABASE_URL: database.app,
    WORKER_DATABASE_URL: database.worker,
    ...options.env,
  });
  const testing = await Test.createTestingModule({ imports: [AppModule.register(env), ...(options.imports ?? [])] }).compile();
  const app = testing.createNestApplication<NestFastifyApplication>(createAdapter(env), { logger: false });
  const { onRoute } = options;
  if (onRoute !== undefined)
    app
      .getHttpAdapter()
      .getInstance()
      .addHook('onRoute', ({ method, url }) => onRoute({ method, url }));
  await configureApp(app);
  await app.init();
  await app.getHttpAdapter().getInstance().ready();
  const close = async () => {
    await app.close();
    await database.drop();
  };
  return { app, env, database, unitOfWork: app.get(UnitOfWork), close };
}
