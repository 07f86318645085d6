import {
  arealDose,
  areaRate,
  averageIrradiance,
  interactionTime,
  peakFluence,
  pulseEnergy,
  pulsePitch,
  scansPerPass,
} from '@proofplate/physics';
import { workPower } from '../power/work-power';
import type { ParameterKey } from '../vocabulary/parameters';
import type { PhysicalProfile } from '../vocabulary/profile';
import type { MarkStep, ParameterValues } from '../vocabulary/setting';
import { spotOnWork } from './spot-on-work';
import type {
  Found,
  KeptNumber,
  PulsedOrNot,
  TransferCalibration,
  TransferNumbers,
  TransferPlace,
  TransferReason,
  TransferSide,
} from './transfer-ground';

/** The one pulse width of a source that has only one; undefined: it is settable, or nobody has stated it. */
export function fixedPulseWidthNs({ pulseWidthsNs }: PhysicalProfile): number | undefined {
  return pulseWidthsNs?.length === 1 ? pulseWidthsNs[0] : undefined;
}

/** The table that says what this setting gives in watts, with the watts. */
export function calibratedWatts(
  { profile, calibrations }: TransferPlace,
  parameters: ParameterValues,
): { readonly watts: number; readonly calibration: TransferCalibration } | undefined {
  for (const calibration of calibrations) {
    const power = workPower({ profile, calibration, parameters });
    if (power.watts !== null && power.basis === 'calibration') return { watts: power.watts, calibration };
  }
  return undefined;
}

/**
 * The numbers of a step that a transfer starts from.
 *
 * @param step   mark step as stored
 * @param place  the machine and lens it runs on
 * @returns the numbers, or every reason why one of them is missing; watts come from a power table, never from a rated percent
 * Source: docs/science/transfer.md
 */
export function sourceNumbers({ parameters }: MarkStep, place: TransferPlace): Found<TransferNumbers> {
  const { values, fill } = parameters;
  const speedMmPerS = positiveOf(values, 'speedMmPerS');
  const spacing = positiveOf(values, 'lineSpacingUm');
  const spot = spotOnWork(place, values.focusOffsetMm?.physical ?? 0, 'source');
  const power = calibratedWatts(place, values);
  const isPulsed = values.frequencyKhz !== undefined;
  const pulseWidthNs = values.pulseWidthNs?.physical ?? fixedPulseWidthNs(place.profile);
  const reasons: TransferReason[] = [
    ...(values.powerPercent === undefined ? [notSet('power')] : power === undefined ? [noTable(place, beamOf(values), 'source')] : []),
    ...(speedMmPerS === undefined ? [notSet('scan speed')] : []),
    ...(spacing === undefined && fill !== 'outline' ? [notSet('line spacing')] : []),
    ...(isPulsed && pulseWidthNs === undefined ? [unknownWidth(place, 'source')] : []),
    ...(spot.reasons ?? []),
  ];
  if (reasons.length > 0 || power === undefined || speedMmPerS === undefined || spot.value === undefined) return { reasons };
  if (power.watts <= 0)
    return { reasons: [{ code: 'not set', text: 'The power of the source setting is zero: there is nothing to keep.' }] };
  return {
    value: {
      spotUm: spot.value,
      powerW: power.watts,
      speedMmPerS,
      frequencyKhz: values.frequencyKhz?.physical ?? null,
      pulseWidthNs: isPulsed ? (pulseWidthNs ?? null) : null,
      lineSpacingUm: fill === 'outline' ? null : (spacing ?? null),
      scans: (values.passes?.physical ?? 1) * scansPerPass(fill),
    },
  };
}

const beamOf = ({ frequencyKhz, pulseWidthNs }: ParameterValues): PulsedOrNot => ({
  frequencyKhz: frequencyKhz?.physical ?? null,
  pulseWidthNs: pulseWidthNs?.physical ?? null,
});

/** A percent from the minimum may stand for zero, which no formula can divide by. */
function positiveOf(values: ParameterValues, key: ParameterKey): number | undefined {
  const physical = values[key]?.physical;
  return physical !== undefined && physical > 0 ? physical : undefined;
}

/** What a transfer keeps, by the same formulas for both sides. */
export function keptNumbers(source: TransferNumbers, target: TransferNumbers): KeptNumber[] {
  const before = judgedNumbers(source);
  const after = new Map(judgedNumbers(target).map(({ key, value }) => [key, value]));
  return before.flatMap(({ value, ...described }) => {
    const reached = after.get(described.key);
    return reached === undefined ? [] : [{ ...described, source: value, target: reached, deviation: (reached - value) / value }];
  });
}

/** Beam-on time of the target over that of the source: of the filled area, or of the line where only an outline is drawn. */
export function timeRatioOf(source: TransferNumbers, target: TransferNumbers): number {
  if (source.lineSpacingUm === null || target.lineSpacingUm === null) return source.speedMmPerS / target.speedMmPerS;
  const rate = ({ speedMmPerS, scans }: TransferNumbers, spacingUm: number) => areaRate(speedMmPerS, spacingUm) / scans;
  return rate(source, source.lineSpacingUm) / rate(target, target.lineSpacingUm);
}

type Judged = Pick<KeptNumber, 'key' | 'label' | 'unit'> & { readonly value: number };

function judgedNumbers(numbers: TransferNumbers): Judged[] {
  const { spotUm, powerW, speedMmPerS, frequencyKhz, lineSpacingUm, scans } = numbers;
  const along: Judged[] =
    frequencyKhz === null
      ? [
          { key: 'averageIrradiance', label: 'Irradiance', unit: 'W/mm²', value: averageIrradiance(powerW, spotUm) },
          { key: 'interactionTime', label: 'Interaction time', unit: 'µs', value: interactionTime(spotUm, speedMmPerS) },
        ]
      : [
          { key: 'peakFluence', label: 'Peak fluence', unit: 'J/cm²', value: peakFluence(pulseEnergy(powerW, frequencyKhz), spotUm) },
          { key: 'pitchPerSpot', label: 'Pulse pitch over spot', unit: '1', value: pulsePitch(speedMmPerS, frequencyKhz) / spotUm },
        ];
  if (lineSpacingUm === null) return along;
  return [
    ...along,
    { key: 'spacingPerSpot', label: 'Line spacing over spot', unit: '1', value: lineSpacingUm / spotUm },
    { key: 'arealDose', label: 'Dose of all scans', unit: 'J/mm²', value: arealDose({ powerW, speedMmPerS, lineSpacingUm, scans }) },
  ];
}

const notSet = (what: string): TransferReason => ({ code: 'not set', text: `The source setting has no ${what}.` });

export const unknownWidth = ({ machineName }: TransferPlace, side: TransferSide): TransferReason => ({
  code: 'limit unknown',
  text: `The pulse width of ${machineName} is not known. Enter it on the machine’s page.`,
  side,
});

/** Which table somebody has to measure. */
export function noTable({ machineName }: TransferPlace, { frequencyKhz, pulseWidthNs }: PulsedOrNot, side: TransferSide): TransferReason {
  const at = [
    ...(frequencyKhz === null ? [] : [`${Number(frequencyKhz.toPrecision(4))} kHz`]),
    ...(pulseWidthNs === null ? [] : [`${pulseWidthNs} ns`]),
  ].join(' and ');
  const text = `No power table of ${machineName} holds ${at === '' ? 'here' : `at ${at}`}. Measure the power there and enter it on the machine’s page.`;
  return { code: 'calibration missing', text, side };
}
