import type { Panel, ParameterSet } from '@proofplate/recipe-model';
import { unshowable } from './coupon-plans-confirmation.service';

const panel: Panel = {
  fields: [
    { parameter: 'powerPercent', label: 'Power', unit: 'percentFromZero', maximum: 100, step: 1 },
    { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s', maximum: 5000, step: 10 },
  ],
};
const labels = (speed: number): ParameterSet['values'] => ({
  powerPercent: { entered: { value: 40, unit: 'percentFromZero' }, physical: 40 },
  speedMmPerS: { entered: { value: speed, unit: 'mm/s' }, physical: speed },
});

describe('unshowable()', () => {
  it('lets an earlier label setting through that the panel of today still shows', () => {
    expect(unshowable(panel, { values: labels(600) })).toEqual([]);
  });

  it('names the two nearest values where the panel has another step now', () => {
    const [problem, ...others] = unshowable(panel, { values: labels(605) });
    expect(others).toEqual([]);
    expect(problem?.pointer).toBe('#/labelStep/values/speedMmPerS');
    expect(problem?.detail).toContain('Nearest that it can: 600 mm/s or 610 mm/s.');
  });
});
