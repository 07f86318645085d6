import { focusedSpotDiameter, rayleighLength, spotDiameterAtOffset } from '@proofplate/physics';
import type { Found, TransferPlace, TransferReason, TransferSide } from './transfer-ground';

/** The spot in focus: measured, else computed from the beam. */
export function focalSpot(place: TransferPlace, side: TransferSide): Found<number> {
  const { measuredSpotUm, profile, focalLengthMm } = place;
  if (measuredSpotUm !== null) return { value: measuredSpotUm };
  const { beamDiameterMm, m2, wavelengthNm } = profile;
  if (beamDiameterMm === undefined || m2 === undefined) {
    const missing = [
      ...(beamDiameterMm === undefined ? ['the beam diameter at the lens'] : []),
      ...(m2 === undefined ? ['the beam’s M²'] : []),
    ].join(' and ');
    const way = `Enter ${missing}, or a measured spot of ${place.lensName}, on the machine’s page.`;
    return { reasons: [unknownSpot(`The spot of ${place.machineName} with ${place.lensName} is not known. ${way}`, side)] };
  }
  return { value: focusedSpotDiameter({ wavelengthNm, focalLengthMm, beamDiameterMm, m2 }) };
}

/** The Rayleigh length, which a spot out of focus needs. */
export function rayleighOf(place: TransferPlace, side: TransferSide): Found<number> {
  const spot = focalSpot(place, side);
  if (spot.value === undefined) return spot;
  const { m2, wavelengthNm } = place.profile;
  if (m2 === undefined) {
    const text = `The spot of ${place.machineName} out of focus is not known. Enter the beam’s M² on the machine’s page.`;
    return { reasons: [unknownSpot(text, side)] };
  }
  return { value: rayleighLength({ spotDiameterUm: spot.value, wavelengthNm, m2 }) };
}

/**
 * The 1/e² spot on the work.          d = d0 in focus, else spotDiameterAtOffset
 *
 * @param place          machine and lens: measured spot um, or wavelength nm, focal length mm, beam diameter mm and M²
 * @param focusOffsetMm  distance of the surface from the focal plane, mm, either sign
 * @param side           whose machine it is, for the reasons
 * @returns the diameter, um, or what is missing and where to enter it
 * Source: docs/science/beam.md
 */
export function spotOnWork(place: TransferPlace, focusOffsetMm: number, side: TransferSide): Found<number> {
  const spot = focalSpot(place, side);
  if (spot.value === undefined || focusOffsetMm === 0) return spot;
  const rayleigh = rayleighOf(place, side);
  if (rayleigh.value === undefined) return rayleigh;
  return { value: spotDiameterAtOffset(spot.value, rayleigh.value, focusOffsetMm) };
}

const unknownSpot = (text: string, side: TransferSide): TransferReason => ({ code: 'spot unknown', text, side });
