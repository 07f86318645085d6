import type { MarkStep, ParameterValues } from '../vocabulary/setting';
import { type DatedCalibration, powerShift } from './power-shift';

const PROFILE = { sourceKind: 'fibre-mopa', wavelengthNm: 1064, ratedPowerW: 20 } as const;

/** Watts proportional to percent, so that the expected figures are plain arithmetic. */
const reading = (wattsPerPercent: number, measuredOn: string, conditions = { frequencyKhz: 60, pulseWidthNs: 200 }): DatedCalibration => ({
  ...conditions,
  measuredOn,
  points: [10, 50, 100].map((percent) => ({ percent, powerW: percent * wattsPerPercent })),
});

const stepAt = (powerPercent: number, frequencyKhz: number): Pick<MarkStep, 'parameters'> => {
  const typed = (physical: number) => ({ entered: { value: physical, unit: 'count' as const }, physical });
  const values: ParameterValues = { powerPercent: typed(powerPercent), frequencyKhz: typed(frequencyKhz), pulseWidthNs: typed(200) };
  return { parameters: { values, fill: 'both directions', assist: 'none', power: { watts: 1, basis: 'calibration' } } };
};

const CITED = reading(0.2, '2026-01-10');

describe('powerShift', () => {
  it('says how many percent the watts of a step have moved, with the sign', () => {
    const shift = powerShift({ profile: PROFILE, steps: [stepAt(50, 60)], cited: CITED, newer: [reading(0.18, '2026-06-01')] });
    expect(shift).toMatchObject({ stepIndex: 0, measuredOn: '2026-06-01' });
    expect(shift?.beforeW).toBeCloseTo(10, 9);
    expect(shift?.afterW).toBeCloseTo(9, 9);
    expect(shift?.shiftPercent).toBeCloseTo(-10, 9);
  });

  it('takes the newest reading that holds at the frequency of the step, and passes by one that does not', () => {
    const elsewhere = reading(0.05, '2026-07-01', { frequencyKhz: 200, pulseWidthNs: 200 });
    const shift = powerShift({
      profile: PROFILE,
      steps: [stepAt(50, 60)],
      cited: CITED,
      newer: [elsewhere, reading(0.22, '2026-06-01'), reading(0.1, '2026-05-01')],
    });
    expect(shift?.measuredOn).toBe('2026-06-01');
    expect(shift?.shiftPercent).toBeCloseTo(10, 9);
  });

  it('names the step that moved most', () => {
    const bent = {
      ...reading(0.2, '2026-06-01'),
      points: [10, 50, 100].map((percent) => ({ percent, powerW: percent === 100 ? 15 : percent * 0.2 })),
    };
    const shift = powerShift({ profile: PROFILE, steps: [stepAt(50, 60), stepAt(100, 60)], cited: CITED, newer: [bent] });
    expect(shift).toMatchObject({ stepIndex: 1 });
    expect(shift?.shiftPercent).toBeCloseTo(-25, 9);
  });

  it('compares nothing without a cited reading, without a later one, and beyond the readings of either', () => {
    const newer = [reading(0.18, '2026-06-01')];
    expect(powerShift({ profile: PROFILE, steps: [stepAt(50, 60)], cited: null, newer })).toBeNull();
    expect(powerShift({ profile: PROFILE, steps: [stepAt(50, 60)], cited: CITED, newer: [] })).toBeNull();
    expect(powerShift({ profile: PROFILE, steps: [stepAt(5, 60)], cited: CITED, newer })).toBeNull();
  });
});
