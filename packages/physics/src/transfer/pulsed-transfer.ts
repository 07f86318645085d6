import { requirePositive } from '../arguments/require-positive';
import { areaRate } from '../exposure/area-rate';
import { arealDose } from '../exposure/areal-dose';
import { peakFluence } from '../exposure/peak-fluence';
import { pulseEnergy } from '../exposure/pulse-energy';
import { pulsePitch } from '../exposure/pulse-pitch';

export type PulsedSetting = {
  readonly powerW: number;
  readonly frequencyKhz: number;
  readonly speedMmPerS: number;
  readonly spotDiameterUm: number;
  readonly lineSpacingUm: number;
};

export type PulsedTarget = {
  readonly spotDiameterUm: number;
  readonly maxPowerW: number;
  readonly maxPulseEnergyMj: number;
  readonly minFrequencyKhz: number;
  readonly maxFrequencyKhz: number;
  readonly maxSpeedMmPerS: number;
};

/** What the other spot asks for, whatever the frequency. */
type Kept = {
  readonly spotRatio: number;
  readonly pulseEnergyMj: number;
  readonly pitchUm: number;
  readonly lineSpacingUm: number;
  readonly peakFluenceJPerCm2: number;
  readonly arealDoseJPerMm2: number;
  readonly lowestFrequencyKhz: number;
  readonly highestFrequencyKhz: number;
};

export type PulsedTransfer =
  | (Kept & {
      readonly solvable: true;
      readonly frequencyKhz: number;
      readonly powerW: number;
      readonly speedMmPerS: number;
      readonly areaRateMm2PerS: number;
      /** Marking time on the target over marking time on the source, beam on. */
      readonly timeRatio: number;
    })
  | (Kept & { readonly solvable: false; readonly reason: 'pulse energy above limit' | 'frequency interval empty' });

/** A limit met exactly must not be missed by rounding. */
const ROUNDING_ALLOWANCE = 1e-9;

/**
 * A pulsed setting carried to another spot size within the limits of the target.
 *          r = d2/d1; E2 = E1 r^2; pitch2 = pitch1 r; h2 = h1 r; f2 in [f_min, min(f_max, P_max/E2, v_max/pitch2)] nearest f1
 *
 * @param source  setting that works: power W, frequency kHz, speed mm/s, 1/e^2 spot um, line spacing um, all finite, > 0
 * @param target  spot um and limits of the other machine or lens, all finite, > 0
 * @returns kept numbers and, when there is one, the setting; else the reason why there is none
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for the same wavelength and pulse width; keeps peak fluence, overlaps and areal dose per scan, not the heat flow. The
 * result is a proposal that needs a coupon, never a proven setting.
 * Source: dimensional analysis; docs/science/transfer.md
 */
export function pulsedTransfer(source: PulsedSetting, target: PulsedTarget): PulsedTransfer {
  requirePositive(source);
  requirePositive(target);
  const kept = keptNumbers(source, target);
  const { lowestFrequencyKhz, highestFrequencyKhz, pulseEnergyMj, pitchUm, lineSpacingUm } = kept;
  if (pulseEnergyMj > target.maxPulseEnergyMj * (1 + ROUNDING_ALLOWANCE))
    return { ...kept, solvable: false, reason: 'pulse energy above limit' };
  if (highestFrequencyKhz < lowestFrequencyKhz * (1 - ROUNDING_ALLOWANCE))
    return { ...kept, solvable: false, reason: 'frequency interval empty' };
  const frequencyKhz = Math.min(Math.max(source.frequencyKhz, lowestFrequencyKhz), Math.max(highestFrequencyKhz, lowestFrequencyKhz));
  const speedMmPerS = pitchUm * frequencyKhz;
  const areaRateMm2PerS = areaRate(speedMmPerS, lineSpacingUm);
  return {
    ...kept,
    solvable: true,
    frequencyKhz,
    powerW: pulseEnergyMj * frequencyKhz,
    speedMmPerS,
    areaRateMm2PerS,
    timeRatio: areaRate(source.speedMmPerS, source.lineSpacingUm) / areaRateMm2PerS,
  };
}

function keptNumbers(source: PulsedSetting, target: PulsedTarget): Kept {
  const { powerW, speedMmPerS, lineSpacingUm, frequencyKhz, spotDiameterUm } = source;
  const spotRatio = target.spotDiameterUm / spotDiameterUm;
  const sourceEnergyMj = pulseEnergy(powerW, frequencyKhz);
  const pulseEnergyMj = sourceEnergyMj * spotRatio ** 2;
  const pitchUm = pulsePitch(speedMmPerS, frequencyKhz) * spotRatio;
  return {
    spotRatio,
    pulseEnergyMj,
    pitchUm,
    lineSpacingUm: lineSpacingUm * spotRatio,
    peakFluenceJPerCm2: peakFluence(sourceEnergyMj, spotDiameterUm),
    arealDoseJPerMm2: arealDose({ powerW, speedMmPerS, lineSpacingUm, scans: 1 }),
    lowestFrequencyKhz: target.minFrequencyKhz,
    highestFrequencyKhz: Math.min(target.maxFrequencyKhz, target.maxPowerW / pulseEnergyMj, target.maxSpeedMmPerS / pitchUm),
  };
}
