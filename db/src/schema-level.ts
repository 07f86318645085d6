import { readFileSync } from 'node:fs';
import { join } from 'node:path';

/** Number of migrations that this code was built for. The path is the same from src and from dist. */
export function expectedSchemaLevel(): number {
  const journal: unknown = JSON.parse(readFileSync(join(__dirname, '..', 'migrations', 'meta', '_journal.json'), 'utf8'));
  if (typeof journal === 'object' && journal !== null && 'entries' in journal && Array.isArray(journal.entries))
    return journal.entries.length;
  throw new Error('the journal of migrations lists no entries');
}
