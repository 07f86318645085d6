import type { Panel, PhysicalProfile } from '@proofplate/recipe-model';
import { asStored, nextProfileNumbers } from './next-profile';

const physical: PhysicalProfile = {
  sourceKind: 'fibre-mopa',
  wavelengthNm: 1064,
  ratedPowerW: 20,
  frequencyRangeKhz: { from: 1, to: 1000 },
};
const panel: Panel = { fields: [{ parameter: 'powerPercent', label: 'POWER', unit: 'percentFromZero', step: 0.5 }] };
const current = { physical, panel, number: 4, physicalNumber: 2 };

describe('nextProfileNumbers', () => {
  it('needs no new profile when nothing changed, whatever the order of the members', () => {
    const reordered = { frequencyRangeKhz: { to: 1000, from: 1 }, ratedPowerW: 20, wavelengthNm: 1064, sourceKind: 'fibre-mopa' } as const;
    expect(nextProfileNumbers(current, { physical: reordered, panel })).toBeUndefined();
  });

  it('raises only the profile number when the panel changed', () => {
    const relabelled = { fields: [{ parameter: 'powerPercent', label: 'Power', unit: 'percentFromZero', step: 0.5 }] } satisfies Panel;
    expect(nextProfileNumbers(current, { physical, panel: relabelled })).toEqual({ number: 5, physicalNumber: 2 });
  });

  it('raises both numbers when the source changed', () => {
    expect(nextProfileNumbers(current, { physical: { ...physical, ratedPowerW: 30 }, panel })).toEqual({ number: 5, physicalNumber: 3 });
  });

  it('takes a changed order of the panel for a change of the panel', () => {
    const speed = { parameter: 'speedMmPerS', label: 'SPEED', unit: 'mm/s' } as const;
    const [power] = panel.fields;
    if (power === undefined) throw new Error('the panel has a field');
    const before = { ...current, panel: { fields: [power, speed] } };
    expect(nextProfileNumbers(before, { physical, panel: { fields: [speed, power] } })).toEqual({ number: 5, physicalNumber: 2 });
  });
});

describe('asStored', () => {
  it('leaves out what is absent or null but keeps the null of a fixed pulse width', () => {
    const given = { ...physical, m2: undefined, apertureMm: null, maxPulseEnergyMj: [{ pulseWidthNs: null, energyMj: 1 }] };
    expect(asStored(given)).toStrictEqual({ ...physical, maxPulseEnergyMj: [{ pulseWidthNs: null, energyMj: 1 }] });
  });
});
