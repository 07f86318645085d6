import { PANEL_UNITS } from '@proofplate/physics';
import { PARAMETERS, type PanelField } from '@proofplate/recipe-model';
import { formatEntered } from '../../../lib/format';

/** Limits of the panel; which way plus goes where that could be mistaken. */
export function fieldHelp({ parameter, minimum, maximum, step, unit }: PanelField): string | undefined {
  if (parameter === 'focusOffsetMm') return PARAMETERS.focusOffsetMm.help;
  const symbol = PANEL_UNITS[unit].symbol;
  if (minimum === undefined || maximum === undefined) return undefined;
  return `${formatEntered(minimum)} to ${formatEntered(maximum)} ${symbol}${step === undefined ? '' : `, in steps of ${formatEntered(step)}`}`;
}

export function optionsOf<Code extends string>(labels: Readonly<Record<Code, string>>): { value: string; label: string }[] {
  return Object.entries<string>(labels).map(([value, label]) => ({ value, label }));
}
