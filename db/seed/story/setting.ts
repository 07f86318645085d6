import {
  type Assist,
  acceptEntered,
  type Fill,
  type GridFactor,
  type LevelSpacing,
  levels,
  PARAMETER_KEYS,
  type Panel,
  type PanelField,
  type ParameterKey,
  type ParameterSet,
  type ParameterValues,
  workPower,
} from '@proofplate/recipe-model';
import type { Bench, Calibration } from './cast';

/** Numbers as the machine's panel shows them. */
export type TypedValues = Readonly<Partial<Record<ParameterKey, number>>>;
export type TypedSetting = { readonly values: TypedValues; readonly fill?: Fill; readonly assist?: Assist };
export type TypedFactor = {
  readonly parameter: ParameterKey;
  readonly from: number;
  readonly to: number;
  readonly count: number;
  readonly spacing: LevelSpacing;
};
export type StoredFactor = GridFactor & { readonly spacing: LevelSpacing };

/** A whole setting as somebody dials it in on a bench, with its watts. */
export function enterSetting(
  bench: Pick<Bench, 'panel' | 'physical'>,
  calibration: Calibration | undefined,
  typed: TypedSetting,
): ParameterSet {
  const values = enterValues(bench.panel, typed.values);
  return { values, fill: typed.fill ?? 'both directions', assist: typed.assist ?? 'none', power: powerOf(bench, calibration, values) };
}

/** The same setting with some values changed. */
export function changeSetting(
  bench: Pick<Bench, 'panel' | 'physical'>,
  calibration: Calibration | undefined,
  before: ParameterSet,
  changed: TypedValues,
): ParameterSet {
  const values = { ...before.values, ...enterValues(bench.panel, changed) };
  return { ...before, values, power: powerOf(bench, calibration, values) };
}

export function powerOf({ physical }: Pick<Bench, 'physical'>, calibration: Calibration | undefined, parameters: ParameterValues) {
  return workPower({ profile: physical, parameters, ...(calibration === undefined ? {} : { calibration }) });
}

/** @throws RangeError with the panel's own words where it cannot show the levels */
export function enterFactor({ panel }: Pick<Bench, 'panel'>, { parameter, from, to, count, spacing }: TypedFactor): StoredFactor {
  const found = levels({ from, to, count, spacing, field: fieldOf(panel, parameter) });
  if (found.kind === 'refused') throw new RangeError(found.message);
  return { parameter, spacing, levels: found.values };
}

/** The newest reading by then; where there are several of one day, the one taken nearest to the setting. */
export function calibrationFor(
  { calibrations }: Bench,
  at: Date,
  { frequencyKhz = 0, pulseWidthNs = 0 }: TypedValues,
): Calibration | undefined {
  const known = calibrations.filter((calibration) => calibration.at <= at);
  const newestDay = known
    .map(({ measuredOn }) => measuredOn)
    .sort()
    .at(-1);
  const distance = (calibration: Calibration) =>
    Math.abs((calibration.frequencyKhz ?? 0) - frequencyKhz) + Math.abs((calibration.pulseWidthNs ?? 0) - pulseWidthNs);
  return known.filter(({ measuredOn }) => measuredOn === newestDay).sort((one, other) => distance(one) - distance(other))[0];
}

function enterValues(panel: Panel, typed: TypedValues): ParameterValues {
  const values: ParameterValues = {};
  for (const parameter of PARAMETER_KEYS) {
    const value = typed[parameter];
    if (value === undefined) continue;
    const field = fieldOf(panel, parameter);
    const entry = acceptEntered(field, { value, unit: field.unit });
    if (entry.kind === 'refused') throw new RangeError(entry.message);
    values[parameter] = entry.value;
  }
  return values;
}

function fieldOf({ fields }: Panel, parameter: ParameterKey): PanelField {
  const field = fields.find((candidate) => candidate.parameter === parameter);
  if (field === undefined) throw new RangeError(`the panel does not show ${parameter}`);
  return field;
}
