import { type DerivedNumber, derivedNumbers, type MarkSpot, type Quantity } from '@proofplate/physics';
import type { Coupon, CouponCell } from '../coupons.api';

const unknown = (unknownBecause: string): Quantity => ({ unknownBecause });

/** The numbers that follow from what was really marked, by key; of a plate burnt earlier only what its known values give. */
export function derivedNumbersOf(cell: CouponCell, coupon: Coupon): ReadonlyMap<string, DerivedNumber> {
  const { values, fill, power } = cell.actualParameters ?? cell.parameters;
  const set = (value: { physical: number } | undefined, what: string): Quantity => value?.physical ?? unknown(`${what} is not known`);
  const { wobbleDiameterUm, wobbleFrequencyKhz, frequencyKhz, pulseWidthNs } = values;
  const numbers = derivedNumbers({
    powerW: power.watts ?? unknown(power.reason ?? 'the power at the work is not known'),
    speedMmPerS: set(values.speedMmPerS, 'the scan speed'),
    ...frequencyOf(coupon, frequencyKhz),
    ...(pulseWidthNs === undefined ? {} : { pulseWidthNs: pulseWidthNs.physical }),
    lineSpacingUm: set(values.lineSpacingUm, 'the line spacing'),
    passes: set(values.passes, 'the number of passes'),
    fill,
    ...(wobbleDiameterUm === undefined
      ? {}
      : { wobble: { diameterUm: wobbleDiameterUm.physical, frequencyKhz: set(wobbleFrequencyKhz, 'the wobble frequency') } }),
    spot: spotOf(coupon),
    focusOffsetMm: coupon.unknownFields.includes('focusOffsetMm')
      ? unknown('the focus offset is not known')
      : (values.focusOffsetMm?.physical ?? 0),
  });
  return new Map(numbers.map((number) => [number.key, number]));
}

/** Absent means a continuous beam, unless nobody knows the frequency of a plate burnt earlier. */
function frequencyOf({ unknownFields }: Coupon, value: { physical: number } | undefined): { frequencyKhz?: Quantity } {
  if (value !== undefined) return { frequencyKhz: value.physical };
  return unknownFields.includes('frequencyKhz') ? { frequencyKhz: unknown('the pulse frequency is not known') } : {};
}

function spotOf({ profile: { physical }, lens }: Coupon): MarkSpot {
  const { wavelengthNm } = physical;
  const m2 = physical.m2 ?? unknown('the beam’s M² is not given on the machine');
  if (lens.measuredSpotUm !== null) return { spotDiameterUm: lens.measuredSpotUm, wavelengthNm, m2 };
  const beamDiameterMm = physical.beamDiameterMm ?? unknown('the beam diameter at the lens is not given on the machine');
  return { wavelengthNm, m2, focalLengthMm: lens.focalLengthMm, beamDiameterMm };
}
