import {
  cellContrast,
  michelsonContrast,
  moduleModulation,
  symbolContrast,
  symbolParameterGrade,
  weberContrastOverDarker,
  weberContrastOverGround,
} from '@proofplate/imaging';
import { crossCutClass, type ProfileRoughness, profileRoughness, sineRoughness } from '@proofplate/physics';
import type { FormulaEntry } from '../formula-entry';

const keyed = ({ raUm, rqUm, rtUm }: ProfileRoughness) => ({ Ra: raUm, Rq: rqUm, Rt: rtUm });

export const MARK_QUALITY: readonly FormulaEntry[] = [
  {
    formula:
      'Michelson=(Rmax-Rmin)/(Rmax+Rmin); Weber_mark=(R_mark-R_ground)/R_ground (signed; |.|<=1 for a dark mark); Weber_min=(Rmax-Rmin)/Rmin; symbol contrast=Rmax-Rmin; cell contrast=(ML-MD)/ML',
    evaluate: (inputs) => {
      const light = inputs.number('R_light');
      const dark = inputs.number('R_dark');
      return {
        michelson: michelsonContrast(dark, light),
        weber_dark_mark: weberContrastOverGround(dark, light),
        weber_light_mark: weberContrastOverGround(light, dark),
        weber_over_min: weberContrastOverDarker(dark, light),
        symbol_contrast: symbolContrast(light, dark),
        cell_contrast: cellContrast(light, dark),
      };
    },
  },
  {
    formula:
      'SC>=.70/.55/.40/.20; MOD>=.50/.40/.30/.20; CC>=.30/.25/.20/.15; ANU<=.06/.08/.10/.12; GNU<=.38/.50/.63/.75; UEC>=.62/.50/.37/.25 give 4/3/2/1, else 0',
    evaluate: (inputs) => ({
      SC: symbolParameterGrade('symbolContrast', inputs.number('SC')),
      MOD: symbolParameterGrade('modulation', inputs.number('MOD')),
      CC: symbolParameterGrade('cellContrast', inputs.number('CC')),
      ANU: symbolParameterGrade('axialNonuniformity', inputs.number('ANU')),
      GNU: symbolParameterGrade('gridNonuniformity', inputs.number('GNU')),
      UEC: symbolParameterGrade('unusedErrorCorrection', inputs.number('UEC')),
    }),
  },
  {
    formula: 'MOD=2*|R-GT|/SC',
    evaluate: (inputs) => ({ MOD: moduleModulation(inputs.number('R'), inputs.number('GT'), inputs.number('SC')) }),
  },
  { formula: 'Ra=mean|z-mean|; Rq=rms; Rt=max-min', evaluate: (inputs) => keyed(profileRoughness(inputs.numbers('z_um'))) },
  { formula: 'Ra=2A/pi; Rq=A/sqrt(2); Rt=2A', evaluate: (inputs) => keyed(sineRoughness(inputs.number('A_um'))) },
  {
    formula: '0 ->5B/0; <5 ->4B/1; 5-15 ->3B/2; 15-35 ->2B/3; 35-65 ->1B/4; >65 ->0B/5 (ISO 2409: limits "not greater than" 5/15/35/65)',
    evaluate: (inputs) => {
      const { astm, iso } = crossCutClass(inputs.number('percent'));
      return { ASTM_D3359_B: astm, ISO_2409: iso };
    },
  },
];
