import {
  colourDifference76,
  colourDifference2000,
  type Lab,
  labFromSrgb,
  linearFromSrgb,
  type Srgb,
  xyzFromLinearRgb,
} from '@proofplate/imaging';
import type { FormulaEntry } from '../formula-entry';
import type { Inputs } from '../inputs';

export const COLOUR: readonly FormulaEntry[] = [
  { formula: 'CIEDE2000, kL=kC=kH=1', evaluate: (inputs) => ({ dE00: colourDifference2000(lab(inputs, 'Lab1'), lab(inputs, 'Lab2')) }) },
  {
    formula: 'CIEDE2000, kL=kC=kH=1; CIE76=sqrt(sum of squares)',
    evaluate: (inputs) => {
      const one = lab(inputs, 'Lab1');
      const other = lab(inputs, 'Lab2');
      return { dE00: colourDifference2000(one, other), dE76: colourDifference76(one, other) };
    },
  },
  {
    formula: 'IEC 61966-2-1 decoding, 4-decimal matrix, white 0.95047/1/1.08883, CIE 1976 with epsilon=216/24389, kappa=24389/27',
    evaluate: (inputs) => {
      const colour = srgb(inputs);
      const { lightness, a, b } = labFromSrgb(colour);
      return { L: lightness, a, b, Y: xyzFromLinearRgb(linearFromSrgb(colour)).y };
    },
  },
];

function lab(inputs: Inputs, key: string): Lab {
  const [lightness, a, b] = inputs.triple(key);
  return { lightness, a, b };
}

function srgb(inputs: Inputs): Srgb {
  const [red, green, blue] = inputs.triple('rgb');
  return { red, green, blue };
}
