import { absent, type DerivedNumber, derive, quantityOf } from '../../exposure/derived/derived-number';
import type { Quantity } from '../../exposure/derived/mark-parameters';
import { cylinderFacets } from '../cylinder-facets';
import { flatGraphicOnCylinder } from '../flat-graphic-on-cylinder';
import { sagitta } from '../sagitta';
import { spotAtIncidence } from '../spot-at-incidence';
import { PART_SOURCE, type RoundPart } from './round-part';
import type { Strip } from './strip-numbers';
import type { Wrap } from './wrap-numbers';

/** 16 strips must stay 16, whatever the last binary digit. */
const ROUNDING_ALLOWANCE = 1e-9;
const HALF_TURN_DEG = 180;

const described = (key: string, unit: string, formula: string) => ({ key, unit, formula, source: PART_SOURCE });
const STEPS = described('leastIndexSteps', '1', 'n = ⌈wrap angle / 2φ⌉, φ = acos(1 − s/R)');
const CHOSEN = described('indexSteps', '1', 'as asked for, else the least number');
const TURN_STEPS = described('stepsOfWholeTurn', '1', 'n = ⌈180° / φ⌉, φ = acos(1 − s/R)');
const TOO_FLAT = { unknownBecause: 'a flat strip this wide reaches past the part: more index steps make it narrower' };

/** The turns between flat strips, and what the edge of one strip loses. */
export function indexNumbers(part: RoundPart, wrap: Wrap, { widest, spotDiameterUm }: Strip): readonly DerivedNumber[] {
  const { largestRadiusMm: radiusMm, wrapAngleDeg } = wrap;
  const fallMm: Quantity = 'unknownBecause' in widest ? widest : widest.fallMm;
  const facets = (known: { fallMm: number }) => cylinderFacets({ radiusMm, usableDepthMm: known.fallMm, focusAt: 'mid' });
  const least = derive(
    STEPS,
    { wrapAngleDeg, radiusMm, fallMm },
    {
      compute: (known) => Math.ceil((wrapAngleDeg / (2 * facets(known).widestHalfAngleDeg)) * (1 - ROUNDING_ALLOWANCE)),
    },
  );
  const steps = part.indexSteps ?? quantityOf(least);
  const chosen = derive(CHOSEN, { steps }, { compute: (known) => known.steps });
  return [
    least,
    chosen,
    derive(TURN_STEPS, { radiusMm, fallMm }, { compute: (known) => facets(known).steps }),
    ...ofOneStrip(part, { steps, wrapAngleDeg, radiusMm, spotDiameterUm }),
  ];
}

type OneStrip = { readonly steps: Quantity; readonly wrapAngleDeg: number; readonly radiusMm: number; readonly spotDiameterUm: Quantity };

function ofOneStrip({ focusAt }: RoundPart, { steps, wrapAngleDeg, radiusMm, spotDiameterUm }: OneStrip): readonly DerivedNumber[] {
  const angle = derive(
    described('indexAngle', 'deg', 'wrap angle / n'),
    { wrapAngleDeg, steps },
    {
      compute: (known) => wrapAngleDeg / known.steps,
    },
  );
  // A strip of half a turn or more has no flat field: its edges lie on the part's sides or below.
  const isFlat = angle.value === undefined || angle.value < HALF_TURN_DEG;
  const indexAngleDeg: Quantity = isFlat ? quantityOf(angle) : TOO_FLAT;
  const half = (deg: number) => (deg * Math.PI) / 360;
  const field = derive(
    described('fieldWidth', 'mm', '2 R sin(step / 2)'),
    { radiusMm, indexAngleDeg },
    {
      compute: (known) => 2 * radiusMm * Math.sin(half(known.indexAngleDeg)),
    },
  );
  const fall = derive(
    described('stripFall', 'mm', 's = R − √(R² − c²/4)'),
    { radiusMm, fieldWidthMm: quantityOf(field) },
    {
      compute: (known) => sagitta(radiusMm, known.fieldWidthMm).sagittaMm,
    },
  );
  return [
    angle,
    field,
    fall,
    derive(
      described('focusBelowCrown', 'mm', focusAt === 'mid' ? 's / 2' : '0: focus on the middle of the strip'),
      { fallMm: quantityOf(fall) },
      {
        compute: (known) => (focusAt === 'mid' ? known.fallMm / 2 : 0),
      },
    ),
    derive(
      described('edgeFluence', '1', 'cos φ, by the angle alone'),
      { indexAngleDeg },
      { compute: (known) => Math.cos(half(known.indexAngleDeg)) },
    ),
    derive(
      described('edgeSpot', 'µm', 'd / cos φ, across the strip'),
      { spotDiameterUm, indexAngleDeg },
      {
        compute: (known) => spotAtIncidence(known.spotDiameterUm, known.indexAngleDeg / 2).majorDiameterUm,
      },
    ),
    edgeShift(radiusMm, indexAngleDeg),
  ];
}

/** How far a point of a flat strip lands from where it belongs, when the strip is projected without compensation. */
function edgeShift(radiusMm: number, indexAngleDeg: Quantity): DerivedNumber {
  const each = described('edgeShift', 'mm', 'R asin(x/R) − x, half a strip from its middle');
  if (typeof indexAngleDeg !== 'number') return absent(each, indexAngleDeg);
  const offsetMm = (radiusMm * indexAngleDeg * Math.PI) / 360;
  if (offsetMm >= radiusMm) return absent(each, TOO_FLAT);
  return { ...each, value: flatGraphicOnCylinder(radiusMm, offsetMm).arcMm - offsetMm, inputs: { radiusMm, offsetMm } };
}
