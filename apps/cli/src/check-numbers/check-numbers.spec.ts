import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { checkRecords } from './check-records';
import { differences } from './compare';
import type { Json } from './number-record';
import { FORMULAS } from './registry';
import { reportLines } from './report';

const REFERENCE = join(__dirname, '../../../../packages/physics/test/reference');
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
  it.each(readdirSync(REFERENCE).filter((file) => file.endsWith('.json')))('passes every record of %s', (file) => {
    const records: readonly Json[] = JSON.parse(readFileSync(join(REFERENCE, file), 'utf8'));
    const results = checkRecords(records, FORMULAS);
    expect(results.length).toBeGreaterThan(0);
    expect(results.filter((result) => result.failures.length > 0)).toEqual([]);
  });

  it('registers no formula twice', () => {
    expect(new Set(FORMULAS.map((entry) => entry.formula)).size).toBe(FORMULAS.length);
  });

  it('fails a wrong number, an unknown formula, a missing input and an unreadable record, each by name', () => {
    const records = [
      irradiance,
      { ...irradiance, name: 'wrong', expected: { I_W_mm2: 1000 } },
      { ...irradiance, name: 'stranger', formula: 'x=y' },
      { ...irradiance, name: 'poor', inputs: { P_W: 1 } },
      { ...irradiance, name: 'empty', expected: {} },
      'no record',
    ];
    const lines = reportLines(checkRecords(records, FORMULAS));
    expect(lines).toEqual([
      '1 of 3 passed  I=P/(pi*d^2/4)',
      '0 of 1 passed  x=y',
      '0 of 2 passed  unreadable record',
      expect.stringMatching(/^FAILED wrong: I_W_mm2: expected 1000, got 1018\.59/),
      'FAILED stranger: unknown formula: x=y',
      'FAILED poor: input d_um is not a number',
      expect.stringContaining('record "empty" expects nothing'),
      'FAILED "no record": a record is not an object',
      '1 passed, 5 failed',
    ]);
  });
});
