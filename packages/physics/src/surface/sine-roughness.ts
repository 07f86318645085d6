import { requireAtLeast } from '../arguments/require-at-least';
import type { ProfileRoughness } from './profile-roughness';

/**
 * Roughness of a sine profile, such as even lines leave.          Ra = 2 A / pi; Rq = A / sqrt(2); Rt = 2 A
 *
 * @param amplitudeUm  amplitude A, half of peak to valley, um, finite, >= 0
 * @returns Ra, Rq and Rt, um
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for whole periods, none of them cut off by the filter.
 * Source: ISO 21920-2:2021 applied to a sine; docs/science/roughness.md
 */
export function sineRoughness(amplitudeUm: number): ProfileRoughness {
  requireAtLeast(0, { amplitudeUm });
  return { raUm: (2 * amplitudeUm) / Math.PI, rqUm: amplitudeUm / Math.SQRT2, rtUm: 2 * amplitudeUm };
}
