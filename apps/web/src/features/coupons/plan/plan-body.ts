import {
  type EntryContext,
  enterValue,
  neededKeys,
  PARAMETER_KEYS,
  type Panel,
  type PanelField,
  type ParameterKey,
  showValue,
} from '@proofplate/recipe-model';
import { decimalSignOf, type NumberRule, readNumber } from '../../../lib/read-number';
import type { Machine, PlanBody } from '../coupons.api';
import type { FactorValues, PlanValues, SettingValues } from './plan-values';

export type FieldMessage = { name: string; message: string; isMissing: boolean };
export type ReadPlan = { body: PlanBody } | { messages: FieldMessage[] };
type Factor = PlanBody['columns'];
type Typed = NonNullable<PlanBody['labelStep']>;

const RULES = {
  cellMm: { what: 'The side of a cell', unit: 'mm', least: 1, most: 30, isShopLength: true },
  gapMm: { what: 'The gap between cells', unit: 'mm', least: 0.3, most: 10, isShopLength: true },
  thicknessMm: { what: 'The thickness', unit: 'mm', least: 0.001, most: 1000, isShopLength: true },
  doseCautionJPerMm2: { what: 'The dose', unit: 'J/mm²', least: 1e-6, most: 1e6 },
  count: { what: 'The number of levels', unit: '', least: 1, most: 26, isWhole: true },
} as const satisfies Record<string, NumberRule>;
const CHOICES = {
  machineId: 'Choose the machine.',
  lensId: 'Choose the lens.',
  materialId: 'Choose the material.',
  finishId: 'Choose the finish.',
  effectId: 'Choose the effect that is wanted.',
} as const;

/** The machine's profile as far as a setting is read by it. */
export type PlanProfile = { panel: Panel; physical: Machine['profile']['physical'] };

/**
 * The request behind what was typed, or the words at each field, all of them at once. Numbers are read by the panel's rules before
 * anything is sent.
 */
export function planBody(values: PlanValues, profile: PlanProfile | undefined, locale: string): ReadPlan {
  const reader = new Reader(locale);
  for (const [name, message] of Object.entries(CHOICES)) {
    // the keys of CHOICES are keys of the plan
    if (values[name as keyof typeof CHOICES] === '') reader.miss(name, message);
  }
  if (profile === undefined) return { messages: reader.messages };
  const { panel } = profile;
  const { rows, columns, base, labelStep } = values;
  const varied = [rows.parameter, columns.parameter];
  const body = {
    ...pickKeys(values),
    columns: reader.factor('columns', columns, panel),
    ...(rows.parameter === '' ? {} : { rows: reader.factor('rows', rows, panel) }),
    base: reader.setting('base', base, { profile, varied }),
    ...(values.hasLabelStep ? { labelStep: reader.setting('labelStep', labelStep, { profile, varied: [] }) } : {}),
    runOrderSeed: values.isRandom ? values.runOrderSeed : null,
    cellMm: reader.number('cellMm', values.cellMm, RULES.cellMm),
    gapMm: reader.number('gapMm', values.gapMm, RULES.gapMm),
    thicknessMm: reader.optional('thicknessMm', values.thicknessMm, RULES.thicknessMm),
    doseCautionJPerMm2: reader.optional('doseCautionJPerMm2', values.doseCautionJPerMm2, RULES.doseCautionJPerMm2),
    fillDrawnBy: values.fillDrawnBy,
  };
  return reader.messages.length === 0 ? { body } : { messages: reader.messages };
}

/** Collects what cannot be read, so that every field has its say at once. */
class Reader {
  readonly messages: FieldMessage[] = [];
  private readonly context: EntryContext;

  constructor(private readonly locale: string) {
    this.context = { decimalSign: decimalSignOf(locale) };
  }

  miss(name: string, message: string): void {
    this.messages.push({ name, message, isMissing: true });
  }

  number(name: string, text: string, rule: NumberRule): number {
    const read = readNumber(text, rule, this.locale);
    if ('value' in read) return read.value;
    this.messages.push({ name, message: read.message, isMissing: text.trim() === '' });
    return Number.NaN;
  }

  optional(name: string, text: string, rule: NumberRule): number | null {
    return text.trim() === '' ? null : this.number(name, text, rule);
  }

  factor(name: 'rows' | 'columns', { parameter, from, to, count, spacing }: FactorValues, panel: Panel): Factor {
    const field = panel.fields.find((own) => own.parameter === parameter);
    if (field === undefined)
      this.miss(`${name}.parameter`, `Choose what varies ${name === 'rows' ? 'down the rows' : 'across the columns'}.`);
    return {
      parameter: field?.parameter ?? 'speedMmPerS',
      from: this.level(`${name}.from`, from, field),
      to: this.level(`${name}.to`, to, field),
      count: this.number(`${name}.count`, count, RULES.count),
      spacing,
    };
  }

  setting(
    name: string,
    { values, fill, assist }: SettingValues,
    { profile, varied }: { profile: PlanProfile; varied: readonly (ParameterKey | '')[] },
  ): Typed {
    const typed: Typed['values'] = {};
    const { panel } = profile;
    const needed = neededKeys(profile, fill);
    for (const key of PARAMETER_KEYS) {
      const [field, text] = [panel.fields.find(({ parameter }) => parameter === key), values[key]?.trim() ?? ''];
      if (field === undefined || varied.includes(key)) continue;
      // outline has no spacing; what was typed for a fill stays in the form
      if (key === 'lineSpacingUm' && fill === 'outline') continue;
      if (text === '') {
        if (needed.includes(key)) this.miss(`${name}.values.${key}`, `${field.label} is needed. Enter what the panel will show.`);
        continue;
      }
      const entry = enterValue(field, text, { ...this.context, speedMmPerS: this.speedOf(values, panel) });
      if (entry.kind === 'accepted') typed[key] = entry.value.entered;
      else this.messages.push({ name: `${name}.values.${key}`, message: entry.message, isMissing: false });
    }
    return { values: typed, fill, assist };
  }

  /** In the panel's own unit, whatever unit was typed. */
  private level(name: string, text: string, field: PanelField | undefined): number {
    if (text.trim() === '' || field === undefined) {
      this.miss(name, name.endsWith('from') ? 'Enter the first level.' : 'Enter the last level.');
      return Number.NaN;
    }
    const entry = enterValue(field, text, this.context);
    if (entry.kind === 'accepted') return showValue(field, entry.value)?.value ?? entry.value.entered.value;
    this.messages.push({ name, message: entry.message, isMissing: false });
    return Number.NaN;
  }

  /** Pulses per inch need it. */
  private speedOf(values: SettingValues['values'], { fields }: Panel): number | undefined {
    const field = fields.find(({ parameter }) => parameter === 'speedMmPerS');
    const entry = field === undefined ? undefined : enterValue(field, values.speedMmPerS ?? '', this.context);
    return entry?.kind === 'accepted' ? entry.value.physical : undefined;
  }
}

const pickKeys = ({ title, materialId, finishId, effectId, machineId, lensId, lot }: PlanValues) => ({
  ...{ title, materialId, finishId, effectId, machineId, lensId, lot },
});
