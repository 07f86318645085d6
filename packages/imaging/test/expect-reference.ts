import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';

type ReferenceRecord<Inputs> = {
  readonly name: string;
  readonly formula: string;
  readonly inputs: Inputs;
  readonly expected: Readonly<Record<string, number>>;
  readonly tolerance: { readonly rel?: number; readonly abs?: number };
};

const FOLDER = join(__dirname, 'reference');

/** One test for each reference record of `formula`: every number it states must come out. */
export function expectReferences<Inputs>(formula: string, compute: (inputs: Inputs) => Readonly<Record<string, number>>): void {
  const records = readdirSync(FOLDER)
    .filter((file) => file.endsWith('.json'))
    // JSON has no types of its own: the shape is the caller's claim, and the spec fails when it is wrong.
    .flatMap((file) => JSON.parse(readFileSync(join(FOLDER, file), 'utf8')) as ReferenceRecord<Inputs>[])
    .filter((record) => record.formula === formula);
  if (records.length === 0) throw new Error(`no reference record of "${formula}"`);
  it.each(records.map((record) => [JSON.stringify(record.inputs), record] as const))(
    'gives the reference numbers for %s',
    (_inputs, record) => {
      const actual = compute(record.inputs);
      for (const [key, expected] of Object.entries(record.expected)) {
        const allowed = record.tolerance.abs ?? (record.tolerance.rel ?? 0) * Math.abs(expected);
        expect(Math.abs(actual[key] - expected)).toBeLessThanOrEqual(allowed);
      }
    },
  );
}
