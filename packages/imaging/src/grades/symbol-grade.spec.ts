import { expectReferences } from '../../test/expect-reference';
import { symbolContrast } from '../contrast/symbol-contrast';
import { symbolGrade } from './symbol-grade';
import { SYMBOL_GRADE_LIMITS, SYMBOL_PARAMETERS, symbolParameterGrade } from './symbol-parameter-grade';

describe('symbolParameterGrade', () => {
  expectReferences<Readonly<Record<'SC' | 'MOD' | 'CC' | 'ANU' | 'GNU' | 'UEC', number>>>(
    'SC>=.70/.55/.40/.20; MOD>=.50/.40/.30/.20; CC>=.30/.25/.20/.15; ANU<=.06/.08/.10/.12; GNU<=.38/.50/.63/.75; UEC>=.62/.50/.37/.25 give 4/3/2/1, else 0',
    ({ SC, MOD, CC, ANU, GNU, UEC }) => ({
      SC: symbolParameterGrade('symbolContrast', SC),
      MOD: symbolParameterGrade('modulation', MOD),
      CC: symbolParameterGrade('cellContrast', CC),
      ANU: symbolParameterGrade('axialNonuniformity', ANU),
      GNU: symbolParameterGrade('gridNonuniformity', GNU),
      UEC: symbolParameterGrade('unusedErrorCorrection', UEC),
    }),
  );

  it('gives each limit its grade and the next worse one just beyond it', () => {
    for (const parameter of SYMBOL_PARAMETERS) {
      const { betterIs, limits } = SYMBOL_GRADE_LIMITS[parameter];
      const worse = betterIs === 'higher' ? -0.001 : 0.001;
      expect(limits.map((limit) => symbolParameterGrade(parameter, limit))).toEqual([4, 3, 2, 1]);
      expect(limits.map((limit) => symbolParameterGrade(parameter, limit + worse))).toEqual([3, 2, 1, 0]);
    }
  });

  it('does not lose a grade to the last binary digit of a difference', () => {
    expect(0.6 - 0.2).toBeLessThan(0.4);
    expect(symbolParameterGrade('symbolContrast', symbolContrast(0.6, 0.2))).toBe(2);
  });

  it('refuses a value that is not a number', () => {
    expect(() => symbolParameterGrade('modulation', Number.NaN)).toThrow('modulation must be a finite number, but is NaN');
  });
});

describe('symbolGrade', () => {
  it('is the lowest of its parameters and says which', () => {
    expect(symbolGrade({ symbolContrast: 0.72, modulation: 0.46, gridNonuniformity: 0.51, unusedErrorCorrection: 0.4 })).toEqual({
      grade: 2,
      parameters: { symbolContrast: 4, modulation: 3, gridNonuniformity: 2, unusedErrorCorrection: 2 },
      decidedBy: ['gridNonuniformity', 'unusedErrorCorrection'],
    });
  });

  it('refuses to grade nothing', () => {
    expect(() => symbolGrade({})).toThrow('values must hold at least one parameter, but holds none');
  });
});
