import { type MarkParameters, pulseEnergy, pulsePitch, type Quantity } from '@proofplate/physics';
import { markOfSetting, type NumberedSetting } from '../numbers/mark-of-setting';
import type { Optics } from '../numbers/optics';
import { PARAMETER_KEYS, PARAMETERS, type ParameterKey } from '../vocabulary/parameters';
import type { ParameterSet } from '../vocabulary/setting';
import type { CraterCell, CraterSeries } from './crater';

const UJ_PER_MJ = 1000;

export type CraterGround = {
  readonly optics: Optics;
  /** Fields of a plate burnt earlier that nobody knows any more. */
  readonly unknownFields: readonly string[];
};
export type ReadCrater = CraterCell & { readonly pulseEnergyUj: number | null } & (
    | { readonly series: CraterSeries; readonly excludedBecause: null }
    | { readonly series: CraterSeries | null; readonly excludedBecause: string }
  );

/** One crater with its pulse energy, and why it can be no point of a line where it can't. */
export function readCrater(cell: CraterCell, { optics, unknownFields }: CraterGround): ReadCrater {
  const mark = markOfSetting(writtenDown(cell.parameters, unknownFields), optics);
  const energy = energyOf(mark);
  const series = seriesOf(mark);
  const pulseEnergyUj = typeof energy === 'number' ? energy : null;
  const excludedBecause = firstOf(
    reasonOf(energy),
    reasonOf(series),
    cell.diameterUm > 0 ? undefined : 'no crater: this pulse energy lies below the threshold',
    whyNotSeparate(cell, mark),
  );
  if (excludedBecause !== undefined) return { ...cell, pulseEnergyUj, series: isSeries(series) ? series : null, excludedBecause };
  if (!isSeries(series)) throw new Error('a crater without a reason has a series');
  return { ...cell, pulseEnergyUj, series, excludedBecause: null };
}

/** A setting that says of each value whether anybody wrote it down. */
function writtenDown({ values, fill, power }: ParameterSet, unknownFields: readonly string[]): NumberedSetting {
  const unknownBecause: Partial<Record<ParameterKey | 'fill', string>> = {};
  for (const key of PARAMETER_KEYS) {
    if (unknownFields.includes(key)) unknownBecause[key] = `nobody wrote down the ${PARAMETERS[key].label.toLowerCase()} of this plate`;
  }
  if (unknownFields.includes('fill')) unknownBecause.fill = 'nobody wrote down the fill of this plate';
  return { values, fill, power, unknownBecause };
}

function energyOf({ powerW, frequencyKhz }: MarkParameters): Quantity {
  if (frequencyKhz === undefined) return { unknownBecause: 'the beam is continuous: there are no single pulses' };
  if (typeof frequencyKhz !== 'number') return frequencyKhz;
  if (typeof powerW !== 'number') return powerW;
  if (powerW <= 0) return { unknownBecause: 'the power is zero' };
  return UJ_PER_MJ * pulseEnergy(powerW, frequencyKhz);
}

/** Every pass puts one more pulse on each place. */
function seriesOf({ passes, pulseWidthNs, focusOffsetMm }: MarkParameters): CraterSeries | { readonly unknownBecause: string } {
  if (typeof passes !== 'number') return passes;
  if (typeof focusOffsetMm !== 'number') return focusOffsetMm;
  if (pulseWidthNs !== undefined && typeof pulseWidthNs !== 'number') return pulseWidthNs;
  return { pulses: passes, pulseWidthNs: pulseWidthNs ?? null, focusOffsetMm };
}

/** Craters that touch are no circles of one pulse. */
function whyNotSeparate({ diameterUm, parameters }: CraterCell, mark: MarkParameters): string | undefined {
  const { speedMmPerS, frequencyKhz, lineSpacingUm, fill, passes } = mark;
  if (mark.wobble !== undefined) return 'the line is wobbled: pulses fall where no pitch says';
  if (fill === 'crossed') return 'crossed fill: the second scan falls between the pulses of the first';
  if (passes !== 1 && (parameters.values.angleStepDeg?.physical ?? 0) !== 0)
    return 'the fill turns from pass to pass: pulses miss each other';
  if (typeof speedMmPerS !== 'number') return speedMmPerS.unknownBecause;
  if (typeof frequencyKhz !== 'number') return frequencyKhz?.unknownBecause;
  const pitchUm = pulsePitch(speedMmPerS, frequencyKhz);
  if (pitchUm < diameterUm) return `pulses touch: one every ${shown(pitchUm)} µm, craters of ${shown(diameterUm)} µm`;
  if (fill === 'outline') return undefined;
  if (typeof lineSpacingUm !== 'number') return lineSpacingUm.unknownBecause;
  return lineSpacingUm < diameterUm ? `lines touch: ${shown(lineSpacingUm)} µm apart, craters of ${shown(diameterUm)} µm` : undefined;
}

const isSeries = (series: ReturnType<typeof seriesOf>): series is CraterSeries => !('unknownBecause' in series);
const reasonOf = (known: Quantity | CraterSeries): string | undefined =>
  typeof known === 'object' && 'unknownBecause' in known ? known.unknownBecause : undefined;
const firstOf = (...reasons: readonly (string | undefined)[]): string | undefined => reasons.find((reason) => reason !== undefined);
const shown = (value: number): string => String(Number(value.toPrecision(4)));
