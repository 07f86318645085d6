import { requirePositive } from '../arguments/require-positive';

const UNCUT_FROM_RATIO = 2;
const UNTRUNCATED = 4 / Math.PI;

/** Below this the spot is no longer near a Gaussian one. */
export const LEAST_PRINTED_RATIO = 0.75;

/** Aperture over 1/e^2 beam diameter, and the factor. The printed 2.44 at 0.5 is an Airy disc's first zero, another diameter: left out. */
const PRINTED: readonly (readonly [ratio: number, factor: number])[] = [
  [LEAST_PRINTED_RATIO, 2.32],
  [0.9, 1.99],
  [1, 1.83],
  [1.25, 1.56],
  [1.5, 1.41],
  [UNCUT_FROM_RATIO, UNTRUNCATED],
];

/**
 * Factor for the spot behind an aperture.          printed table, straight lines between its points; 4/pi from aperture/beam = 2 on
 *
 * @param apertureMm      clear diameter of the aperture at the lens, mm, finite, at least 0.75 of the beam diameter
 * @param beamDiameterMm  1/e^2 diameter of the beam there, mm, finite, > 0
 * @returns apodisation factor for truncatedSpotDiameter, 4/pi to 2.32
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a centred Gaussian beam and a round aperture; to a few percent, as far as the printed tables agree.
 * Source: printed table of a lens maker (aperture/beam 2: 1.27, 1.5: 1.41, 1.25: 1.56, 1: 1.83, 0.9: 1.99, 0.75: 2.32); docs/science/beam.md
 */
export function apodisationFactor(apertureMm: number, beamDiameterMm: number): number {
  requirePositive({ apertureMm, beamDiameterMm });
  const ratio = apertureMm / beamDiameterMm;
  if (ratio >= UNCUT_FROM_RATIO) return UNTRUNCATED;
  if (ratio < LEAST_PRINTED_RATIO) {
    throw new RangeError(
      `apertureMm must be at least ${LEAST_PRINTED_RATIO} of the beam diameter of ${beamDiameterMm}, but is ${apertureMm}`,
    );
  }
  const upper = PRINTED.findIndex(([printed]) => printed > ratio);
  const [[fromRatio, fromFactor], [toRatio, toFactor]] = [PRINTED[upper - 1], PRINTED[upper]];
  return fromFactor + ((toFactor - fromFactor) * (ratio - fromRatio)) / (toRatio - fromRatio);
}
