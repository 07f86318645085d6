import { physicalValue } from '@proofplate/physics';
import { largestPulseEnergyMj } from '../numbers/machine-limits';
import type { Panel, PanelField } from '../panel/panel';
import { panelScale } from '../panel/panel-scale';
import { isShowable } from '../panel/showable';
import type { ParameterKey } from '../vocabulary/parameters';
import { shownOf } from './dial-in';
import { fixedPulseWidthNs, unknownWidth } from './step-numbers';
import type { Found, TransferPlace, TransferReason } from './transfer-ground';

const SAME = 1e-9;
/** These sources run without pulses of their own setting. */
const MAY_BE_CONTINUOUS: readonly string[] = ['co2', 'diode'];

export const fieldOf = ({ fields }: Panel, parameter: ParameterKey): PanelField | undefined =>
  fields.find((field) => field.parameter === parameter);

/** What the panel's own ends of a field mean in the stored unit; open where it states none or they need what is not known here. */
export function panelEnds(panel: Panel, parameter: 'speedMmPerS' | 'frequencyKhz'): { readonly from?: number; readonly to?: number } {
  const field = fieldOf(panel, parameter);
  if (field === undefined) return {};
  const { choices } = field;
  const from = physicalEnd(field, choices === undefined ? field.minimum : Math.min(...choices));
  const to = physicalEnd(field, choices === undefined ? field.maximum : Math.max(...choices));
  return { ...(from === undefined ? {} : { from }), ...(to === undefined ? {} : { to }) };
}

function physicalEnd(field: PanelField, shown: number | undefined): number | undefined {
  if (shown === undefined) return undefined;
  try {
    return physicalValue(shown, panelScale(field, field.unit));
  } catch (error) {
    // such as pulses per inch, which mean a frequency only at a scan speed
    if (error instanceof RangeError) return undefined;
    throw error;
  }
}

export const isContinuousPlace = ({ profile, panel }: TransferPlace): boolean =>
  MAY_BE_CONTINUOUS.includes(profile.sourceKind) || fieldOf(panel, 'frequencyKhz') === undefined;

/** Pulse widths that the place can be set to: those stated, or the ends of its range. */
export function widthOnPlace(place: TransferPlace, pulseWidthNs: number): Found<boolean> {
  const { profile, panel } = place;
  const field = fieldOf(panel, 'pulseWidthNs');
  if (field === undefined) {
    const fixed = fixedPulseWidthNs(profile);
    return fixed === undefined ? { reasons: [unknownWidth(place, 'target')] } : { value: isSame(fixed, pulseWidthNs) };
  }
  const { pulseWidthsNs, pulseWidthRangeNs } = profile;
  const isListed = pulseWidthsNs === undefined || pulseWidthsNs.some((width) => isSame(width, pulseWidthNs));
  const isInRange = pulseWidthRangeNs === undefined || (pulseWidthNs >= pulseWidthRangeNs.from && pulseWidthNs <= pulseWidthRangeNs.to);
  return { value: isListed && isInRange && isShowable(field, shownOf(field, pulseWidthNs)) };
}

/** The settable width nearest to one that the place does not have, by ratio; undefined where none is stated. */
export function nearestWidthNs({ profile, panel }: TransferPlace, pulseWidthNs: number): number | undefined {
  const field = fieldOf(panel, 'pulseWidthNs');
  const widths = (profile.pulseWidthsNs ?? []).filter((width) => field === undefined || isShowable(field, shownOf(field, width)));
  const distance = (width: number) => Math.abs(Math.log(width / pulseWidthNs));
  return [...widths].sort((one, other) => distance(one) - distance(other))[0];
}

export type PulsedLimits = {
  readonly maxPowerW: number;
  readonly maxPulseEnergyMj: number;
  readonly minFrequencyKhz: number;
  readonly maxFrequencyKhz: number;
  readonly maxSpeedMmPerS: number;
};

/** The limits of a pulsed place at a pulse width, or what is not known of them. The panel may be narrower than the source. */
export function pulsedLimits(place: TransferPlace, pulseWidthNs: number): Found<PulsedLimits> {
  const { profile, panel, machineName } = place;
  const frequency = panelEnds(panel, 'frequencyKhz');
  const fromKhz = highest(profile.frequencyRangeKhz?.from, frequency.from);
  const toKhz = lowest(profile.frequencyRangeKhz?.to, frequency.to);
  const speed = topSpeed(place);
  const energyMj = largestPulseEnergyMj(profile, pulseWidthNs);
  const reasons: TransferReason[] = [
    ...(fromKhz === undefined || toKhz === undefined ? [unknownLimit(`The frequency range of ${machineName}`)] : []),
    ...(energyMj === null ? [unknownLimit(`The largest pulse energy of ${machineName} at ${pulseWidthNs} ns`)] : []),
    ...(speed.reasons ?? []),
  ];
  if (reasons.length > 0 || fromKhz === undefined || toKhz === undefined || energyMj === null || speed.value === undefined)
    return { reasons };
  return {
    value: {
      maxPowerW: profile.ratedPowerW,
      maxPulseEnergyMj: energyMj,
      minFrequencyKhz: fromKhz,
      maxFrequencyKhz: toKhz,
      maxSpeedMmPerS: speed.value,
    },
  };
}

export function topSpeed({ profile, panel, machineName }: TransferPlace): Found<number> {
  const value = lowest(profile.topSpeedMmPerS, panelEnds(panel, 'speedMmPerS').to);
  return value === undefined ? { reasons: [unknownLimit(`The top speed of ${machineName}`)] } : { value };
}

const unknownLimit = (what: string): TransferReason => ({
  code: 'limit unknown',
  text: `${what} is not known. Enter it on the machine’s page.`,
  side: 'target',
});

function highest(...ends: readonly (number | undefined)[]): number | undefined {
  const known = ends.filter((end) => end !== undefined);
  return known.length === 0 ? undefined : Math.max(...known);
}

function lowest(...ends: readonly (number | undefined)[]): number | undefined {
  const known = ends.filter((end) => end !== undefined);
  return known.length === 0 ? undefined : Math.min(...known);
}

const isSame = (one: number, other: number) => Math.abs(one - other) <= SAME * Math.max(Math.abs(one), Math.abs(other));
