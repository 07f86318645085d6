import { type CraterCell, type CraterFit, craterFit } from '@proofplate/recipe-model';
import { countingIdsOf } from './coupon-inspection-verdicts';
import type { StoredMeasurement } from './coupon-measurements.repository';
import type { WholeCoupon } from './coupons.mapper';
import { type CraterPlaceDto, type CraterSpotDto, SPOT_LIMITS_UM } from './dto/crater-fit.dto';

/** A microscope tells no more of a spot than hundredths of a micrometre. */
const DIGITS = 2;
/** Two rounded numbers are the same. */
const SAME_UM = 0.001;

export type FoundCraters = { readonly found: CraterFit; readonly lastMeasuredAt: Date | null };
/** The coupon’s machine and lens as they are now. */
export type PlaceNow = CraterPlaceDto & { readonly physicalNumber: number; readonly isArchived: boolean };

/** The crater that counts of each cell, fitted, and when the last one in the line was measured. */
export function fitCraters(whole: WholeCoupon, measurements: readonly StoredMeasurement[]): FoundCraters {
  const counting = countingIdsOf(measurements);
  const rows = measurements.filter(({ id, quantity }) => quantity === 'crater-diameter' && counting.has(id));
  const byCell = new Map(rows.map((row) => [row.cellId, row]));
  const measured = whole.cells.flatMap((cell) => {
    const row = byCell.get(cell.id);
    if (row === undefined || row.value === null) return [];
    const crater: CraterCell = {
      ...{ address: addressOf(cell, whole), diameterUm: row.value },
      parameters: cell.actualParameters ?? cell.parameters,
    };
    return [{ crater, at: row.measuredAt.getTime() }];
  });
  const { profile, lens, coupon } = whole.view;
  const optics = { physical: profile.physical, focalLengthMm: lens.focalLengthMm, measuredSpotUm: lens.measuredSpotUm };
  const craters = measured.map(({ crater }) => crater);
  const found = craterFit(craters, { optics, unknownFields: coupon.unknownFields });
  // the points stand in the order of the craters
  const times = measured.flatMap(({ at }, index) => (found.points[index]?.excludedBecause === null ? [at] : []));
  return { found, lastMeasuredAt: times.length === 0 ? null : new Date(Math.max(...times)) };
}

/** The spot that the line gives, in the words in which it would stand at the machine; null: no line. */
export function spotOf(code: string, { fit, pointCount }: CraterFit, measuredOn: string | null): CraterSpotDto | null {
  if (fit === null || measuredOn === null) return null;
  const diameterUm = rounded(2 * fit.spotRadiusUm);
  const standardErrorUm = rounded(2 * fit.spotRadiusStandardErrorUm);
  const method = `Crater widths of ${code}, n = ${pointCount}, ± ${standardErrorUm} µm (standard error)`;
  return { diameterUm, standardErrorUm, method, measuredOn };
}

/** Why the spot can’t become the measured one of machine and lens; null: it can. */
export function whyNotSavable(
  { found, spot, place }: { readonly found: CraterFit; readonly spot: CraterSpotDto | null; readonly place: PlaceNow | undefined },
  physicalNumber: number,
): string | null {
  if (spot === null || found.series === null) return found.refusedBecause ?? 'There are no craters.';
  if (place === undefined) return 'This lens is not on the machine. Add it on the machine’s page first.';
  if (place.isArchived) return 'The machine is archived. Restore it first.';
  if (place.physicalNumber !== physicalNumber)
    return 'The source or scan head of the machine was changed since the plate was marked, so this spot is an earlier machine’s.';
  if (found.series.focusOffsetMm !== 0)
    return `The plate was marked ${found.series.focusOffsetMm} mm out of focus; the measured spot of a lens is the one in focus.`;
  if (spot.diameterUm < SPOT_LIMITS_UM.low || spot.diameterUm > SPOT_LIMITS_UM.high)
    return `A spot of ${spot.diameterUm} µm lies outside ${SPOT_LIMITS_UM.low} to ${SPOT_LIMITS_UM.high} µm. Look at the widths and powers again.`;
  const isInUse = isSameSpot(spot.diameterUm, place.measuredSpotUm) && place.spotMethod === spot.method;
  return isInUse ? 'It is the measured spot already.' : null;
}

export function toPlaceDto({ physicalNumber: _physical, isArchived: _archived, ...place }: PlaceNow): CraterPlaceDto {
  return place;
}

export const isSameSpot = (one: number, other: number | null): boolean => other !== null && Math.abs(one - other) < SAME_UM;

/** On a plate with several grids an address alone is not enough. */
function addressOf({ address, gridId }: { readonly address: string; readonly gridId: string }, { grids }: WholeCoupon): string {
  if (grids.length < 2) return address;
  return `${address} of grid ${grids.find(({ id }) => id === gridId)?.number ?? ''}`;
}

const rounded = (value: number): number => Number(value.toFixed(DIGITS));
