import { spacingUnits } from './spacing-units';

describe('spacingUnits', () => {
  it.each([
    { spacingMm: 0.05, inch: 0.00196850393701, linesPerInch: 508, linesPerCm: 200, linesPerMm: 20 },
    { spacingMm: 0.0254, inch: 0.001, linesPerInch: 1000, linesPerCm: 393.700787402, linesPerMm: 39.3700787402 },
    { spacingMm: 0.1, inch: 0.00393700787402, linesPerInch: 254, linesPerCm: 100, linesPerMm: 10 },
  ])('gives the densities of $spacingMm mm', ({ spacingMm, ...expected }) => {
    const got = spacingUnits(spacingMm);
    // The expected figures carry 12 digits.
    expect(got.inch / expected.inch).toBeCloseTo(1, 11);
    expect(got.linesPerInch / expected.linesPerInch).toBeCloseTo(1, 11);
    expect(got.linesPerCm / expected.linesPerCm).toBeCloseTo(1, 11);
    expect(got.linesPerMm / expected.linesPerMm).toBeCloseTo(1, 11);
  });

  it('refuses a spacing of zero', () => {
    expect(() => spacingUnits(0)).toThrow('spacingMm must be a finite number above 0, but is 0');
  });
});
