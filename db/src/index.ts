export { assertPatchedDriver, ConnectionWaitError, createDb, type Db, type DbHandle, type DbOptions, migrateAll, type Tx } from './client';
export * as schema from './schema';
export { expectedSchemaLevel } from './schema-level';
