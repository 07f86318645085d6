import type { Criterion, MarkStep, ParameterSet } from '@proofplate/recipe-model';
import { criterionResults, essentialDifferences, meetsAll, newestOf, stepsMarkedBy } from './evidence-judgement';

const DARK: Criterion = { quantity: 'lightness', comparison: 'at most', value: 30, unit: '1' };
const GRADE: Criterion = { quantity: 'code-grade', comparison: 'at least', value: 3, unit: '1' };
const measured = (value: number | null, given: object = {}) => ({
  quantity: 'lightness',
  value,
  grade: null,
  unit: '1',
  method: 'colorimeter',
  ...given,
});
const set = (speed: number, given: Partial<ParameterSet> = {}): ParameterSet => ({
  values: {
    powerPercent: { entered: { value: 30, unit: 'percentFromZero' }, physical: 30 },
    speedMmPerS: { entered: { value: speed, unit: 'mm/s' }, physical: speed },
  },
  fill: 'both directions',
  assist: 'none',
  power: { watts: 6, basis: 'calibration' },
  ...given,
});
const step = (parameters: ParameterSet): MarkStep => ({ purpose: 'fill', parameters, pauseAfterS: 0 });

describe('criterionResults()', () => {
  it('lets the newest reading of an instrument count before an estimate from a photo', () => {
    const newestFirst = [measured(20, { method: 'photo' }), measured(28), measured(35)];
    expect(criterionResults([DARK], newestFirst)).toMatchObject([{ value: 28, method: 'colorimeter', meets: true }]);
    expect(criterionResults([DARK], newestFirst.slice(0, 1))).toMatchObject([{ value: 20, method: 'photo', meets: true }]);
  });

  it('does not count what was not measured, or in another unit, as met', () => {
    expect(criterionResults([DARK], [])).toMatchObject([{ value: null, method: null, meets: false }]);
    expect(criterionResults([DARK], [measured(20, { unit: '%' })])).toMatchObject([{ value: null, meets: false }]);
  });

  it('takes a code grade from a verifier only, by its letter or its number', () => {
    const grade = (letter: string, method: string) => measured(null, { quantity: 'code-grade', grade: letter, method });
    expect(criterionResults([GRADE], [grade('A', 'photo')])).toMatchObject([{ meets: false }]);
    expect(criterionResults([GRADE], [grade('b', 'verifier')])).toMatchObject([{ value: 3, meets: true }]);
    expect(criterionResults([GRADE], [grade('C', 'verifier')])).toMatchObject([{ value: 2, meets: false }]);
    expect(criterionResults([GRADE], [grade('?', 'verifier')])).toMatchObject([{ value: null, meets: false }]);
  });
});

describe('meetsAll()', () => {
  it('is unknown without criteria and fails with one that is not met', () => {
    expect(meetsAll([])).toBeNull();
    expect(meetsAll(criterionResults([DARK], [measured(10)]))).toBe(true);
    expect(meetsAll(criterionResults([DARK, GRADE], [measured(10)]))).toBe(false);
  });
});

describe('essentialDifferences()', () => {
  it('names essential parameters only; the same speed in another unit is the same', () => {
    const inMetres = set(400, { assist: 'air' });
    inMetres.values.speedMmPerS = { entered: { value: 0.4, unit: 'm/s' }, physical: 400 };
    expect(essentialDifferences(inMetres, [step(set(400))])).toEqual([]);
    expect(essentialDifferences(set(300, { fill: 'crossed' }), [step(set(400))])).toEqual(['Scan speed', 'Fill']);
  });

  it('compares with the nearest of several steps', () => {
    expect(essentialDifferences(set(800), [step(set(400)), step(set(800))])).toEqual([]);
    expect(stepsMarkedBy(set(800), [step(set(400)), step(set(800)), step(set(800))])).toEqual([1, 2]);
  });

  it('never takes an unknown fill for the same, nor anything for a setting without steps', () => {
    expect(essentialDifferences(set(400), [step(set(400))], ['fill'])).toEqual(['Fill (not known)']);
    expect(essentialDifferences(set(400), [])).toEqual(['No mark step is set']);
  });
});

describe('newestOf()', () => {
  it('gives the value that counts for a quantity, or none', () => {
    expect(newestOf([measured(20, { method: 'photo' }), measured(28)], 'lightness', '1')).toBe(28);
    expect(newestOf([measured(20)], 'contrast', '1')).toBeNull();
  });
});
