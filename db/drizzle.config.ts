import { defineConfig } from 'drizzle-kit';

export default defineConfig({
  dialect: 'postgresql',
  schema: './src/schema/index.ts',
  // The check for a forgotten migration writes into a copy.
  out: process.env.PROOFPLATE_MIGRATIONS_OUT ?? './migrations',
  casing: 'snake_case',
  strict: true,
  verbose: true,
});
