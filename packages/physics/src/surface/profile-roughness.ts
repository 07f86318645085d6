import { mean } from '@proofplate/statistics';
import { requireFinite } from '../arguments/require-finite';

export type ProfileRoughness = {
  /** Mean distance from the mean line. */
  readonly raUm: number;
  /** Root mean square distance from it. */
  readonly rqUm: number;
  /** Highest peak to lowest valley over the whole profile. */
  readonly rtUm: number;
};

/**
 * Roughness of a measured profile.          Ra = mean |z - mean z|; Rq = sqrt(mean (z - mean z)^2); Rt = max z - min z
 *
 * @param heightsUm  heights z at even steps, um, finite, at least 2
 * @returns Ra, Rq and Rt, um
 * @throws RangeError naming the argument and its value, if a height is not finite or there are fewer than 2
 * Valid for a profile that is levelled and filtered already: state cut-off and evaluation length with the numbers.
 * Source: ISO 21920-2:2021 (ISO 4287 before); docs/science/roughness.md
 */
export function profileRoughness(heightsUm: readonly number[]): ProfileRoughness {
  if (heightsUm.length < 2) throw new RangeError(`heightsUm must have at least 2 heights, but has ${heightsUm.length}`);
  for (const [index, height] of heightsUm.entries()) requireFinite({ [`heightsUm[${index}]`]: height });
  const middleUm = mean(heightsUm);
  const distances = heightsUm.map((height) => height - middleUm);
  return {
    raUm: mean(distances.map(Math.abs)),
    rqUm: Math.sqrt(mean(distances.map((distance) => distance ** 2))),
    rtUm: heightsUm.reduce((highest, height) => Math.max(highest, height)) - heightsUm.reduce((lowest, height) => Math.min(lowest, height)),
  };
}
