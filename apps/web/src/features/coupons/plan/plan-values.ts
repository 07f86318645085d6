import {
  type Assist,
  type Fill,
  type LevelSpacing,
  PARAMETER_KEYS,
  type Panel,
  type ParameterKey,
  showValue,
} from '@proofplate/recipe-model';
import { formatEntered, shopLengthUnit } from '../../../lib/format';
import { typedLength, typedNumber } from '../../../lib/read-number';
import type { Coupon, ParameterSet } from '../coupons.api';

export type FactorValues = { parameter: ParameterKey | ''; from: string; to: string; count: string; spacing: LevelSpacing };
export type SettingValues = { values: Partial<Record<ParameterKey, string>>; fill: Fill; assist: Assist };

/** The plan as it is typed; names are those of the request, so that a refusal finds its field. */
export type PlanValues = {
  title: string;
  materialId: string;
  finishId: string;
  effectId: string;
  machineId: string;
  lensId: string;
  lot: string;
  thicknessMm: string;
  rows: FactorValues;
  columns: FactorValues;
  base: SettingValues;
  labelStep: SettingValues;
  hasLabelStep: boolean;
  isRandom: boolean;
  runOrderSeed: number;
  cellMm: string;
  gapMm: string;
  fillDrawnBy: 'machine' | 'artwork';
  doseCautionJPerMm2: string;
  /** Cautions that the planner says to have read. */
  acknowledgedCautionIds: string[];
};

/** Varied first, where the panel shows them. */
const USUAL_FACTORS: readonly ParameterKey[] = ['speedMmPerS', 'powerPercent', 'frequencyKhz', 'lineSpacingUm', 'passes'];
const SEED_LIMIT = 1_000_000;

export function newSeed(): number {
  const [random = 0] = crypto.getRandomValues(new Uint32Array(1));
  return random % SEED_LIMIT;
}

export function emptyPlan(): PlanValues {
  return {
    ...{ title: '', materialId: '', finishId: '', effectId: '', machineId: '', lensId: '', lot: '', thicknessMm: '' },
    rows: { parameter: '', from: '', to: '', count: '8', spacing: 'ratios' },
    columns: { parameter: '', from: '', to: '', count: '10', spacing: 'steps' },
    base: { values: {}, fill: 'both directions', assist: 'none' },
    labelStep: { values: {}, fill: 'both directions', assist: 'none' },
    ...{
      hasLabelStep: true,
      isRandom: true,
      runOrderSeed: newSeed(),
      cellMm: shopLengthUnit() === 'in' ? formatEntered(0.2) : '5',
      gapMm: formatEntered(shopLengthUnit() === 'in' ? 0.05 : 1.2),
      fillDrawnBy: 'machine',
      doseCautionJPerMm2: '',
    },
    acknowledgedCautionIds: [],
  };
}

/** What may vary on a panel: everything that it shows. */
export const varying = ({ fields }: Panel) => fields.map(({ parameter, label }) => ({ value: parameter, label }));

/** Two factors that the panel shows, kept where they still fit. */
export function factorsFor(
  panel: Panel,
  { rows, columns }: Pick<PlanValues, 'rows' | 'columns'>,
): { rows: ParameterKey | ''; columns: ParameterKey | '' } {
  const shown = USUAL_FACTORS.filter((key) => panel.fields.some(({ parameter }) => parameter === key));
  const kept = (key: ParameterKey | '') => (panel.fields.some(({ parameter }) => parameter === key) ? key : undefined);
  const [keptRows, keptColumns] = [kept(rows.parameter), kept(columns.parameter)];
  const first = keptRows ?? shown.find((key) => key !== keptColumns) ?? '';
  return { rows: first, columns: keptColumns ?? shown.find((key) => key !== first) ?? '' };
}

/** A plan that begins where an earlier coupon was: the same plate, every value as it was typed then. */
export function planFrom(coupon: Coupon, panel: Panel, locale: string): PlanValues {
  const empty = emptyPlan();
  const [grid] = coupon.grids;
  const keys = { materialId: coupon.material.id, finishId: coupon.finish.id, effectId: coupon.effect.id };
  const place = {
    machineId: coupon.machine.id,
    lensId: coupon.lens.id,
    lot: coupon.lot,
    thicknessMm: typedLength(coupon.thicknessMm, locale),
  };
  if (grid === undefined) return { ...empty, ...keys, ...place, title: coupon.title };
  const factor = (stored: typeof grid.rowFactor, usual: FactorValues): FactorValues => {
    const [first, last] = [stored?.levels[0], stored?.levels.at(-1)];
    if (stored === null || first === undefined || last === undefined) return { ...usual, parameter: '' };
    const spacing = stored.spacing === 'ratios' ? 'ratios' : 'steps';
    const text = (level: typeof first) => panelText(panel, stored.parameter, level, locale);
    return { parameter: stored.parameter, from: text(first), to: text(last), count: String(stored.levels.length), spacing };
  };
  return {
    ...empty,
    ...keys,
    ...place,
    title: coupon.title,
    rows: factor(grid.rowFactor, empty.rows),
    columns: factor(grid.columnFactor, empty.columns),
    base: settingFrom(grid.baseSetting, panel, locale),
    labelStep: grid.labelStep === null ? empty.labelStep : settingFrom(grid.labelStep, panel, locale),
    hasLabelStep: grid.labelStep !== null,
    isRandom: grid.runOrderSeed !== null,
    cellMm: typedLength(grid.cellMm, locale),
    gapMm: typedLength(grid.gapMm, locale),
    fillDrawnBy: grid.fillDrawnBy,
  };
}

function settingFrom({ values, fill, assist }: ParameterSet, panel: Panel, locale: string): SettingValues {
  const typed: SettingValues['values'] = {};
  for (const key of PARAMETER_KEYS) {
    const value = values[key];
    if (value !== undefined) typed[key] = panelText(panel, key, value, locale);
  }
  return { values: typed, fill, assist };
}

type Entered = NonNullable<ParameterSet['values']['speedMmPerS']>;

/** In the panel's own unit, since that is what the field stands for. */
function panelText(panel: Panel, parameter: ParameterKey, value: Entered, locale: string): string {
  const field = panel.fields.find((own) => own.parameter === parameter);
  const shown = field === undefined ? null : showValue(field, value);
  return typedNumber(shown?.value ?? value.entered.value, locale);
}
