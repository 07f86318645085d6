import { PANEL_UNITS } from '@proofplate/physics';
import {
  ASSIST_LABELS,
  FILL_LABELS,
  PARAMETER_KEYS,
  PARAMETERS,
  type Panel,
  type ParameterKey,
  showNumber,
  showValue,
} from '@proofplate/recipe-model';
import type { PlateFactor } from '../../../components/plate/plate-with-levels';
import { shopDecimalSign } from '../../../lib/format';
import type { Coupon, CouponCell, TestGrid } from '../coupons.api';

type DecimalSign = '.' | ',';
type SetValue = NonNullable<CouponCell['parameters']['values']['powerPercent']>;
export type ShownSetting = {
  key: string;
  label: string;
  value: string;
  unit: string;
  /** What was planned, where something else was really used. */
  planned?: string;
};

/** A value as the machine’s panel shows it, or in its own unit where the panel has no field for it. */
function shown(key: ParameterKey, value: SetValue, { panel, decimalSign }: { panel: Panel; decimalSign: DecimalSign }) {
  const field = panel.fields.find(({ parameter }) => parameter === key);
  const onPanel = field === undefined ? null : showValue(field, value, { decimalSign });
  if (onPanel !== null) return { text: onPanel.text, symbol: onPanel.symbol, spoken: onPanel.spoken, label: field?.label ?? '' };
  const { symbol, spoken } = PANEL_UNITS[value.entered.unit];
  return { text: showNumber(value.entered.value, decimalSign), symbol, spoken, label: PARAMETERS[key].label };
}

/** What was really used, in panel order, with the plan beside it where that differs. */
export function shownSettings(cell: CouponCell, coupon: Coupon, decimalSign: DecimalSign): ShownSetting[] {
  const { panel } = coupon.profile;
  const used = cell.actualParameters ?? cell.parameters;
  const rows = inPanelOrder(panel).flatMap((key): ShownSetting[] => {
    const value = used.values[key];
    const planned = cell.parameters.values[key];
    if (coupon.unknownFields.includes(key)) return [{ key, label: PARAMETERS[key].label, value: 'not known', unit: '' }];
    if (value === undefined) return [];
    const { text, symbol } = shown(key, value, { panel, decimalSign });
    const unit = value.entered.unit === 'count' ? '' : symbol;
    const plan = planned === undefined ? undefined : shown(key, planned, { panel, decimalSign });
    const differs = plan !== undefined && plan.text !== text;
    return [{ key, label: PARAMETERS[key].label, value: text, unit, ...(differs ? { planned: `${plan.text} ${plan.symbol}` } : {}) }];
  });
  const fill = coupon.unknownFields.includes('fill') ? 'not known' : FILL_LABELS[used.fill].toLowerCase();
  return [
    ...rows,
    { key: 'fill', label: 'Fill', value: fill, unit: '' },
    ...(used.assist === 'none' ? [] : [{ key: 'assist', label: 'Assist', value: ASSIST_LABELS[used.assist].toLowerCase(), unit: '' }]),
  ];
}

/** Title and levels of a factor as they are read beside the plate. */
export function factorWords(factor: TestGrid['rowFactor'], panel: Panel, decimalSign: DecimalSign): PlateFactor {
  if (factor === null) return { title: '', levels: [] };
  const levels = factor.levels.map((level) => shown(factor.parameter, level, { panel, decimalSign }));
  const symbol = levels[0]?.symbol ?? '';
  return {
    title: `${PARAMETERS[factor.parameter].label}${symbol === '' ? '' : `, ${symbol}`}`,
    levels: levels.map(({ text }) => text),
  };
}

/** What a screen reader says after the address: "power 60 percent, scan speed 800 millimetres per second". */
export function spokenSetting(cell: CouponCell, grid: TestGrid, panel: Panel): string {
  const { values } = cell.actualParameters ?? cell.parameters;
  const keys = [grid.columnFactor?.parameter, grid.rowFactor?.parameter].filter((key) => key !== undefined);
  const words = keys.flatMap((key) => {
    const value = values[key];
    if (value === undefined) return [];
    const { text, spoken } = shown(key, value, { panel, decimalSign: shopDecimalSign() });
    return [`${PARAMETERS[key].label.toLowerCase()} ${text} ${spoken}`.trim()];
  });
  return [...words, ...(cell.markState === 'skipped' ? ['skipped'] : [])].join(', ');
}

function inPanelOrder(panel: Panel): ParameterKey[] {
  const onPanel = panel.fields.map(({ parameter }) => parameter);
  return [...onPanel, ...PARAMETER_KEYS.filter((key) => !onPanel.includes(key))];
}
