import { readdirSync, readFileSync } from 'node:fs';
import { basename, join } from 'node:path';
import { checkRecords } from './check-records';
import { differences } from './compare';
import type { Json } from './number-record';
import { FORMULAS } from './registry';
import { reportLines } from './report';

const REFERENCE_FOLDERS = ['physics', 'imaging'].map((name) => join(__dirname, `../../../../packages/${name}/test/reference`));
const REFERENCE_FILES = REFERENCE_FOLDERS.flatMap((folder) => readdirSync(folder).map((file) => join(folder, file))).filter((file) =>
  file.endsWith('.json'),
);
const irradiance = {
  name: 'a small spot',
  formula: 'I=P/(pi*d^2/4)',
  inputs: { P_W: 0.0008, d_um: 1 },
  expected: { I_W_mm2: 1018.59163579 },
  tolerance: { rel: 1e-6 },
};

describe('differences', () => {
  it('allows numbers their relative or absolute tolerance and no more', () => {
    expect(differences({ a: 100.00001 }, { a: 100 }, { rel: 1e-6 })).toEqual([]);
    expect(differences({ a: 100.001 }, { a: 100 }, { rel: 1e-6 })).toEqual(['a: expected 100, got 100.001']);
    expect(differences({ a: 1.04 }, { a: 1 }, { abs: 0.05 })).toEqual([]);
    expect(differences({ a: 1.06 }, { a: 1 }, { abs: 0.05 })).toHaveLength(1);
    expect(differences({ a: 4 }, { a: 4 }, { abs: 0 })).toEqual([]);
  });

  it('allows rounding where zero is expected, and no not-a-number anywhere', () => {
    expect(differences({ a: 1e-16 }, { a: 0 }, { rel: 1e-6 })).toEqual([]);
    expect(differences({ a: 1e-9 }, { a: 0 }, { rel: 1e-6 })).toHaveLength(1);
    expect(differences({ a: Number.NaN }, { a: 1 }, { abs: 10 })).toEqual(['a: expected 1, got NaN']);
  });

  it('goes into lists and objects and names the place', () => {
    expect(differences({ a: [1, 2] }, { a: [1, 3] }, { rel: 0.1 })).toEqual(['a[1]: expected 3, got 2']);
    expect(differences({ a: [1] }, { a: [1, 3] }, { rel: 0.1 })).toHaveLength(1);
    expect(differences({ a: { b: 1 } }, { a: { b: 2 } }, {})).toEqual(['a.b: expected 2, got 1']);
  });

  it('wants texts, truth values and null as they are, and misses what is absent', () => {
    expect(differences({ a: '4B', b: true, c: null }, { a: '4B', b: true, c: null }, { rel: 1 })).toEqual([]);
    expect(differences({ a: '4B', b: true }, { a: '3B', b: false, c: null }, { rel: 1 })).toHaveLength(3);
    expect(differences({}, { a: 1 }, { rel: 1 })).toEqual(['a: expected 1, got nothing']);
  });
});

describe('check-numbers', () => {
  it.each(REFERENCE_FILES.map((file) => [basename(file), file]))('passes every record of %s', (_name, file) => {
    const records: readonly Json[] = JSON.parse(readFileSync(file, 'utf8'));
    const results = checkRecords(records, FORMULAS);
    expect(results.length).toBeGreaterThan(0);
    expect(results.filter((result) => result.failures.length > 0)).toEqual([]);
  });

  it('has a reference record for every formula that it knows', () => {
    const known = REFERENCE_FILES.flatMap((file) => JSON.parse(readFileSync(file, 'utf8')) as { formula: string }[]);
    const formulas = new Set(known.map(({ formula }) => formula));
    expect(FORMULAS.map(({ formula }) => formula).filter((formula) => !formulas.has(formula))).toEqual([]);
  });

  it('registers no formula twice', () => {
    expect(new Set(FORMULAS.map((entry) => entry.formula)).size).toBe(FORMULAS.length);
  });

  it('fails a wrong number, an unknown formula, a missing input and an unreadable record, each by name', () => {
    const records: readonly Json[] = [
      irradiance,
      { ...irradiance, name: 'wrong', expected: { I_W_mm2: 1000 } },
      { ...irradiance, name: 'stranger', formula: 'x=y' },
      { ...irradiance, name: 'poor', inputs: { P_W: 1 } },
      { ...irradiance, name: 'empty', expected: {} },
      { ...irradiance, name: 'rich', inputs: { ...irradiance.inputs, theta_deg: 10 } },
      { ...irradiance, name: 'vague', tolerance: { minCorrectDigits: 6 } },
      { ...irradiance, name: 'impossible', inputs: { P_W: 1, d_um: -5 } },
      { ...irradiance, name: 'wordy', inputs: { P_W: '1', d_um: 5 } },
      { name: 'nameless formula', inputs: {}, expected: { a: 1 } },
      'no record',
    ];
    const lines = reportLines(checkRecords(records, FORMULAS));
    expect(lines).toEqual([
      '1 of 6 passed  I=P/(pi*d^2/4)',
      '0 of 1 passed  x=y',
      '0 of 4 passed  unreadable record',
      expect.stringMatching(/^FAILED wrong: I_W_mm2: expected 1000, got 1018\.59/),
      'FAILED stranger: unknown formula: x=y',
      'FAILED poor: input d_um must be a number, but is missing',
      'FAILED empty: record "empty" expects nothing',
      'FAILED rich: unknown input: theta_deg',
      'FAILED vague: record "vague" has an unknown tolerance: minCorrectDigits',
      'FAILED impossible: spotDiameterUm must be a finite number above 0, but is -5',
      'FAILED wordy: input P_W must be a number, but is "1"',
      'FAILED nameless formula: record "nameless formula" has no formula',
      'FAILED "no record": a record is not an object',
      '1 passed, 10 failed',
    ]);
  });
});
