import { type PulsedTarget, type PulsedTransfer, powerCalibration } from '@proofplate/physics';
import { CALIBRATION_FREQUENCY_TOLERANCE } from '../power/work-power';
import { showableNear } from './dial-in';
import { fieldOf } from './target-limits';
import type { FrequencyBand, FrequencyInterval, TransferPlace } from './transfer-ground';

const ROUNDING_ALLOWANCE = 1e-9;

/** The frequencies at which the target keeps the numbers, with the parts where a power table holds. */
export function frequencyInterval(
  transfer: PulsedTransfer,
  limits: PulsedTarget,
  about: { readonly sourceKhz: number; readonly target: TransferPlace; readonly pulseWidthNs: number | null },
): FrequencyInterval {
  const { lowestFrequencyKhz, pulseEnergyMj, pitchUm } = transfer;
  const { minFrequencyKhz: rangeFromKhz, maxFrequencyKhz: rangeToKhz, maxPowerW, maxSpeedMmPerS } = limits;
  const byPowerKhz = maxPowerW / pulseEnergyMj;
  const bySpeedKhz = maxSpeedMmPerS / pitchUm;
  const ends = [
    { endsBy: 'frequency range', at: rangeToKhz },
    { endsBy: 'rated power', at: byPowerKhz },
    { endsBy: 'scan speed', at: bySpeedKhz },
  ] as const;
  const end = ends.reduce((first, other) => (other.at < first.at ? other : first), ends[0]);
  const isEmpty = !transfer.solvable;
  // met exactly, the two ends are one frequency
  const highestKhz = isEmpty ? end.at : Math.max(end.at, lowestFrequencyKhz);
  const calibrated = isEmpty
    ? []
    : calibratedBands(about.target, { pulseWidthNs: about.pulseWidthNs, fromKhz: lowestFrequencyKhz, toKhz: highestKhz, pulseEnergyMj });
  return {
    ...{ lowestKhz: lowestFrequencyKhz, highestKhz, isEmpty, endsBy: end.endsBy, rangeFromKhz, rangeToKhz, calibrated },
    sourceKhz: about.sourceKhz,
  };
}

type Wanted = {
  readonly pulseWidthNs: number | null;
  readonly fromKhz: number;
  readonly toKhz: number;
  /** Absent: the power is not bound to the frequency, so the table's watts set no end. */
  readonly pulseEnergyMj?: number;
};

/** Where a table holds: within its tolerance of the frequency, and where its watts reach the power that is asked for. */
export function calibratedBands({ calibrations }: TransferPlace, { pulseWidthNs, fromKhz, toKhz, pulseEnergyMj }: Wanted): FrequencyBand[] {
  return calibrations.flatMap((calibration) => {
    const { frequencyKhz, points, id, measuredOn } = calibration;
    if (frequencyKhz === null || !isSameWidth(calibration.pulseWidthNs, pulseWidthNs)) return [];
    const watts = powerCalibration(points).powerW;
    const atLeastKhz = pulseEnergyMj === undefined ? 0 : watts[0] / pulseEnergyMj;
    const atMostKhz = pulseEnergyMj === undefined ? Number.POSITIVE_INFINITY : watts[watts.length - 1] / pulseEnergyMj;
    const from = Math.max(fromKhz, frequencyKhz * (1 - CALIBRATION_FREQUENCY_TOLERANCE), atLeastKhz);
    const to = Math.min(toKhz, frequencyKhz * (1 + CALIBRATION_FREQUENCY_TOLERANCE), atMostKhz);
    return from <= to ? [{ fromKhz: from, toKhz: to, calibrationId: id, measuredOn }] : [];
  });
}

/** The frequency nearest to the source's that lies in a band and on the panel; without one, the nearest that the interval has. */
export function chosenFrequency(
  bands: readonly FrequencyBand[],
  { sourceKhz, fromKhz, toKhz }: { readonly sourceKhz: number; readonly fromKhz: number; readonly toKhz: number },
  target: TransferPlace,
): number {
  const spans = bands.length === 0 ? [{ fromKhz, toKhz }] : bands;
  const reachable = spans.flatMap((span) => {
    const clamped = clamp(sourceKhz, span.fromKhz, span.toKhz);
    const shown = onPanel(target, clamped).filter((khz) => isInside(khz, span.fromKhz, span.toKhz));
    return shown.length === 0 ? [{ khz: clamped, isShown: false }] : shown.map((khz) => ({ khz, isShown: true }));
  });
  const distance = ({ khz }: { khz: number }) => Math.abs(khz - sourceKhz);
  const [best] = [...reachable].sort((one, other) => Number(other.isShown) - Number(one.isShown) || distance(one) - distance(other));
  return best?.khz ?? sourceKhz;
}

export const isInside = (value: number, from: number, to: number): boolean =>
  value >= from * (1 - ROUNDING_ALLOWANCE) && value <= to * (1 + ROUNDING_ALLOWANCE);

export const clamp = (value: number, from: number, to: number): number => Math.min(Math.max(value, from), to);

function onPanel({ panel }: TransferPlace, khz: number): number[] {
  const field = fieldOf(panel, 'frequencyKhz');
  return field === undefined ? [khz] : showableNear(field, khz);
}

function isSameWidth(measured: number | null, set: number | null): boolean {
  if (measured === null || set === null) return measured === set;
  return Math.abs(measured - set) <= ROUNDING_ALLOWANCE * measured;
}
