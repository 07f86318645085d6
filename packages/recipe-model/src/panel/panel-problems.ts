import { PANEL_UNITS } from '@proofplate/physics';
import { PARAMETERS } from '../vocabulary/parameters';
import type { Panel, PanelField } from './panel';

/** What is wrong with a panel as somebody described it; `field` is the place in the order, from 0. */
export type PanelProblem = { field: number; message: string };

/**
 * Everything that keeps a panel from being used: all problems, never just the first.
 *
 * @param panel fields in the order of the machine's control
 * @returns problems in words; empty if the panel can be used
 */
export function panelProblems({ fields }: Panel): PanelProblem[] {
  return fields.flatMap((field, index) => {
    const isRepeated = fields.findIndex((other) => other.parameter === field.parameter) < index;
    const messages = [...(isRepeated ? [`${PARAMETERS[field.parameter].label} stands on the panel twice.`] : []), ...fieldProblems(field)];
    return messages.map((message) => ({ field: index, message }));
  });
}

function fieldProblems(field: PanelField): string[] {
  const { label, minimum, maximum, step, choices, rangeLow, rangeHigh } = field;
  const numbers = [minimum, maximum, step, rangeLow, rangeHigh, ...(choices ?? [])].filter((number) => number !== undefined);
  const problems: [boolean, string][] = [
    [label.trim() === '', 'A field needs the label that the panel shows.'],
    [!numbers.every(Number.isFinite), `${label}: limits, step, choices and range must be numbers.`],
    [!PARAMETERS[field.parameter].panelUnits.includes(field.unit), unitProblem(field)],
    [minimum !== undefined && maximum !== undefined && minimum >= maximum, `${label}: the minimum must be below the maximum.`],
    [step !== undefined && step <= 0, `${label}: the step must be above zero.`],
    [choices !== undefined && choices.length === 0, `${label}: a list of choices needs at least one.`],
    [
      rangeLow !== undefined && rangeHigh !== undefined && rangeLow >= rangeHigh,
      `${label}: the low end of the range must be below its high end.`,
    ],
    ...rangeProblems(field),
  ];
  return problems.filter(([isProblem]) => isProblem).map(([, message]) => message);
}

function unitProblem({ parameter, unit, label }: PanelField): string {
  const allowed = PARAMETERS[parameter].panelUnits.map((known) => PANEL_UNITS[known].label).join(', ');
  return `${label}: ${PARAMETERS[parameter].label} is not shown in ${PANEL_UNITS[unit].label}. Possible: ${allowed}.`;
}

/** A percent of anything but power is a number only with its range; so are watts with the power at 100 %. */
function rangeProblems({ parameter, unit, label, rangeLow, rangeHigh, minimum, maximum, choices }: PanelField): [boolean, string][] {
  const isShare = unit === 'percentFromZero' || unit === 'percentFromMinimum';
  const numbers = [minimum, maximum, ...(choices ?? [])].filter((number) => number !== undefined);
  const needsRange = isShare && parameter !== 'powerPercent';
  return [
    [needsRange && rangeHigh === undefined, `${label}: a percent needs the value at 100 %.`],
    [needsRange && unit === 'percentFromMinimum' && rangeLow === undefined, `${label}: a percent from the minimum needs the value at 0 %.`],
    [isShare && numbers.some((number) => number > 100), `${label}: a percent of the range ends at 100 %.`],
    [unit === 'W' && !(rangeHigh !== undefined && rangeHigh > 0), `${label}: watts need the power at 100 %.`],
  ];
}
