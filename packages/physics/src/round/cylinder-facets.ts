import { requirePositive } from '../arguments/require-positive';
import { chordForSagitta } from './chord-for-sagitta';

export type FacetedCylinder = {
  readonly radiusMm: number;
  /** Whole depth over which the spot is good enough, both sides of the focus together. */
  readonly usableDepthMm: number;
  /** `mid`: focus half way down the sagitta, so that the whole depth counts. `crown`: focus on the crown, half of it counts. */
  readonly focusAt: 'mid' | 'crown';
  readonly edgeAngleCapDeg?: number;
};

export type CylinderFacets = {
  readonly widestChordMm: number;
  readonly widestHalfAngleDeg: number;
  readonly steps: number;
  readonly stepDeg: number;
  readonly facetArcMm: number;
  readonly facetChordMm: number;
  readonly facetSagittaMm: number;
  /** Fluence at the facet's edge over the one on its crown, by the angle alone. */
  readonly edgeCosine: number;
  readonly edgeStretch: number;
};

const HALF_TURN_DEG = 180;
/** 180/22.5 must stay 8 steps, whatever its last binary digit. */
const ROUNDING_ALLOWANCE = 1e-9;

/**
 * Flat fields that go round a cylinder, turned from one to the next.
 *          s = depth (mid) or depth/2 (crown); phi = acos(1 - s/R); n = ceil(pi/phi), and n >= ceil(180/cap); step = 360/n
 *
 * @param cylinder.radiusMm         radius R, mm, finite, > 0
 * @param cylinder.usableDepthMm    usable depth, mm, finite, > 0, such that s < R: depthForSpotGrowth or depthForFluenceLoss
 * @param cylinder.focusAt          where the focus is set
 * @param cylinder.edgeAngleCapDeg  largest edge angle wanted, deg, 0 < cap <= 90; absent for none
 * @returns widest field that the depth allows; number of steps, their angle, and one facet's arc, chord, sagitta and distortion
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a cylinder turned about its axis, fields marked from above.
 * Source: plane geometry; docs/science/round-parts.md
 */
export function cylinderFacets({ radiusMm, usableDepthMm, focusAt, edgeAngleCapDeg }: FacetedCylinder): CylinderFacets {
  requirePositive({ radiusMm, usableDepthMm });
  const allowedMm = focusAt === 'mid' ? usableDepthMm : usableDepthMm / 2;
  if (allowedMm >= radiusMm) throw new RangeError(`usableDepthMm must leave less than the radius of ${radiusMm}, but is ${usableDepthMm}`);
  const widestHalfAngle = Math.acos(1 - allowedMm / radiusMm);
  const steps = Math.max(wholeSteps(Math.PI / widestHalfAngle), stepsForCap(edgeAngleCapDeg));
  const halfAngle = Math.PI / steps;
  const edgeCosine = Math.cos(halfAngle);
  return {
    widestChordMm: chordForSagitta(radiusMm, allowedMm),
    widestHalfAngleDeg: (widestHalfAngle * HALF_TURN_DEG) / Math.PI,
    steps,
    stepDeg: (2 * HALF_TURN_DEG) / steps,
    facetArcMm: 2 * radiusMm * halfAngle,
    facetChordMm: 2 * radiusMm * Math.sin(halfAngle),
    // R (1 - cos) by the half angle: no cancellation for narrow facets.
    facetSagittaMm: 2 * radiusMm * Math.sin(halfAngle / 2) ** 2,
    edgeCosine,
    edgeStretch: 1 / edgeCosine,
  };
}

function stepsForCap(edgeAngleCapDeg: number | undefined): number {
  if (edgeAngleCapDeg === undefined) return 1;
  requirePositive({ edgeAngleCapDeg });
  if (edgeAngleCapDeg > HALF_TURN_DEG / 2) throw new RangeError(`edgeAngleCapDeg must be at most 90, but is ${edgeAngleCapDeg}`);
  return wholeSteps(HALF_TURN_DEG / edgeAngleCapDeg);
}

function wholeSteps(steps: number): number {
  return Math.ceil(steps * (1 - ROUNDING_ALLOWANCE));
}
