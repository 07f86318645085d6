import type { ParameterKey } from '../vocabulary/parameters';
import type { PhysicalProfile } from '../vocabulary/profile';
import type { ParameterValues } from '../vocabulary/setting';
import { type MeasuredCalibration, workPower } from './work-power';

const PROFILE: PhysicalProfile = {
  sourceKind: 'fibre-mopa',
  wavelengthNm: 1064,
  ratedPowerW: 20,
  maxPulseEnergyMj: [
    { pulseWidthNs: 200, energyMj: 0.8 },
    { pulseWidthNs: 20, energyMj: 0.2 },
  ],
};
const CALIBRATION: MeasuredCalibration = {
  points: [5, 10, 20, 40, 60, 80, 100].map((percent, index) => ({ percent, powerW: [0.1, 0.9, 3.1, 8.4, 13, 16.8, 19.2][index] })),
  frequencyKhz: 60,
  pulseWidthNs: 200,
};

function set(numbers: Partial<Record<ParameterKey, number>>): ParameterValues {
  return Object.fromEntries(
    Object.entries(numbers).map(([key, physical]) => [key, { entered: { value: physical, unit: 'count' }, physical }]),
  );
}

describe('workPower', () => {
  it('takes the calibration at its pulse width and up to 10 % from its frequency', () => {
    for (const frequencyKhz of [54, 60, 66]) {
      const power = workPower({
        profile: PROFILE,
        calibration: CALIBRATION,
        parameters: set({ powerPercent: 50, frequencyKhz, pulseWidthNs: 200 }),
      });
      expect(power).toMatchObject({ basis: 'calibration' });
      // Published interpolation of this table, 8 digits.
      expect(power.watts).toBeCloseTo(10.795418, 6);
    }
  });

  it.each([
    ['a frequency beyond 10 %', { powerPercent: 50, frequencyKhz: 66.1, pulseWidthNs: 200 }, 10],
    ['another pulse width', { powerPercent: 50, frequencyKhz: 60, pulseWidthNs: 20 }, 6],
    ['a percent outside of the measured points', { powerPercent: 4, frequencyKhz: 60, pulseWidthNs: 200 }, 0.8],
  ])('does not use it at %s and says "not calibrated"', (_, numbers, watts) => {
    const power = workPower({ profile: PROFILE, calibration: CALIBRATION, parameters: set(numbers) });
    expect(power).toMatchObject({ basis: 'not calibrated' });
    expect(power.watts).toBeCloseTo(watts, 12);
  });

  it('limits the power by the pulse energy below the corner frequency, by the rating above', () => {
    const at = (frequencyKhz: number) =>
      workPower({ profile: PROFILE, parameters: set({ powerPercent: 100, frequencyKhz, pulseWidthNs: 200 }) });
    expect(at(10)).toEqual({ watts: 8, basis: 'not calibrated' });
    expect(at(25)).toEqual({ watts: 20, basis: 'not calibrated' });
    expect(at(100)).toEqual({ watts: 20, basis: 'not calibrated' });
  });

  it('is absent with the reason where the pulse energy is not known, never zero', () => {
    const unknown = workPower({
      profile: { ...PROFILE, maxPulseEnergyMj: undefined },
      parameters: set({ powerPercent: 50, frequencyKhz: 60 }),
    });
    expect(unknown).toEqual({ watts: null, reason: expect.stringContaining('largest pulse energy is not known.') });
    const between = workPower({ profile: PROFILE, parameters: set({ powerPercent: 50, frequencyKhz: 60, pulseWidthNs: 100 }) });
    expect(between).toEqual({ watts: null, reason: expect.stringContaining('not known at 100 ns') });
    expect(workPower({ profile: PROFILE, parameters: {} })).toEqual({ watts: null, reason: 'No power is set.' });
  });

  it('takes the share of the rating for a continuous beam, which has no pulses', () => {
    expect(workPower({ profile: PROFILE, calibration: CALIBRATION, parameters: set({ powerPercent: 50 }) })).toEqual({
      watts: 10,
      basis: 'not calibrated',
    });
  });

  it('uses a calibration without frequency and width for a continuous beam', () => {
    const calibration = { ...CALIBRATION, frequencyKhz: null, pulseWidthNs: null };
    expect(workPower({ profile: PROFILE, calibration, parameters: set({ powerPercent: 40 }) })).toEqual({
      watts: 8.4,
      basis: 'calibration',
    });
  });
});
