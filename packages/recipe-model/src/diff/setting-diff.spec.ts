import { type PanelUnit } from '@proofplate/physics';
import fc from 'fast-check';
import type { MarkStep, ParameterSet, SetValue } from '../vocabulary/setting';
import { parameterClassOf } from './parameter-class';
import { sameValue } from './same-value';
import { settingDiff } from './setting-diff';
import { hasEssentialChange, stepsDiff } from './steps-diff';

const value = (number: number, unit: PanelUnit, physical = number): SetValue => ({ entered: { value: number, unit }, physical });

const BASE: ParameterSet = {
  values: {
    powerPercent: value(40, 'percentFromZero'),
    speedMmPerS: value(800, 'mm/s'),
    frequencyKhz: value(60, 'kHz'),
    lineSpacingUm: value(0.03, 'mm', 30),
    passes: value(1, 'count'),
  },
  fill: 'both directions',
  assist: 'none',
  power: { watts: 8, basis: 'not calibrated' },
};
const STEP: MarkStep = { purpose: 'fill', parameters: BASE, pauseAfterS: 0 };
const withValues = (values: ParameterSet['values']): ParameterSet => ({ ...BASE, values: { ...BASE.values, ...values } });

describe('sameValue', () => {
  it('takes 0.8 m/s and 800 mm/s as the same', () => {
    expect(sameValue(value(0.8, 'm/s', 800), value(800, 'mm/s'))).toBe(true);
  });

  it('takes the same panel value as the same although the physical one was computed differently', () => {
    expect(sameValue(value(50, 'percentFromZero', 100), value(50, 'percentFromZero', 110))).toBe(true);
  });

  it('tells values apart that differ by more than 1e-9', () => {
    expect(sameValue(value(800, 'mm/s'), value(800.000002, 'mm/s'))).toBe(false);
    expect(sameValue(value(0, 'mm'), value(0, 'um'))).toBe(true);
  });
});

describe('settingDiff', () => {
  it('finds nothing between equal settings typed in different units', () => {
    expect(settingDiff(BASE, withValues({ speedMmPerS: value(0.8, 'm/s', 800), lineSpacingUm: value(30, 'um') }))).toEqual([]);
  });

  it('states both sides as entered, the signed change and its percent', () => {
    expect(settingDiff(BASE, withValues({ speedMmPerS: value(1000, 'mm/s') }))).toEqual([
      {
        item: 'speedMmPerS',
        label: 'Scan speed',
        class: 'essential',
        change: 'changed',
        before: { kind: 'value', value: value(800, 'mm/s') },
        after: { kind: 'value', value: value(1000, 'mm/s') },
        size: { delta: 200, symbol: 'mm/s', percent: 25, points: null },
      },
    ]);
  });

  it('counts percents in points, not in percent of a percent', () => {
    const [change] = settingDiff(BASE, withValues({ powerPercent: value(35.5, 'percentFromZero') }));
    expect(change.size).toEqual({ delta: -4.5, symbol: '%', percent: null, points: -4.5 });
  });

  it('compares in the stored unit where the two were typed in different ones', () => {
    const [change] = settingDiff(BASE, withValues({ lineSpacingUm: value(25, 'um') }));
    expect(change.size).toEqual({ delta: -5, symbol: 'µm', percent: -16.6666666667, points: null });
  });

  it('says added and removed, fills, assists and delays, in reading order', () => {
    const { frequencyKhz: _, ...rest } = BASE.values;
    const after: ParameterSet = {
      ...BASE,
      values: { ...rest, wobbleDiameterUm: value(50, 'um') },
      fill: 'crossed',
      assist: 'air',
      delaysUs: { jump: 200 },
    };
    const changes = settingDiff(BASE, after);
    expect(changes.map(({ item, change, class: kind }) => [item, change, kind])).toEqual([
      ['frequencyKhz', 'removed', 'essential'],
      ['wobbleDiameterUm', 'added', 'essential'],
      ['fill', 'changed', 'essential'],
      ['assist', 'changed', 'supplementary'],
      ['jumpDelayUs', 'added', 'non-essential'],
    ]);
    expect(changes[2]).toMatchObject({ before: { word: 'Both directions' }, after: { word: 'Crossed (two scans a pass)' }, size: null });
  });

  it('swaps sides and signs when read backwards', () => {
    const speeds = fc.integer({ min: 1, max: 7000 });
    fc.assert(
      fc.property(speeds, speeds, (a, b) => {
        const [before, after] = [withValues({ speedMmPerS: value(a, 'mm/s') }), withValues({ speedMmPerS: value(b, 'mm/s') })];
        const there = settingDiff(before, after);
        const back = settingDiff(after, before);
        expect(there).toHaveLength(a === b ? 0 : 1);
        expect(back).toHaveLength(there.length);
        if (there.length > 0) expect(there[0].size?.delta).toBe(-(back[0].size?.delta ?? Number.NaN));
      }),
    );
  });
});

describe('parameterClassOf', () => {
  it('lets a shop tighten a class and never loosen it', () => {
    expect(parameterClassOf('assist', { assist: 'essential' })).toBe('essential');
    expect(parameterClassOf('speedMmPerS', { speedMmPerS: 'non-essential' })).toBe('essential');
    expect(parameterClassOf('jumpDelayUs', { jumpDelayUs: 'supplementary' })).toBe('supplementary');
  });
});

describe('stepsDiff and hasEssentialChange', () => {
  it('find no change in the same steps', () => {
    expect(stepsDiff([STEP], [{ ...STEP }])).toEqual([]);
    expect(hasEssentialChange([STEP], [STEP])).toBe(false);
  });

  it('take a step more, a step less and another order as essential', () => {
    const other: MarkStep = { ...STEP, parameters: withValues({ passes: value(3, 'count') }) };
    expect(stepsDiff([STEP], [STEP, other])).toEqual([{ step: 2, change: 'added', purpose: 'Fill', changes: [] }]);
    expect(hasEssentialChange([STEP], [STEP, other])).toBe(true);
    expect(hasEssentialChange([STEP, other], [STEP])).toBe(true);
    expect(hasEssentialChange([STEP, other], [other, STEP])).toBe(true);
  });

  it('list a pause or an assist without calling it essential, unless the shop does', () => {
    const after: MarkStep = { ...STEP, pauseAfterS: 10, parameters: { ...BASE, assist: 'air' } };
    expect(stepsDiff([STEP], [after])[0].changes.map((change) => change.item)).toEqual(['assist', 'pauseAfterS']);
    expect(hasEssentialChange([STEP], [after])).toBe(false);
    expect(hasEssentialChange([STEP], [after], { pauseAfterS: 'essential' })).toBe(true);
  });

  it('do not count watts that a newer calibration would give as a change of the setting', () => {
    const after: MarkStep = { ...STEP, parameters: { ...BASE, power: { watts: 7.5, basis: 'calibration' } } };
    expect(hasEssentialChange([STEP], [after])).toBe(false);
  });
});
