import type { PanelField } from '@proofplate/recipe-model';
import { panelProblems, physicalProblems } from './profile-problems';

const power: PanelField = { parameter: 'powerPercent', label: 'Power', unit: 'percentFromZero', minimum: 0, maximum: 100, step: 0.1 };
const speed: PanelField = { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s' };
const pointers = (fields: PanelField[]) => panelProblems({ fields }).map(({ pointer }) => pointer);

describe('panelProblems', () => {
  it('accepts fields that convert', () => {
    const spacing: PanelField = { parameter: 'lineSpacingUm', label: 'Density', unit: 'lpi', minimum: 100, maximum: 2000 };
    const shared: PanelField = { parameter: 'speedMmPerS', label: 'Speed', unit: 'percentFromMinimum', rangeLow: 20, rangeHigh: 2000 };
    const watts: PanelField = { parameter: 'powerPercent', label: 'Power', unit: 'W', rangeHigh: 30 };
    const pulses: PanelField = { parameter: 'frequencyKhz', label: 'Pulses', unit: 'ppi' };
    expect(pointers([power, speed, spacing])).toEqual([]);
    expect(pointers([watts, shared, pulses])).toEqual([]);
  });

  it('names the second field of one parameter', () => {
    expect(pointers([power, speed, { ...power, label: 'Power 2' }])).toEqual(['#/panel/fields/2/parameter']);
  });

  it('refuses a unit that the parameter is not measured in', () => {
    expect(pointers([{ ...speed, unit: 'kHz' }])).toEqual(['#/panel/fields/0/unit']);
  });

  it('refuses limits the wrong way round', () => {
    expect(pointers([{ ...power, minimum: 100, maximum: 0 }])).toEqual(['#/panel/fields/0/maximum']);
    expect(pointers([{ ...speed, unit: 'percentFromZero', rangeLow: 2000, rangeHigh: 20 }])).toEqual(['#/panel/fields/0/rangeHigh']);
  });

  it('refuses a percentage of a range that nobody named', () => {
    expect(pointers([{ ...speed, unit: 'percentFromZero' }])).toEqual(['#/panel/fields/0/rangeHigh']);
    expect(panelProblems({ fields: [{ parameter: 'powerPercent', label: 'Power', unit: 'W' }] })).toEqual([
      { pointer: '#/panel/fields/0/rangeHigh', detail: expect.stringContaining('how many watts') },
    ]);
  });
});

describe('physicalProblems', () => {
  it('refuses ranges that end before they begin', () => {
    const profile = { sourceKind: 'fibre-mopa', wavelengthNm: 1064, ratedPowerW: 20 } as const;
    expect(physicalProblems(profile)).toEqual([]);
    const crossed = { ...profile, frequencyRangeKhz: { from: 100, to: 1 }, pulseWidthRangeNs: { from: 200, to: 4 } };
    expect(physicalProblems(crossed).map(({ pointer }) => pointer)).toEqual([
      '#/physical/frequencyRangeKhz/to',
      '#/physical/pulseWidthRangeNs/to',
    ]);
  });
});
