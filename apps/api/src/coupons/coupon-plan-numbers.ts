import {
  type DerivedNumber,
  derivedNumbers,
  filledRectangleTime,
  type MarkParameters,
  type MarkSpot,
  type Quantity,
  runIn,
} from '@proofplate/physics';
import type { ParameterSet, PhysicalProfile } from '@proofplate/recipe-model';
import type { MarkingTimeDto } from './dto/coupon-preview.dto';

export type Optics = {
  readonly physical: PhysicalProfile;
  readonly focalLengthMm: number;
  readonly measuredSpotUm: number | null;
};

const US_PER_MS = 1000;
const notGiven = (what: string): Quantity => ({ unknownBecause: `${what} is not known. Add it to the machine.` });

/** The numbers that follow from one cell, by key. */
export function numbersOf(parameters: ParameterSet, optics: Optics): Map<string, DerivedNumber> {
  return new Map(derivedNumbers(markOf(parameters, optics)).map((derived) => [derived.key, derived]));
}

function markOf({ values, fill, power }: ParameterSet, optics: Optics): MarkParameters {
  const { wobbleDiameterUm, wobbleFrequencyKhz, frequencyKhz, pulseWidthNs } = values;
  const set = (value: { physical: number } | undefined, what: string): Quantity =>
    value?.physical ?? { unknownBecause: `${what} is not set.` };
  return {
    powerW: power.watts ?? { unknownBecause: 'reason' in power ? power.reason : 'The power is not known.' },
    speedMmPerS: set(values.speedMmPerS, 'The scan speed'),
    ...(frequencyKhz === undefined ? {} : { frequencyKhz: frequencyKhz.physical }),
    ...(pulseWidthNs === undefined ? {} : { pulseWidthNs: pulseWidthNs.physical }),
    lineSpacingUm: set(values.lineSpacingUm, 'The line spacing'),
    passes: values.passes?.physical ?? 1,
    fill,
    ...(wobbleDiameterUm === undefined
      ? {}
      : { wobble: { diameterUm: wobbleDiameterUm.physical, frequencyKhz: set(wobbleFrequencyKhz, 'The wobble frequency') } }),
    spot: spotOf(optics),
    focusOffsetMm: values.focusOffsetMm?.physical ?? 0,
  };
}

function spotOf({ physical, focalLengthMm, measuredSpotUm }: Optics): MarkSpot {
  const { wavelengthNm, m2, beamDiameterMm } = physical;
  const beam = { wavelengthNm, m2: m2 ?? notGiven('The beam’s M²') };
  if (measuredSpotUm !== null) return { spotDiameterUm: measuredSpotUm, ...beam };
  return { ...beam, focalLengthMm, beamDiameterMm: beamDiameterMm ?? notGiven('The beam diameter at the lens') };
}

/** Time of all cells. Where the scan head is not described, the reason stands in its place. */
export function markingTimeOf(cells: readonly { parameters: ParameterSet }[], cellMm: number, physical: PhysicalProfile): MarkingTimeDto {
  let totalS = 0;
  let beamOnS = 0;
  for (const { parameters } of cells) {
    const time = cellTime(parameters, cellMm, physical);
    if ('missingBecause' in time) return { totalS: null, beamOnS: null, missingBecause: time.missingBecause };
    totalS += time.totalS;
    beamOnS += time.beamOnS;
  }
  return { totalS, beamOnS, missingBecause: null };
}

function cellTime({ values, fill, delaysUs }: ParameterSet, cellMm: number, physical: PhysicalProfile) {
  const speedMmPerS = values.speedMmPerS?.physical;
  const lineSpacingUm = values.lineSpacingUm?.physical;
  const { jumpSpeedMmPerS, accelerationMmPerS2 } = physical;
  if (fill === 'outline') return { missingBecause: 'Outline only: no area is filled.' };
  if (speedMmPerS === undefined || lineSpacingUm === undefined) return { missingBecause: 'Scan speed and line spacing are not both set.' };
  if (jumpSpeedMmPerS === undefined) return { missingBecause: 'The machine’s jump speed is not known. Add it to the machine.' };
  const onUs = delaysUs?.laserOn ?? physical.laserOnDelayUs ?? 0;
  const offUs = delaysUs?.laserOff ?? physical.laserOffDelayUs ?? 0;
  const ramp = accelerationMmPerS2 === undefined ? 0 : 2 * runIn(speedMmPerS, accelerationMmPerS2).timeMs;
  const settleMs = delaysUs?.jump === undefined ? (physical.jumpSettleMs ?? 0) : delaysUs.jump / US_PER_MS;
  return filledRectangleTime({
    widthMm: cellMm,
    heightMm: cellMm,
    lineSpacingUm,
    speedMmPerS,
    jumpSpeedMmPerS,
    lineOverheadMs: Math.max(0, (onUs + offUs) / US_PER_MS) + ramp,
    jumpSettleMs: Math.max(0, settleMs),
    pauseBetweenMs: 0,
    passes: values.passes?.physical ?? 1,
    fill,
  });
}
