import { acceptEntered, type EnteredValue, type Entry, enterValue, PARAMETERS, type ParameterKey } from '@proofplate/recipe-model';
import { decimalSignOf, type NumberRule, readOptionalNumber } from '../../../lib/read-number';
import type { Revision, RevisionChange } from '../recipes.api';
import { DELAY_NAMES, type DraftValues, type RangeValues, type StepValues, storedText } from './draft-values';

type PanelField = Revision['profile']['panel']['fields'][number];
export type FieldMessages = Readonly<Record<string, string>>;
export type ReadDraft = { change: RevisionChange; messages: FieldMessages };

type Context = { fields: readonly PanelField[]; locale: string; messages: Record<string, string> };

const MM: Omit<NumberRule, 'what'> = { unit: 'mm', least: 0, most: 10_000 };
const PAUSE: NumberRule = { what: 'The pause', unit: 's', least: 0, most: 3600 };
const DELAY: Omit<NumberRule, 'what'> = { unit: 'µs', least: -100_000, most: 100_000 };
const NOON = 'T12:00:00.000Z';

/** Reads everything typed. A part that holds a refused entry is left out of the change, so that the rest can still be saved. */
export function readDraft(values: DraftValues, fields: readonly PanelField[], locale: string): ReadDraft {
  const context: Context = { fields, locale, messages: {} };
  const steps = readPart(context, () => values.steps.map((step, index) => readStep(step, `steps.${index}`, context)));
  const setUpSteps = readPart(context, () => readSetUp(values, context));
  const limits = readPart(context, () => ({
    ...range('thicknessMm', values.limits.thicknessMm, 'limits', context),
    ...range('partDiameterMm', values.limits.partDiameterMm, 'limits', context),
    notes: values.limits.notes,
  }));
  const scope = readPart(context, () => readScope(values.scope, context));
  const change: RevisionChange = {
    ...(steps === undefined ? {} : { steps }),
    ...(setUpSteps === undefined ? {} : { setUpSteps }),
    ...(limits === undefined ? {} : { limits }),
    ...(scope === undefined ? {} : { scope }),
    reason: values.reason,
    route: values.route,
    grounds: values.grounds,
    effectiveFrom: values.effectiveFrom === '' ? null : `${values.effectiveFrom}${NOON}`,
    reviewDue: values.reviewDue === '' ? null : `${values.reviewDue}${NOON}`,
    calibrationId: values.calibrationId === '' ? null : values.calibrationId,
    acknowledgedCautionIds: values.acknowledged,
  };
  return { change, messages: context.messages };
}

/** Reads mark steps that are not part of a draft yet. */
export function readSteps(steps: readonly StepValues[], fields: readonly PanelField[], locale: string) {
  const context: Context = { fields, locale, messages: {} };
  return { steps: steps.map((step, index) => readStep(step, `steps.${index}`, context)), messages: context.messages };
}

function readPart<T>({ messages }: Context, read: () => T): T | undefined {
  const before = Object.keys(messages).length;
  const part = read();
  return Object.keys(messages).length === before ? part : undefined;
}

function readStep(step: StepValues, path: string, context: Context) {
  const entered = readSetting(step, `${path}.values`, context);
  const delays = DELAY_NAMES.flatMap((name) => {
    const value = plainNumber(step.delaysUs[name], { ...DELAY, what: 'The delay' }, `${path}.delaysUs.${name}`, context);
    return value === undefined ? [] : [[name, value] as const];
  });
  const pauseAfterS = plainNumber(step.pauseAfterS, PAUSE, `${path}.pauseAfterS`, context) ?? 0;
  return {
    purpose: step.purpose,
    fill: step.fill,
    assist: step.assist,
    values: entered,
    ...(delays.length === 0 ? {} : { delaysUs: Object.fromEntries(delays) }),
    pauseAfterS,
  };
}

