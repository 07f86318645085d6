import { acceptEntered, PARAMETERS, type Panel, type PanelField, type PhysicalProfile } from '@proofplate/recipe-model';
import type { FieldProblem } from '../common/errors/domain-error';

/** A speed for trying a conversion; pulses per inch need one, its size does not matter. */
const ANY_SPEED_MM_PER_S = 1000;

/** What a single field cannot see: ranges that end before they begin. Pointers are those of the request. */
export function physicalProblems({ frequencyRangeKhz, pulseWidthRangeNs }: PhysicalProfile): FieldProblem[] {
  return [
    ...rangeProblem(frequencyRangeKhz, '#/physical/frequencyRangeKhz/to', 'The highest frequency must be at least the lowest.'),
    ...rangeProblem(pulseWidthRangeNs, '#/physical/pulseWidthRangeNs/to', 'The longest pulse width must be at least the shortest.'),
  ];
}

/** Fields that no person could enter a value into: wrong unit, limits the wrong way round, a percentage of an unknown range, doubles. */
export function panelProblems({ fields }: Panel): FieldProblem[] {
  return fields.flatMap((field, index) => {
    const isDouble = fields.findIndex((other) => other.parameter === field.parameter) < index;
    const double = {
      pointer: `#/panel/fields/${index}/parameter`,
      detail: `${PARAMETERS[field.parameter].label} is on the panel already.`,
    };
    return [...(isDouble ? [double] : []), ...fieldProblems(field, `#/panel/fields/${index}`)];
  });
}

function fieldProblems(field: PanelField, pointer: string): FieldProblem[] {
  const meaning = PARAMETERS[field.parameter];
  if (!meaning.panelUnits.includes(field.unit)) {
    return [{ pointer: `${pointer}/unit`, detail: `${meaning.label} is not measured in this unit. Choose another one.` }];
  }
  const { minimum, maximum, rangeLow, rangeHigh } = field;
  if (minimum !== undefined && maximum !== undefined && minimum >= maximum) {
    return [{ pointer: `${pointer}/maximum`, detail: 'The largest value must be above the smallest.' }];
  }
  if (rangeLow !== undefined && rangeHigh !== undefined && rangeLow >= rangeHigh) {
    return [{ pointer: `${pointer}/rangeHigh`, detail: 'The value at 100 % must be above the value at 0 %.' }];
  }
  return isConvertible(field) ? [] : [{ pointer: `${pointer}/rangeHigh`, detail: rangeNeeded(field) }];
}

/** Tries a value without the field's own limits. */
function isConvertible({ minimum: _minimum, maximum: _maximum, step: _step, choices: _choices, ...field }: PanelField): boolean {
  const entry = acceptEntered(field, { value: 1, unit: field.unit }, { speedMmPerS: ANY_SPEED_MM_PER_S });
  return entry.kind === 'accepted' || entry.reason !== 'not convertible';
}

function rangeNeeded({ unit }: PanelField): string {
  if (unit === 'W') return 'Say how many watts 100 % are; without it a field in watts is no share of anything.';
  return 'A percentage needs its range: say which values 0 % and 100 % stand for.';
}

function rangeProblem(range: { from: number; to: number } | undefined, pointer: string, detail: string): FieldProblem[] {
  return range !== undefined && range.to < range.from ? [{ pointer, detail }] : [];
}
