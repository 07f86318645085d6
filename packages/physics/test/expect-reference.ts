import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';

export type ReferenceRecord<Inputs, Expected> = {
  readonly name: string;
  readonly formula: string;
  readonly inputs: Inputs;
  readonly expected: Expected;
  readonly tolerance: { readonly rel?: number; readonly abs?: number };
  readonly source: string;
};

type Numbers = Readonly<Record<string, number>>;

const FOLDER = join(__dirname, 'reference');

/** Reference records of one model. The caller states the shape, because the files carry many. */
export function referenceRecords<Inputs, Expected>(name: string): readonly ReferenceRecord<Inputs, Expected>[] {
  const found = readdirSync(FOLDER)
    .filter((file) => file.endsWith('.json'))
    // JSON has no types of its own: the shape is the caller's claim, and each spec fails when it is wrong.
    .flatMap((file) => JSON.parse(readFileSync(join(FOLDER, file), 'utf8')) as ReferenceRecord<Inputs, Expected>[])
    .filter((record) => record.name === name);
  if (found.length === 0) throw new Error(`no reference record named "${name}"`);
  return found;
}

/** Fails unless `actual` lies within the record's relative tolerance of `expected`. */
export function expectWithin(actual: number, expected: number, relative: number): void {
  expect(Math.abs(actual - expected)).toBeLessThanOrEqual(relative * Math.abs(expected));
}

/** One test for each reference record of `name` that states the number `key`. */
export function expectReference(name: string, key: string, compute: (inputs: Numbers) => number): void {
  const records = referenceRecords<Numbers, Numbers>(name).filter((record) => key in record.expected);
  it.each(records.map((record) => [JSON.stringify(record.inputs), record] as const))(
    `gives the reference ${key} for %s`,
    (_inputs, record) => {
      expectWithin(compute(record.inputs), record.expected[key], record.tolerance.rel ?? 0);
    },
  );
}

/** One test for each reference record of `name`: every key it states must come out, lists element by element. */
export function expectReferences<Inputs>(name: string, compute: (inputs: Inputs) => Readonly<Record<string, unknown>>): void {
  const records = referenceRecords<Inputs, Readonly<Record<string, unknown>>>(name);
  it.each(records.map((record) => [JSON.stringify(record.inputs), record] as const))(
    'gives the reference numbers for %s',
    (_inputs, record) => {
      const actual = compute(record.inputs);
      for (const [key, expected] of Object.entries(record.expected)) {
        if (typeof expected === 'number') expectWithin(Number(actual[key]), expected, record.tolerance.rel ?? 0);
        else if (Array.isArray(expected)) expectListWithin(actual[key], expected, record.tolerance.rel ?? 0);
        else expect(actual[key]).toBe(expected);
      }
    },
  );
}

function expectListWithin(actual: unknown, expected: readonly number[], relative: number): void {
  if (!Array.isArray(actual)) throw new Error('a list is expected');
  expect(actual).toHaveLength(expected.length);
  for (const [index, value] of expected.entries()) expectWithin(Number(actual[index]), value, relative);
}
