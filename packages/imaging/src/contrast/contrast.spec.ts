import { expectReferences } from '../../test/expect-reference';
import { cellContrast } from './cell-contrast';
import { michelsonContrast } from './michelson-contrast';
import { moduleModulation } from './module-modulation';
import { symbolContrast } from './symbol-contrast';
import { weberContrastOverDarker, weberContrastOverGround } from './weber-contrast';

describe('contrasts', () => {
  expectReferences<{ R_light: number; R_dark: number }>(
    'Michelson=(Rmax-Rmin)/(Rmax+Rmin); Weber_mark=(R_mark-R_ground)/R_ground (signed; |.|<=1 for a dark mark); Weber_min=(Rmax-Rmin)/Rmin; symbol contrast=Rmax-Rmin; cell contrast=(ML-MD)/ML',
    ({ R_light, R_dark }) => ({
      michelson: michelsonContrast(R_dark, R_light),
      weber_dark_mark: weberContrastOverGround(R_dark, R_light),
      weber_light_mark: weberContrastOverGround(R_light, R_dark),
      weber_over_min: weberContrastOverDarker(R_dark, R_light),
      symbol_contrast: symbolContrast(R_light, R_dark),
      cell_contrast: cellContrast(R_light, R_dark),
    }),
  );

  it('name their denominator: a dark mark of 0.2 on 0.8 is -0.75 over its ground and 3 over the darker', () => {
    expect(weberContrastOverGround(0.2, 0.8)).toBeCloseTo(-0.75, 12);
    expect(weberContrastOverDarker(0.2, 0.8)).toBeCloseTo(3, 12);
  });

  it('do not depend on the scale of the reflectances, but for the symbol contrast', () => {
    expect(michelsonContrast(20, 80)).toBeCloseTo(michelsonContrast(0.2, 0.8), 12);
    expect(cellContrast(80, 20)).toBeCloseTo(cellContrast(0.8, 0.2), 12);
    expect(symbolContrast(80, 20)).toBe(60);
  });

  it('refuse a ground without light, a swapped order and negative reflectances', () => {
    expect(() => michelsonContrast(0, 0)).toThrow('groundReflectance must be above 0 where markReflectance is 0, but is 0');
    expect(() => michelsonContrast(-0.1, 0.5)).toThrow('markReflectance must be a finite number of at least 0, but is -0.1');
    expect(() => weberContrastOverGround(0.2, 0)).toThrow('groundReflectance must be a finite number above 0, but is 0');
    expect(() => weberContrastOverDarker(0, 0.5)).toThrow('markReflectance must be a finite number above 0, but is 0');
    expect(() => symbolContrast(0.2, 0.8)).toThrow('lowestReflectance must be a number from 0 to 0.2, but is 0.8');
    expect(() => cellContrast(0.2, 0.8)).toThrow('darkMean must be a number from 0 to 0.2, but is 0.8');
  });
});

describe('moduleModulation', () => {
  expectReferences<{ R: number; GT: number; SC: number }>('MOD=2*|R-GT|/SC', ({ R, GT, SC }) => ({ MOD: moduleModulation(R, GT, SC) }));

  it('is 1 at either extreme', () => {
    expect(moduleModulation(0.8, 0.5, symbolContrast(0.8, 0.2))).toBeCloseTo(1, 12);
    expect(moduleModulation(0.2, 0.5, symbolContrast(0.8, 0.2))).toBeCloseTo(1, 12);
  });

  it('refuses a symbol without contrast', () => {
    expect(() => moduleModulation(0.5, 0.5, 0)).toThrow('contrast must be a finite number above 0, but is 0');
  });
});
