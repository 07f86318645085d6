import { requireAtLeast } from '../arguments/require-at-least';
import { requireFinite } from '../arguments/require-finite';
import { requirePositive } from '../arguments/require-positive';
import { requireWhole } from '../arguments/require-whole';
import { type DerivedNumber, type PresentNumber, quantityOf } from './derived/derived-number';
import { effectiveParameters } from './derived/effective-parameters';
import { fillNumbers } from './derived/fill-numbers';
import { lineNumbers } from './derived/line-numbers';
import type { MarkParameters, Quantity } from './derived/mark-parameters';
import { markingTimeNumber } from './derived/marking-time-number';
import { pulseNumbers } from './derived/pulse-numbers';
import { spotNumbers } from './derived/spot-numbers';

/**
 * All numbers that follow from the parameters of one mark, for the mode they describe.          formulas in each entry
 *
 * @param mark  parameters, units in the names; each quantity is a number in the range of the function that uses it, or
 *              `{ unknownBecause }`. No frequency: continuous beam. Diameters are 1/e^2, power is at the workpiece.
 * @returns the same keys in the same order for every mark. A number that an unknown or the mode rules out has no value but
 *          `missingBecause`, and `isRuledOutByMode` when no input would bring it: pulse numbers of a continuous beam, areal
 *          numbers of an outline, numbers by scan speed with wobble. A number outside the validity of its formula carries
 *          `outOfRange`. The spot is the one at the focus offset.
 * @throws RangeError naming the argument and its value, if a known quantity is out of range
 * Valid as each entry's formula; see its source.
 * Source: docs/science/beam.md, pulses.md, scanning.md, marking-time.md
 */
export function derivedNumbers(mark: MarkParameters): readonly DerivedNumber[] {
  requireRanges(mark);
  const parameters = effectiveParameters(mark);
  const { focalSpot, rayleigh, spotAtWork } = spotNumbers(mark.spot, mark.focusOffsetMm);
  const spotDiameterUm = quantityOf(spotAtWork);
  const numbers = [
    focalSpot,
    rayleigh,
    spotAtWork,
    ...pulseNumbers(parameters, spotDiameterUm),
    ...lineNumbers(parameters, spotDiameterUm),
    ...fillNumbers(parameters, spotDiameterUm),
    markingTimeNumber(mark),
  ];
  return focalSpot.missingBecause === undefined ? numbers.map((derived) => handOnLimit(focalSpot, derived)) : numbers;
}

/** What is computed from a spot outside the validity of its formula is outside it too. */
function handOnLimit({ outOfRange }: PresentNumber, derived: DerivedNumber): DerivedNumber {
  if (outOfRange === undefined || derived.missingBecause !== undefined || derived.outOfRange !== undefined) return derived;
  return 'spotDiameterUm' in derived.inputs ? { ...derived, outOfRange } : derived;
}

/** Checked at the door, so that a bad value is refused even where the mode does not use it. */
function requireRanges({
  powerW,
  speedMmPerS,
  frequencyKhz,
  pulseWidthNs,
  lineSpacingUm,
  passes,
  focusOffsetMm,
  wobble,
  spot,
}: MarkParameters): void {
  requireAtLeast(0, knownOf({ powerW }));
  requirePositive(knownOf({ speedMmPerS, frequencyKhz, pulseWidthNs, lineSpacingUm }));
  requireWhole(knownOf({ passes }));
  requireFinite(knownOf({ focusOffsetMm }));
  if (wobble !== undefined) requirePositive(knownOf({ wobbleDiameterUm: wobble.diameterUm, wobbleFrequencyKhz: wobble.frequencyKhz }));
  if ('spotDiameterUm' in spot) requirePositive({ spotDiameterUm: spot.spotDiameterUm });
  if ('apertureMm' in spot && spot.apertureMm !== undefined) requirePositive({ apertureMm: spot.apertureMm });
}

function knownOf(quantities: Readonly<Record<string, Quantity | undefined>>): Record<string, number> {
  const known: Record<string, number> = {};
  for (const [name, quantity] of Object.entries(quantities)) if (typeof quantity === 'number') known[name] = quantity;
  return known;
}
