import {
  acceptEntered,
  type EnteredValue,
  type MeasuredCalibration,
  neededKeys,
  PARAMETER_KEYS,
  PARAMETERS,
  type Panel,
  type PanelField,
  type ParameterKey,
  type ParameterSet,
  type ParameterValues,
  type PhysicalProfile,
  type WorkPower,
  workPower,
} from '@proofplate/recipe-model';
import type { FieldProblem } from '../common/errors/domain-error';
import type { TypedSettingDto } from './dto/entered-setting.dto';

/** What a setting is read against. */
export type SettingMachine = {
  readonly panel: Panel;
  readonly physical: PhysicalProfile;
  readonly calibration?: MeasuredCalibration;
};

type TypedValues = Readonly<Partial<Record<ParameterKey, EnteredValue>>>;
export type Entered<Result> = { readonly result: Result; readonly problems: readonly FieldProblem[] };

export const panelField = ({ fields }: Panel, parameter: ParameterKey): PanelField | undefined =>
  fields.find((field) => field.parameter === parameter);

/** Every typed value by the rules of the panel; each refusal points at its field and names the nearest values. */
export function enterValues(panel: Panel, typed: TypedValues, pointer: string): Entered<ParameterValues> {
  const values: ParameterValues = {};
  const problems: FieldProblem[] = [];
  // speed is read first: a frequency in pulses per inch needs it
  const keys = [...PARAMETER_KEYS].sort((a, b) => Number(b === 'speedMmPerS') - Number(a === 'speedMmPerS'));
  for (const key of keys) {
    const entered = typed[key];
    if (entered === undefined) continue;
    const field = panelField(panel, key);
    const at = `${pointer}/${key}`;
    if (field === undefined) {
      problems.push({ pointer: at, detail: `${PARAMETERS[key].label} is not on this machine’s panel. Leave it out.` });
      continue;
    }
    const speed = values.speedMmPerS?.physical;
    const entry = acceptEntered(field, entered, speed === undefined ? {} : { speedMmPerS: speed });
    if (entry.kind === 'accepted') values[key] = entry.value;
    else problems.push({ pointer: at, detail: entry.message });
  }
  return { result: values, problems };
}

export const missingProblem = (key: ParameterKey, pointer: string): FieldProblem => ({
  pointer: `${pointer}/${key}`,
  detail: `${PARAMETERS[key].label} is needed. Enter what the panel will show.`,
});

/** A whole setting as typed, with its watts. */
export function enterSetting(
  machine: SettingMachine,
  typed: TypedSettingDto,
  { pointer, varied = [] }: { pointer: string; varied?: readonly ParameterKey[] },
): Entered<ParameterSet> {
  const { result: values, problems } = enterValues(machine.panel, withoutVaried(typed.values, varied), `${pointer}/values`);
  const missing = neededKeys(machine, typed.fill)
    .filter((key) => !varied.includes(key) && typed.values[key] === undefined)
    .map((key) => missingProblem(key, `${pointer}/values`));
  const { fill, assist, delaysUs } = typed;
  const power = powerOf(machine, values);
  const delays = delaysUs === undefined ? {} : { delaysUs: { ...delaysUs } };
  return { result: { values, fill, assist, ...delays, power }, problems: [...problems, ...missing] };
}

export const powerOf = ({ physical, calibration }: SettingMachine, parameters: ParameterValues): WorkPower =>
  workPower({ profile: physical, parameters, ...(calibration === undefined ? {} : { calibration }) });

/** A base value of what varies means nothing; it is left out rather than refused, so that a changed factor keeps the form. */
function withoutVaried(typed: TypedValues, varied: readonly ParameterKey[]): TypedValues {
  return Object.fromEntries(Object.entries(typed).filter(([key, value]) => value !== undefined && !varied.some((other) => other === key)));
}
