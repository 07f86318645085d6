import { focusReach } from '../../beam/focus-reach';
import { absent, type DerivedNumber, derive, quantityOf } from '../../exposure/derived/derived-number';
import type { Quantity, Unknown } from '../../exposure/derived/mark-parameters';
import { spotNumbers } from '../../exposure/derived/spot-numbers';
import { chordForSagitta } from '../chord-for-sagitta';
import { sagitta } from '../sagitta';
import { PART_SOURCE, type PartOptics, type RoundPart } from './round-part';
import type { Wrap } from './wrap-numbers';

/** What ends the strip first. */
export type StripLimit = 'focus' | 'edge angle' | 'field';

export type Strip = {
  readonly numbers: readonly DerivedNumber[];
  /** Fall across the widest strip, and what limits it; the reason where no strip is known. */
  readonly widest: { readonly fallMm: number; readonly limit: StripLimit } | Unknown;
  readonly spotDiameterUm: Quantity;
};

const FOCUS_SOURCE = 'ISO 11146-1, solved for z; docs/science/round-parts.md';
const FALL = {
  key: 'usableFall',
  unit: 'mm',
  formula: 'fall at which the spot’s area has changed by (1 + p)² or 1/(1 − q)',
  source: FOCUS_SOURCE,
};
const STRIP = { key: 'stripWidth', unit: 'mm', formula: 'c = 2 √(2 R s − s²)', source: PART_SOURCE };
const NO_LIMIT: Unknown = {
  unknownBecause:
    'the focus reaches from the crown to the sides of the part, so that it sets no limit: give the steepest angle at a strip’s edge',
};

/** How wide a strip stays in focus when the part does not turn, by the step of the setting that allows least. */
export function stripOf(part: RoundPart, { spot, focusOffsetsMm, fieldSizeMm }: PartOptics, { largestRadiusMm }: Wrap): Strip {
  const falls = (focusOffsetsMm.length === 0 ? [0] : focusOffsetsMm).map((offsetMm) => fallAt(part, spotNumbers(spot, offsetMm), offsetMm));
  const { fall, spots } = falls.reduce((least, next) => (allowed(next.fall) < allowed(least.fall) ? next : least));
  const widest = widestFall(quantityOf(fall), { radiusMm: largestRadiusMm, fieldSizeMm, steepestEdgeDeg: part.steepestEdgeDeg });
  return {
    numbers: [spots.focalSpot, spots.rayleigh, spots.spotAtWork, fall, stripNumber(widest, largestRadiusMm)],
    widest,
    spotDiameterUm: quantityOf(spots.spotAtWork),
  };
}

const allowed = ({ value }: DerivedNumber) => value ?? Number.POSITIVE_INFINITY;

function fallAt({ allowance, focusAt, side }: RoundPart, spots: ReturnType<typeof spotNumbers>, focusOffsetMm: number) {
  const { kind, share } = allowance;
  const areaFactor = kind === 'spot growth' ? (1 + share) ** 2 : 1 / (1 - share);
  const fall = derive(
    FALL,
    { rayleighLengthMm: quantityOf(spots.rayleigh), focusOffsetMm, areaFactor },
    {
      compute: ({ rayleighLengthMm }) => {
        const { towardsLensMm, awayFromLensMm } = focusReach(rayleighLengthMm, focusOffsetMm, areaFactor);
        if (focusAt === 'mid') return 2 * Math.min(towardsLensMm, awayFromLensMm);
        // Seen from the lens, the sides of an outer surface fall away and those of an inner one rise.
        return side === 'outside' ? awayFromLensMm : towardsLensMm;
      },
    },
  );
  return { fall, spots };
}

type Limits = { readonly radiusMm: number; readonly fieldSizeMm: Quantity; readonly steepestEdgeDeg: number | undefined };

function widestFall(focusFallMm: Quantity, { radiusMm, fieldSizeMm, steepestEdgeDeg }: Limits): Strip['widest'] {
  if (typeof focusFallMm !== 'number') return focusFallMm;
  if (typeof fieldSizeMm !== 'number') return fieldSizeMm;
  const limits: { fallMm: number; limit: StripLimit }[] = [{ fallMm: focusFallMm, limit: 'focus' }];
  // R (1 - cos) by the half angle: no cancellation for a flat strip.
  if (steepestEdgeDeg !== undefined) {
    limits.push({ fallMm: 2 * radiusMm * Math.sin((steepestEdgeDeg * Math.PI) / 360) ** 2, limit: 'edge angle' });
  }
  if (fieldSizeMm < 2 * radiusMm) limits.push({ fallMm: sagitta(radiusMm, fieldSizeMm).sagittaMm, limit: 'field' });
  const least = limits.reduce((low, next) => (next.fallMm < low.fallMm ? next : low));
  return least.fallMm >= radiusMm ? NO_LIMIT : least;
}

function stripNumber(widest: Strip['widest'], radiusMm: number): DerivedNumber {
  if ('unknownBecause' in widest) return absent(STRIP, widest);
  const { fallMm } = widest;
  return { ...STRIP, value: chordForSagitta(radiusMm, fallMm), inputs: { radiusMm, fallMm } };
}
