import { PANEL_UNITS } from '@proofplate/physics';
import {
  ASSIST_LABELS,
  FILL_LABELS,
  type MarkStep,
  PARAMETER_KEYS,
  PARAMETERS,
  type Panel,
  type ParameterKey,
  QUANTITIES,
  type SetValue,
  STEP_PURPOSE_LABELS,
  sameValue,
  showNumber,
  showValue,
} from '@proofplate/recipe-model';
import { compareSides, type Side } from './compared-value';
import type { ComparisonRowDto } from './dto/comparison.dto';
import type { DerivedNumberDto } from './dto/derived-number.dto';
import { essentialDifferences, newestOf } from './evidence-judgement';
import { type NumbersOn, revisionNumbers } from './step-numbers';
import type { EvidenceCell, RevisionRecord } from './stored-revision';

type Row = Omit<ComparisonRowDto, 'isSame' | 'values'> & { readonly sides: readonly Side[] };

/** Rows of a comparison in reading order: what is typed, what reaches the work, what the mark is. */
export function comparisonRows(records: readonly RevisionRecord[], reference: RevisionRecord): ComparisonRowDto[] {
  const stepCount = Math.max(...records.map(({ revision }) => revision.content.steps.length));
  const steps = Array.from({ length: stepCount }, (_, index) => index);
  const rows = [
    ...steps.flatMap((index) => enteredRows(records, reference, index)),
    ...steps.flatMap((index) => workRows(records, index)),
    ...totalRows(records),
    ...markRows(records),
  ];
  const ids = records.map(({ revision }) => revision.id);
  const referenceAt = records.indexOf(reference);
  return rows
    .filter(({ sides }) => sides.some((side) => side.kind !== 'absent' || side.missingBecause !== null))
    .map(({ sides, ...row }) => {
      const values = compareSides(sides, { ids, referenceAt, unit: row.unit });
      return { ...row, isSame: values.every(({ change }) => change === 'same' || change === 'reference'), values };
    });
}

const stepOf = ({ revision }: RevisionRecord, index: number): MarkStep | undefined => revision.content.steps[index];
const word = (text: string | undefined): Side => (text === undefined ? ABSENT : { kind: 'word', text });
const ABSENT: Side = { kind: 'absent', missingBecause: null };

function enteredRows(records: readonly RevisionRecord[], reference: RevisionRecord, index: number): Row[] {
  const row = (key: string, label: string, unit: string, sides: readonly Side[]): Row => ({
    ...{ group: 'entered' as const, key, label, unit, step: index + 1, sides },
  });
  const words = (key: string, label: string, textOf: (step: MarkStep) => string) =>
    row(
      key,
      label,
      '',
      records.map((record) => {
        const step = stepOf(record, index);
        return word(step === undefined ? undefined : textOf(step));
      }),
    );
  return [
    ...panelOrder(reference.profile.panel).map((key) => valueRow(records, reference, { key, index, row })),
    words('fill', 'Fill', ({ parameters }) => FILL_LABELS[parameters.fill]),
    words('assist', 'Assist', ({ parameters }) => ASSIST_LABELS[parameters.assist]),
    words('purpose', 'Purpose of the step', ({ purpose }) => STEP_PURPOSE_LABELS[purpose]),
    row(
      'pauseAfterS',
      'Pause after the step',
      's',
      records.map((record) => numberSide(stepOf(record, index)?.pauseAfterS)),
    ),
  ];
}

/** In the unit of the reference's panel; what that panel cannot express stands as it was typed. */
function valueRow(
  records: readonly RevisionRecord[],
  reference: RevisionRecord,
  { key, index, row }: { key: ParameterKey; index: number; row: (key: string, label: string, unit: string, sides: readonly Side[]) => Row },
): Row {
  const field = reference.profile.panel.fields.find(({ parameter }) => parameter === key);
  const label = field?.label ?? PARAMETERS[key].label;
  const referenceValue = stepOf(reference, index)?.parameters.values[key];
  const unit = field?.unit ?? referenceValue?.entered.unit ?? PARAMETERS[key].unit;
  const sides = records.map((record): Side => {
    const step = stepOf(record, index);
    const value = step?.parameters.values[key];
    if (value === undefined) return ABSENT;
    const speed = step?.parameters.values.speedMmPerS?.physical;
    const shown = field === undefined ? null : showValue(field, value, speed === undefined ? {} : { speedMmPerS: speed });
    return { kind: 'setting', value: shown?.value ?? enteredIn(value, unit), isSameAs: (other) => sameValue(value, other), set: value };
  });
  return row(key, label, PANEL_UNITS[unit].symbol, sides);
}

function enteredIn({ entered, physical }: SetValue, unit: string): number {
  return entered.unit === unit ? entered.value : physical;
}

