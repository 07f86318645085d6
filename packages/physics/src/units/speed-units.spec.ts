import { speedUnits } from './speed-units';

describe('speedUnits', () => {
  it.each([
    { speedMmPerS: 1000, metresPerMinute: 60, inchesPerSecond: 39.3700787402, millimetresPerMinute: 60_000 },
    { speedMmPerS: 254, metresPerMinute: 15.24, inchesPerSecond: 10, millimetresPerMinute: 15_240 },
  ])('gives $speedMmPerS mm/s in the other units', ({ speedMmPerS, metresPerMinute, inchesPerSecond, millimetresPerMinute }) => {
    const got = speedUnits(speedMmPerS);
    expect(got.metresPerMinute / metresPerMinute).toBeCloseTo(1, 11);
    expect(got.inchesPerSecond / inchesPerSecond).toBeCloseTo(1, 11);
    expect(got.millimetresPerMinute / millimetresPerMinute).toBeCloseTo(1, 11);
  });

  it('refuses what is no number', () => {
    expect(() => speedUnits(Number.POSITIVE_INFINITY)).toThrow('speedMmPerS must be a finite number, but is Infinity');
  });
});
