import { panelValue, percentForPower, powerCalibration } from '@proofplate/physics';
import { acceptEntered } from '../panel/enter-value';
import type { PanelField } from '../panel/panel';
import { panelScale } from '../panel/panel-scale';
import { nearestShowable, roundToPanel } from '../panel/showable';
import { workPower } from '../power/work-power';
import { PARAMETERS, type ParameterKey } from '../vocabulary/parameters';
import type { ParameterSet, ParameterValues, SetValue } from '../vocabulary/setting';
import type { Found, TransferCalibration, TransferPlace, TransferReason } from './transfer-ground';

/** The physical values that a step is to have, before the panel's steps. */
export type Wanted = Partial<Record<ParameterKey, number>> & { readonly powerW: number };
export type Dialled = { readonly parameters: ParameterSet; readonly leftOut: readonly string[] };

/** Keys in the order in which they are read: speed first, since a frequency in pulses per inch needs it. */
const KEYS: readonly ParameterKey[] = [
  'speedMmPerS',
  'frequencyKhz',
  'pulseWidthNs',
  'lineSpacingUm',
  'passes',
  'focusOffsetMm',
  'hatchAngleDeg',
  'angleStepDeg',
];
/** A mark without these is another mark; the angles of the fill may be left out where the panel has none. */
const MAY_BE_LEFT_OUT: readonly ParameterKey[] = ['hatchAngleDeg', 'angleStepDeg'];

/** What a field shows for a physical value, not rounded. @throws RangeError where its unit cannot express it */
export const shownOf = (field: PanelField, physical: number, speedMmPerS?: number): number =>
  panelValue(physical, panelScale(field, field.unit, speedMmPerS));

/** The physical value nearest to a wanted one that the panel can show; undefined where it shows none. */
export function roundPhysical(field: PanelField, physical: number, speedMmPerS?: number): SetValue | undefined {
  try {
    const shown = roundToPanel(field, shownOf(field, physical, speedMmPerS));
    return shown === undefined ? undefined : accepted(field, shown, speedMmPerS);
  } catch (error) {
    if (error instanceof RangeError) return undefined;
    throw error;
  }
}

/** The physical values next to a wanted one that the panel can show. */
export function showableNear(field: PanelField, physical: number): number[] {
  try {
    const shown = shownOf(field, physical);
    const rounded = roundToPanel(field, shown);
    return [...nearestShowable(field, shown), ...(rounded === undefined ? [] : [rounded])].flatMap((near) => {
      const value = accepted(field, near);
      return value === undefined ? [] : [value.physical];
    });
  } catch (error) {
    if (error instanceof RangeError) return [];
    throw error;
  }
}

/**
 * A setting on the panel of a place: each value rounded to what the panel can show, the percent by the inverse of its power table.
 *
 * @param place        machine whose panel it is
 * @param wanted       physical values in the units of their names; powerW is turned into percent
 * @param calibration  table that holds at the wanted frequency and pulse width
 * @param template     fill and assist, which stay
 * @returns the parameters with the watts of the percent as rounded, or why the panel cannot show them
 * Source: docs/science/transfer.md
 */
export function dialIn(
  place: TransferPlace,
  { powerW, ...wanted }: Wanted,
  { calibration, template }: { readonly calibration: TransferCalibration; readonly template: ParameterSet },
): Found<Dialled> {
  const percent = percentOf(powerW, calibration);
  if (percent === undefined) return { reasons: [outsideTable(place, powerW, calibration)] };
  const values: ParameterValues = {};
  const leftOut: string[] = [];
  const reasons: TransferReason[] = [];
  for (const [key, physical] of [...KEYS.map((name) => [name, wanted[name]] as const), ['powerPercent', percent] as const]) {
    if (physical === undefined) continue;
    const field = place.panel.fields.find(({ parameter }) => parameter === key);
    const value = field === undefined ? undefined : roundPhysical(field, physical, values.speedMmPerS?.physical);
    if (value !== undefined) values[key] = value;
    else if (field === undefined && (MAY_BE_LEFT_OUT.includes(key) || isDefault(key, physical))) {
      if (!isDefault(key, physical)) leftOut.push(PARAMETERS[key].label);
    } else reasons.push(noField(place, key));
  }
  if (reasons.length > 0) return { reasons };
  const power = workPower({ profile: place.profile, calibration, parameters: values });
  // delays belong to the scan head that they were found on
  return { value: { parameters: { values, fill: template.fill, assist: template.assist, power }, leftOut } };
}

function percentOf(powerW: number, { points }: TransferCalibration): number | undefined {
  try {
    return percentForPower(powerCalibration(points), powerW);
  } catch (error) {
    if (error instanceof RangeError) return undefined;
    throw error;
  }
}

function accepted(field: PanelField, shown: number, speedMmPerS?: number): SetValue | undefined {
  const entry = acceptEntered(field, { value: shown, unit: field.unit }, speedMmPerS === undefined ? {} : { speedMmPerS });
  return entry.kind === 'accepted' ? entry.value : undefined;
}

/** What a machine does where its panel has no field for it. */
function isDefault(key: ParameterKey, physical: number): boolean {
  if (key === 'passes') return physical === 1;
  return (key === 'focusOffsetMm' || key === 'hatchAngleDeg' || key === 'angleStepDeg') && physical === 0;
}

const noField = ({ machineName }: TransferPlace, key: ParameterKey): TransferReason => ({
  code: 'panel field missing',
  text: `${PARAMETERS[key].label}: the panel of ${machineName} cannot show it. Complete the field on the machine’s page.`,
  side: 'target',
});

export function outsideTable({ machineName }: TransferPlace, powerW: number, { points, measuredOn }: TransferCalibration): TransferReason {
  const watts = points.map((point) => point.powerW);
  const shown = (value: number) => String(Number(value.toPrecision(3)));
  const text = `${shown(powerW)} W lies outside of the power table of ${machineName} of ${measuredOn}, which reads ${shown(Math.min(...watts))} to ${shown(Math.max(...watts))} W. Measure there and enter it on the machine’s page.`;
  return { code: 'calibration missing', text, side: 'target' };
}
