import { colourDifference2000, type Lab, srgbFromLab } from '@proofplate/imaging';
import { formatNumber } from './format';

/** What is read of a cell. */
export type MeasuredCell = { measurements: readonly { quantity: string; value: number | null }[] };

/** Newest value of a quantity that was measured as a number. */
export function measured(cell: MeasuredCell | undefined, quantity: string): number | undefined {
  return cell?.measurements.find((measurement) => measurement.quantity === quantity && measurement.value !== null)?.value ?? undefined;
}

export function labOf(cell: MeasuredCell | undefined): Lab | undefined {
  const lightness = measured(cell, 'lightness');
  const a = measured(cell, 'a');
  const b = measured(cell, 'b');
  return lightness === undefined || a === undefined || b === undefined ? undefined : { lightness, a, b };
}

/** The colour as a screen shows it, `#rrggbb`. */
export function cssColour(lab: Lab): string {
  const { red, green, blue } = srgbFromLab(lab);
  return `#${[red, green, blue].map((channel) => Math.round(channel).toString(16).padStart(2, '0')).join('')}`;
}

/** `deltaE` is ΔE00. */
export type ColourDifference = { deltaE: number | undefined; words: string } | undefined;

/** How two marks differ to the eye; undefined where neither colour nor lightness of both was measured. */
export function colourDifference(before: MeasuredCell | undefined, after: MeasuredCell | undefined): ColourDifference {
  const labs = [labOf(before), labOf(after)] as const;
  const lightnessBefore = measured(before, 'lightness');
  const lightnessAfter = measured(after, 'lightness');
  if (lightnessBefore === undefined || lightnessAfter === undefined) return undefined;
  const change = lightnessAfter - lightnessBefore;
  const [labBefore, labAfter] = labs;
  return {
    deltaE: labBefore === undefined || labAfter === undefined ? undefined : colourDifference2000(labBefore, labAfter),
    words: lightnessWords(change),
  };
}

function lightnessWords(change: number): string {
  const size = formatNumber(Math.abs(change), { decimals: 1 });
  if (Number(size) === 0) return 'as light as the other';
  return `${change < 0 ? 'darker' : 'lighter'} by ${size} L*`;
}
