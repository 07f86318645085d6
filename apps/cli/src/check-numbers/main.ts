import { readFileSync } from 'node:fs';
import { checkRecords } from './check-records';
import type { Json } from './number-record';
import { FORMULAS } from './registry';
import { reportLines } from './report';

const USAGE = 'usage: npm run check:numbers -- FILE…   (each a JSON list of records)';

function main(files: readonly string[]): number {
  if (files.length === 0) {
    console.error(USAGE);
    return 2;
  }
  const results = checkRecords(files.flatMap(readRecords), FORMULAS);
  for (const line of reportLines(results)) console.log(line);
  return results.length > 0 && results.every((result) => result.failures.length === 0) ? 0 : 1;
}

/** A file that cannot be read counts as one failed record of its name. */
function readRecords(file: string): readonly Json[] {
  try {
    const json: Json = JSON.parse(readFileSync(file, 'utf8'));
    if (Array.isArray(json)) return json;
    return [`${file} is not a list of records`];
  } catch (error) {
    return [`${file}: ${error instanceof Error ? error.message : String(error)}`];
  }
}

process.exitCode = main(process.argv.slice(2));