/** The panel's own order, then what it does not show. */
function panelOrder({ fields }: Panel): ParameterKey[] {
  const shown = fields.map(({ parameter }) => parameter);
  return [...shown, ...PARAMETER_KEYS.filter((key) => !shown.includes(key))];
}

function workRows(records: readonly RevisionRecord[], index: number): Row[] {
  const power: Row = {
    ...{ group: 'work', key: 'powerW', label: 'Average power', unit: 'W', step: index + 1 },
    sides: records.map((record) => {
      const set = stepOf(record, index)?.parameters.power;
      if (set === undefined) return ABSENT;
      return set.watts === null ? { kind: 'absent', missingBecause: set.reason } : numberSide(set.watts);
    }),
  };
  const columns = records.map((record) => {
    const step = stepOf(record, index);
    const [numbers] = step === undefined ? [] : revisionNumbers([step], on(record)).derived;
    // the average power has its row already
    return numbers?.numbers.filter(({ key }) => key !== 'workPower') ?? [];
  });
  const keys = [...new Map(columns.flat().map(({ key, unit }) => [key, unit])).entries()];
  const derived = keys.map(([key, unit]): Row => {
    const sides = columns.map((numbers) => derivedSide(numbers.find((number) => number.key === key)));
    return { group: 'work', key, label: wordsOfKey(key), unit, step: index + 1, sides };
  });
  return [power, ...derived];
}

/** Sums over the steps, as soon as one of the revisions has several. */
function totalRows(records: readonly RevisionRecord[]): Row[] {
  const columns = records.map((record) => {
    const { steps } = record.revision.content;
    const { derived, derivedTotals } = revisionNumbers(steps, on(record));
    return derivedTotals.length > 0 ? derivedTotals : (derived[0]?.numbers ?? []);
  });
  if (records.every(({ revision }) => revision.content.steps.length < 2)) return [];
  return TOTALS.map(({ key, ofOne, label, unit }) => ({
    ...{ group: 'work' as const, key, label, unit, step: null },
    sides: columns.map((numbers) => derivedSide(numbers.find((number) => number.key === key || number.key === ofOne))),
  }));
}

const TOTALS = [
  { key: 'totalArealDose', ofOne: 'arealDose', label: 'Dose of all steps', unit: 'J/mm²' },
  { key: 'totalTimePer100Mm2', ofOne: 'timePer100Mm2', label: 'Time for 100 mm², all steps', unit: 's' },
] as const;

/** Measurements of the first cell, of basis and proof, that was marked with exactly this setting. */
function markRows(records: readonly RevisionRecord[]): Row[] {
  const marks = records.map(markOf);
  const quantities = new Map(marks.flatMap((cell) => cell?.measurements.map((m) => [m.quantity, m.unit] as const) ?? []));
  return [...quantities.entries()].map(([quantity, unit]) => ({
    ...{ group: 'mark' as const, key: quantity, label: labelOf(quantity), unit: unit === '1' ? '' : unit, step: null },
    sides: marks.map((cell): Side => {
      if (cell === undefined) return { kind: 'absent', missingBecause: 'No mark of this setting yet.' };
      const measured = newestOf(cell.measurements, quantity, unit);
      return measured === null ? { kind: 'absent', missingBecause: 'Not measured.' } : numberSide(measured);
    }),
  }));
}

function markOf({ basis, confirmation, revision: { content } }: RevisionRecord): EvidenceCell | undefined {
  return [...basis, ...confirmation].find(
    ({ parameters, coupon }) => essentialDifferences(parameters, content.steps, coupon.unknownFields).length === 0,
  );
}

const on = ({ profile: { physical, panel }, optics }: RevisionRecord): NumbersOn => ({ physical, panel, optics });

function derivedSide(found: DerivedNumberDto | undefined): Side {
  if (found === undefined) return ABSENT;
  return found.value === null ? { kind: 'absent', missingBecause: found.missingBecause } : numberSide(found.value);
}

const numberSide = (value: number | undefined): Side => (value === undefined ? ABSENT : { kind: 'number', value, text: showNumber(value) });
const labelOf = (quantity: string) => Object.entries(QUANTITIES).find(([key]) => key === quantity)?.[1].label ?? quantity;

const SPECIAL_LABELS: Readonly<Record<string, string>> = { timePer100Mm2: 'Time for 100 mm²', arealDose: 'Dose' };

/** A key such as `peakFluence` in words. */
function wordsOfKey(key: string): string {
  const spaced = key.replace(/([A-Z])/gu, ' $1').toLowerCase();
  return SPECIAL_LABELS[key] ?? `${spaced.slice(0, 1).toUpperCase()}${spaced.slice(1)}`;
}
