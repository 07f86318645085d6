export * as schema from './schema';