/** Speed first: pulses per inch need it. What the panel does not show stays as it was entered. */
function readSetting(step: StepValues, path: string, context: Context): Partial<Record<ParameterKey, EnteredValue>> {
  const onPanel = new Set(context.fields.map(({ parameter }) => parameter));
  const kept = Object.entries(step.stored).filter(([key]) => ![...onPanel].some((own) => own === key));
  const entered: Partial<Record<ParameterKey, EnteredValue>> = Object.fromEntries(kept);
  const inOrder = context.fields.toSorted(
    (one, other) => Number(other.parameter === 'speedMmPerS') - Number(one.parameter === 'speedMmPerS'),
  );
  let speedMmPerS: number | undefined;
  for (const field of inOrder) {
    const read = readField(step, field, { locale: context.locale, ...(speedMmPerS === undefined ? {} : { speedMmPerS }) });
    if (read === undefined) continue;
    if (read.kind === 'refused') {
      context.messages[`${path}.${field.parameter}`] = read.message;
      continue;
    }
    entered[field.parameter] = read.value.entered;
    if (field.parameter === 'speedMmPerS') speedMmPerS = read.value.physical;
  }
  return entered;
}

/** What stands in one field of the panel; undefined: nothing. */
export function readField(
  { values, stored }: StepValues,
  field: PanelField,
  { locale, ...context }: { locale: string; speedMmPerS?: number },
): Entry | undefined {
  const text = values[field.parameter] ?? '';
  if (text.trim() === '') return undefined;
  const entered = stored[field.parameter];
  const how = { decimalSign: decimalSignOf(locale), ...context };
  // "1.125" typed anew could be read in two ways; as it was stored it has one meaning.
  const isAsStored = entered !== undefined && text === storedText(entered, field, locale);
  return isAsStored ? acceptEntered(field, entered, how) : enterValue(field, text, how);
}

function readSetUp({ setUpSteps }: DraftValues, { messages }: Context) {
  return setUpSteps.map(({ text, caution, mustTick, photoId }, index) => {
    if (text.trim() === '') messages[`setUpSteps.${index}.text`] = 'Say what to do, or take the step out.';
    return {
      text: text.trim(),
      mustTick,
      ...(caution.trim() === '' ? {} : { caution: caution.trim() }),
      ...(photoId === '' ? {} : { photoId }),
    };
  });
}

const FEATURE_KINDS = ['filled-area', 'stroke-text', 'single-line', 'code'] as const;

function readScope(scope: DraftValues['scope'], context: Context) {
  const featureKind = FEATURE_KINDS.find((kind) => kind === scope.featureKind);
  return {
    ...range('thicknessMm', scope.thicknessMm, 'scope', context),
    ...range('partDiameterMm', scope.partDiameterMm, 'scope', context),
    ...range('featureSizeMm', scope.featureSizeMm, 'scope', context),
    ...(featureKind === undefined ? {} : { featureKind }),
    ...(scope.customerSpecification.trim() === '' ? {} : { customerSpecification: scope.customerSpecification.trim() }),
    ...(scope.materialGroupId === '' ? {} : { materialGroupId: scope.materialGroupId }),
  };
}

function range<Name extends string>(
  name: Name,
  { from, to }: RangeValues,
  part: string,
  context: Context,
): Partial<Record<Name, { from?: number; to?: number }>> {
  const least = plainNumber(from, { ...MM, what: 'The lower end' }, `${part}.${name}.from`, context);
  const most = plainNumber(to, { ...MM, what: 'The upper end' }, `${part}.${name}.to`, context);
  if (least !== undefined && most !== undefined && least > most) {
    context.messages[`${part}.${name}.to`] = 'The upper end must not lie below the lower end.';
  }
  if (least === undefined && most === undefined) return {};
  const read = { ...(least === undefined ? {} : { from: least }), ...(most === undefined ? {} : { to: most }) };
  // One entry under exactly this name.
  return { [name]: read } as Record<Name, { from?: number; to?: number }>;
}

function plainNumber(text: string, rule: NumberRule, path: string, { locale, messages }: Context): number | undefined {
  const read = readOptionalNumber(text, rule, locale);
  if ('value' in read) return read.value;
  messages[path] = read.message;
  return undefined;
}

/** Label of a panel field as the machine shows it, for messages outside of its field. */
export function fieldLabel(parameter: ParameterKey, fields: readonly PanelField[]): string {
  return fields.find((field) => field.parameter === parameter)?.label ?? PARAMETERS[parameter].label;
}
