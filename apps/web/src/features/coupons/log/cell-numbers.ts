import {
  type NumberedSetting,
  PARAMETER_KEYS,
  PARAMETERS,
  type ParameterKey,
  type StepNumbers,
  stepNumbers,
} from '@proofplate/recipe-model';
import type { Coupon, CouponCell } from '../coupons.api';

/** The numbers that follow from what was really marked; of a plate burnt earlier only what its known values give. */
export function cellNumbers(cell: CouponCell, coupon: Coupon): StepNumbers {
  const { profile, lens, doseCaution, grids } = coupon;
  const grid = grids.find(({ id }) => id === cell.gridId);
  return stepNumbers(markedSetting(cell, coupon), {
    optics: { physical: profile.physical, focalLengthMm: lens.focalLengthMm, measuredSpotUm: lens.measuredSpotUm },
    panel: profile.panel,
    doseCaution,
    ...(grid === undefined ? {} : { areaMm: { widthMm: grid.cellMm, heightMm: grid.cellMm } }),
  });
}

function markedSetting({ actualParameters, parameters }: CouponCell, { unknownFields }: Coupon): NumberedSetting {
  const unknown = PARAMETER_KEYS.filter((key) => unknownFields.includes(key));
  const reasons: Partial<Record<ParameterKey | 'fill', string>> = Object.fromEntries(
    unknown.map((key) => [key, `the ${PARAMETERS[key].label.toLowerCase()} of this plate was not written down`]),
  );
  if (unknownFields.includes('fill')) reasons.fill = 'the fill of this plate was not written down';
  const { power, ...set } = actualParameters ?? parameters;
  const { watts, basis = 'not calibrated', reason = 'the power at the work is not known' } = power;
  return { ...set, power: watts === null ? { watts, reason } : { watts, basis }, unknownBecause: reasons };
}
