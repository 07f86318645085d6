import { stepNumbers, type TypedMachine } from '@proofplate/recipe-model';
import { emptyPlan, type PlanValues } from './plan-values';
import { plannedSetting } from './planned-setting';

const machine: TypedMachine = {
  panel: {
    fields: [
      { parameter: 'powerPercent', label: 'Power', unit: 'percentFromZero', minimum: 0, maximum: 100, step: 1 },
      { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s', minimum: 1, maximum: 5000, step: 10 },
      { parameter: 'lineSpacingUm', label: 'Line spacing', unit: 'mm', step: 0.001 },
    ],
  },
  physical: { sourceKind: 'co2', wavelengthNm: 10_600, ratedPowerW: 40, m2: 1.2, beamDiameterMm: 6 },
};
const plan = (given: Partial<PlanValues> = {}): PlanValues => ({
  ...emptyPlan(),
  rows: { parameter: 'speedMmPerS', from: '100', to: '300', count: '3', spacing: 'steps' },
  columns: { parameter: 'powerPercent', from: '10', to: '50', count: '5', spacing: 'steps' },
  base: { values: { lineSpacingUm: '0.1' }, fill: 'both directions', assist: 'none' },
  ...given,
});
const doseAt = (values: PlanValues, row: number, column: number) => {
  const setting = plannedSetting(values, machine, { place: { row, column }, locale: 'en-GB' });
  const optics = { physical: machine.physical, focalLengthMm: 100, measuredSpotUm: null };
  return stepNumbers(setting, { optics }).numbers.find(({ key }) => key === 'arealDose');
};

describe('plannedSetting()', () => {
  it('takes the levels of the row and the column, and the base for the rest', () => {
    // 40 % of 40 W at 200 mm/s and 0.1 mm: 16 / (200 · 0.1)
    expect(doseAt(plan(), 1, 3)?.value).toBeCloseTo(0.8, 9);
  });

  it('stays at the last level where the plan has fewer than the place', () => {
    expect(doseAt(plan(), 9, 9)?.value).toBeCloseTo(20 / (300 * 0.1), 9);
  });

  it('gives no dose while a factor is not typed to its end, but says what is missing', () => {
    const half = plan({ rows: { parameter: 'speedMmPerS', from: '100', to: '', count: '3', spacing: 'steps' } });
    expect(doseAt(half, 0, 0)?.missingBecause).toBe('no scan speed is set');
  });

  it('says what the panel refuses', () => {
    const wrong = plan({ base: { values: { lineSpacingUm: '0.0125' }, fill: 'both directions', assist: 'none' } });
    expect(doseAt(wrong, 0, 0)?.missingBecause).toContain('0.012 mm or 0.013 mm');
  });
});
