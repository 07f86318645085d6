import { requirePositive } from '../arguments/require-positive';

export type Sagitta = {
  readonly sagittaMm: number;
  readonly parabolaMm: number;
  readonly edgeAngleDeg: number;
  readonly arcMm: number;
  readonly edgeStretch: number;
};

/**
 * How far a round surface falls away across a flat field.
 *          s = R - sqrt(R^2 - c^2/4); phi = asin(c/(2R)); arc = 2 R phi; stretch at the edge 1/cos(phi); parabola c^2/(8R)
 *
 * @param radiusMm  radius R of the surface, mm, finite, > 0
 * @param chordMm   width c of the field, mm, finite, 0 < c < 2R
 * @returns sagitta and its parabola, mm; edge angle, deg; arc, mm; stretch
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a cylinder marked from above without turning.
 * Source: plane geometry; docs/science/round-parts.md
 */
export function sagitta(radiusMm: number, chordMm: number): Sagitta {
  requirePositive({ radiusMm, chordMm });
  if (chordMm >= 2 * radiusMm) throw new RangeError(`chordMm must be below the diameter of ${2 * radiusMm}, but is ${chordMm}`);
  const half = chordMm / 2;
  const edgeAngle = Math.asin(half / radiusMm);
  const toChordMm = Math.sqrt((radiusMm - half) * (radiusMm + half));
  return {
    // R - sqrt(R^2 - h^2) without its cancellation for a flat surface.
    sagittaMm: half ** 2 / (radiusMm + toChordMm),
    parabolaMm: chordMm ** 2 / (8 * radiusMm),
    edgeAngleDeg: (edgeAngle * 180) / Math.PI,
    arcMm: 2 * radiusMm * edgeAngle,
    edgeStretch: radiusMm / toChordMm,
  };
}
