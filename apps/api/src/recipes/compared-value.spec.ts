import { type SetValue, sameValue } from '@proofplate/recipe-model';
import { compareSides, type Side } from './compared-value';

const number = (value: number): Side => ({ kind: 'number', value, text: String(value) });
const setting = (value: number, set: SetValue): Side => ({ kind: 'setting', value, set, isSameAs: (other) => sameValue(set, other) });
const NOT_SET: Side = { kind: 'absent', missingBecause: null };
const UNKNOWN: Side = { kind: 'absent', missingBecause: 'M² is not known.' };
const compared = (reference: Side, other: Side, unit = 'W') =>
  compareSides([reference, other], { ids: ['a', 'b'], referenceAt: 0, unit })[1];

describe('compareSides()', () => {
  it('marks the reference and counts the others from it', () => {
    const values = compareSides([number(12), number(10)], { ids: ['a', 'b'], referenceAt: 1, unit: 'W' });
    expect(values).toMatchObject([
      { revisionId: 'a', change: 'changed', size: { delta: 2, percent: 20, points: null, symbol: 'W' } },
      { revisionId: 'b', change: 'reference', size: null },
    ]);
  });

  it('sees no change between equal quantities in other units, nor in noise', () => {
    const slow = setting(800, { entered: { value: 800, unit: 'mm/s' }, physical: 800 });
    const same = setting(800, { entered: { value: 0.8, unit: 'm/s' }, physical: 800 });
    expect(compared(slow, same, 'mm/s')).toMatchObject({ change: 'same', size: null });
    expect(compared(number(0.3), number(0.1 + 0.2))).toMatchObject({ change: 'same' });
  });

  it('tells percents in points, and a change from zero without a percent', () => {
    expect(compared(number(60), number(50), '%')?.size).toEqual({ delta: -10, symbol: '%', percent: null, points: -10 });
    expect(compared(number(0), number(5), 's')?.size).toEqual({ delta: 5, symbol: 's', percent: null, points: null });
  });

  it('keeps "not set" apart from "not known"', () => {
    expect(compared(NOT_SET, number(1))?.change).toBe('added');
    expect(compared(number(1), NOT_SET)?.change).toBe('removed');
    expect(compared(number(1), UNKNOWN)).toMatchObject({ change: 'not comparable', value: null, missingBecause: 'M² is not known.' });
    expect(compared(UNKNOWN, UNKNOWN)?.change).toBe('same');
    expect(compared({ kind: 'word', text: 'None' }, { kind: 'word', text: 'Air' })).toMatchObject({
      change: 'changed',
      text: 'Air',
      size: null,
    });
  });
});
