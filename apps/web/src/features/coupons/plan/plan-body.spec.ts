import type { Panel } from '@proofplate/recipe-model';
import { type PlanProfile, planBody } from './plan-body';
import { emptyPlan, factorsFor, type PlanValues } from './plan-values';

const panel: Panel = {
  fields: [
    { parameter: 'powerPercent', label: 'Power', unit: 'percentFromZero', minimum: 0, maximum: 100, step: 1 },
    { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s', minimum: 1, maximum: 5000, step: 10 },
    { parameter: 'lineSpacingUm', label: 'Line spacing', unit: 'mm', step: 0.001 },
  ],
};
const profile: PlanProfile = {
  panel,
  physical: { sourceKind: 'co2', wavelengthNm: 10_600, ratedPowerW: 60, m2: 1.2, beamDiameterMm: 7 },
};
const plan = (given: Partial<PlanValues> = {}): PlanValues => ({
  ...emptyPlan(),
  ...{ materialId: 'm', finishId: 'f', effectId: 'e', machineId: 'x', lensId: 'l' },
  rows: { parameter: 'speedMmPerS', from: '100', to: '1 m/s', count: '8', spacing: 'ratios' },
  columns: { parameter: 'powerPercent', from: '15', to: '60', count: '10', spacing: 'steps' },
  base: { values: { lineSpacingUm: '12 um', powerPercent: 'left over' }, fill: 'both directions', assist: 'none' },
  hasLabelStep: false,
  ...given,
});
const bodyOf = (values: PlanValues, locale = 'en-GB') => {
  const read = planBody(values, profile, locale);
  if (!('body' in read)) throw new Error(JSON.stringify(read.messages));
  return read.body;
};
const namesOf = (values: PlanValues) => {
  const read = planBody(values, profile, 'en-GB');
  return 'messages' in read ? read.messages.map(({ name }) => name) : [];
};

describe('planBody()', () => {
  it('gives levels in the panel’s unit and base values in the unit that was typed', () => {
    expect(bodyOf(plan())).toMatchObject({
      rows: { parameter: 'speedMmPerS', from: 100, to: 1000, count: 8, spacing: 'ratios' },
      base: { values: { lineSpacingUm: { value: 12, unit: 'um' } } },
      cellMm: 5,
      gapMm: 1.2,
      thicknessMm: null,
    });
  });

  it('leaves what varies out of the base setting, and the line spacing out of an outline', () => {
    expect(Object.keys(bodyOf(plan()).base.values)).toEqual(['lineSpacingUm']);
    const outline = plan({ base: { values: { lineSpacingUm: '0.012' }, fill: 'outline', assist: 'none' } });
    expect(bodyOf(outline).base.values).toEqual({});
  });

  it('makes one row where nothing varies down the rows', () => {
    expect(
      bodyOf(
        plan({ rows: { ...plan().rows, parameter: '' }, base: { ...plan().base, values: { lineSpacingUm: '12 um', speedMmPerS: '800' } } }),
      ),
    ).not.toHaveProperty('rows');
  });

  it('sends the seed only for a random order', () => {
    expect(bodyOf(plan({ isRandom: true, runOrderSeed: 7 })).runOrderSeed).toBe(7);
    expect(bodyOf(plan({ isRandom: false, runOrderSeed: 7 })).runOrderSeed).toBeNull();
  });

  it('reads a decimal comma where the shop writes one', () => {
    const values = plan({ gapMm: '1,5', base: { values: { lineSpacingUm: '0,012' }, fill: 'crossed', assist: 'none' } });
    expect(bodyOf(values, 'de-DE')).toMatchObject({ gapMm: 1.5, base: { values: { lineSpacingUm: { value: 0.012, unit: 'mm' } } } });
  });

  it('names every value that a setting cannot do without, in all its cells and in its labels', () => {
    const bare = plan({ base: { values: {}, fill: 'both directions', assist: 'none' }, hasLabelStep: true });
    expect(namesOf(bare)).toEqual([
      'base.values.lineSpacingUm',
      ...['labelStep.values.powerPercent', 'labelStep.values.speedMmPerS', 'labelStep.values.lineSpacingUm'],
    ]);
  });

  it('says every wrong field at once', () => {
    const wrong = plan({
      ...{ materialId: '', cellMm: 'wide' },
      rows: { parameter: 'speedMmPerS', from: '105', to: '', count: '99', spacing: 'steps' },
      base: { values: { lineSpacingUm: '0.0125' }, fill: 'both directions', assist: 'none' },
    });
    expect(namesOf(wrong)).toEqual(['materialId', 'rows.from', 'rows.to', 'rows.count', 'base.values.lineSpacingUm', 'cellMm']);
  });
});

describe('factorsFor()', () => {
  it('begins with speed and power, and keeps what still fits another panel', () => {
    expect(factorsFor(panel, emptyPlan())).toEqual({ rows: 'speedMmPerS', columns: 'powerPercent' });
    expect(factorsFor(panel, plan({ rows: { ...plan().rows, parameter: 'lineSpacingUm' } }))).toEqual({
      rows: 'lineSpacingUm',
      columns: 'powerPercent',
    });
    expect(factorsFor(panel, plan({ rows: { ...plan().rows, parameter: 'pulseWidthNs' } }))).toEqual({
      rows: 'speedMmPerS',
      columns: 'powerPercent',
    });
  });
});
