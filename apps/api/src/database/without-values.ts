import { DrizzleQueryError } from 'drizzle-orm';

/**
 * The same failure without the values that were sent with its statement. Drizzle writes them into message and stack, and both end up in
 * the log and in the queue's table: hashes of passwords, tokens of links, addresses.
 */
export function withoutValues(error: unknown): unknown {
  if (!(error instanceof DrizzleQueryError)) return error;
  const spoken = error.message;
  error.message = `Failed query: ${error.query}`;
  error.stack = error.stack?.replace(spoken, error.message);
  error.params = [];
  return error;
}
