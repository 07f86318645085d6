import {
  cellsOfGrid,
  type GridCell,
  levels,
  PARAMETERS,
  type PanelField,
  type ParameterSet,
  runOrder,
  type SetValue,
} from '@proofplate/recipe-model';
import type { FieldProblem } from '../common/errors/domain-error';
import { type Entered, enterSetting, panelField, powerOf, type SettingMachine } from './coupon-plan-setting';
import type { StoredFactor } from './coupons.repository';
import type { PlanCouponDto, PlannedFactorDto } from './dto/plan-coupon.dto';

export type PlannedCell = GridCell & { readonly runOrder: number };
export type PlannedGrid = {
  readonly rows: number;
  readonly columns: number;
  readonly rowFactor: StoredFactor | null;
  readonly columnFactor: StoredFactor | null;
  readonly baseSetting: ParameterSet;
  readonly labelStep: ParameterSet | null;
  readonly cells: readonly PlannedCell[];
};
export type Planned =
  | { readonly kind: 'planned'; readonly grid: PlannedGrid }
  | { readonly kind: 'refused'; readonly problems: FieldProblem[] };

/** More squares than anybody marks and rates by hand. */
const MOST_CELLS = 400;
/** With fewer lines a square shows single lines, not a filled area. */
const LEAST_LINES_IN_CELL = 5;
const UM_PER_MM = 1000;

/** The grid that a request describes, or every field that stands in its way. */
export function planGrid(machine: SettingMachine, dto: PlanCouponDto): Planned {
  const varied = [dto.columns.parameter, ...(dto.rows === undefined ? [] : [dto.rows.parameter])];
  const base = enterSetting(machine, dto.base, { pointer: '#/base', varied });
  const labels = dto.labelStep === undefined ? undefined : enterSetting(machine, dto.labelStep, { pointer: '#/labelStep' });
  const columns = enterFactor(machine, dto.columns, { pointer: '#/columns', base: base.result });
  const rows = dto.rows === undefined ? undefined : enterFactor(machine, dto.rows, { pointer: '#/rows', base: base.result });
  const problems = [
    ...base.problems,
    ...(labels?.problems ?? []),
    ...columns.problems,
    ...(rows?.problems ?? []),
    ...gridProblems(machine, dto),
  ];
  if (problems.length > 0) return { kind: 'refused', problems };
  const crossed = { columns: columns.result, ...(rows === undefined ? {} : { rows: rows.result }), base: base.result };
  const cells = inRunOrder(
    cellsOfGrid(crossed, (values) => powerOf(machine, values)),
    dto.runOrderSeed ?? null,
  );
  const tooCoarse = coarseProblem(cells, dto);
  if (tooCoarse !== undefined) return { kind: 'refused', problems: [tooCoarse] };
  return {
    kind: 'planned',
    grid: {
      rows: rows?.result.levels.length ?? 1,
      columns: columns.result.levels.length,
      rowFactor: rows?.result ?? null,
      columnFactor: columns.result,
      baseSetting: base.result,
      labelStep: labels?.result ?? null,
      cells,
    },
  };
}

/** Cells keep their place; only the order of marking is shuffled. */
export function inRunOrder(cells: readonly GridCell[], seed: number | null): PlannedCell[] {
  if (seed === null) return cells.map((cell, index) => ({ ...cell, runOrder: index + 1 }));
  const place = new Map(runOrder(cells.length, seed).map((cellIndex, order) => [cellIndex, order + 1]));
  return cells.map((cell, index) => ({ ...cell, runOrder: place.get(index) ?? index + 1 }));
}

function enterFactor(
  { panel }: SettingMachine,
  { parameter, from, to, count, spacing }: PlannedFactorDto,
  { pointer, base }: { pointer: string; base: ParameterSet },
): Entered<StoredFactor> {
  const nothing: StoredFactor = { parameter, spacing, levels: [] };
  const field = panelField(panel, parameter);
  if (field === undefined) {
    const detail = `${PARAMETERS[parameter].label} is not on this machine’s panel. Choose something that it shows.`;
    return { result: nothing, problems: [{ pointer: `${pointer}/parameter`, detail }] };
  }
  const speedMmPerS = base.values.speedMmPerS?.physical;
  const found = levels({ from, to, count, spacing, field, ...(speedMmPerS === undefined ? {} : { speedMmPerS }) });
  if (found.kind === 'levels') return { result: { ...nothing, levels: found.values }, problems: [] };
  return { result: nothing, problems: [{ pointer: `${pointer}/${blamedEnd(field, { from, to, count })}`, detail: found.message }] };
}

/** The field that the message is about: an end that the panel refuses by itself, else the number of levels. */
function blamedEnd(field: PanelField, { from, to, count }: { from: number; to: number; count: number }): 'from' | 'to' | 'count' {
  const isRefused = (value: number) => levels({ from: value, to: value, count: 1, spacing: 'steps', field }).kind === 'refused';
  if (isRefused(from)) return 'from';
  if (isRefused(to) || from === to || count === 1) return 'to';
  return 'count';
}

function gridProblems({ panel }: SettingMachine, { columns, rows, base }: PlanCouponDto): FieldProblem[] {
  const problems: FieldProblem[] = [];
  if (rows?.parameter === columns.parameter)
    problems.push({ pointer: '#/rows/parameter', detail: 'Rows and columns vary the same. Choose another parameter for one of them.' });
  const cells = columns.count * (rows?.count ?? 1);
  if (cells > MOST_CELLS)
    problems.push({
      pointer: '#/columns/count',
      detail: `${cells} cells are too many to mark and judge by hand. Take ${MOST_CELLS} at most, and look closer with the next coupon.`,
    });
  const factors = [columns, ...(rows === undefined ? [] : [rows])];
  if (base.fill === 'outline' && factors.some(({ parameter }) => parameter === 'lineSpacingUm'))
    problems.push({ pointer: '#/base/fill', detail: 'An outline has no line spacing to vary. Choose a fill.' });
  const isPerInch = panelField(panel, 'frequencyKhz')?.unit === 'ppi';
  if (isPerInch && factors.some(({ parameter }) => parameter === 'speedMmPerS'))
    problems.push({
      pointer: '#/columns/parameter',
      detail: 'This panel sets pulses per inch, so the frequency would follow the speed. Vary the pulses per inch instead.',
    });
  return problems;
}

function coarseProblem(cells: readonly PlannedCell[], { cellMm, base }: PlanCouponDto): FieldProblem | undefined {
  if (base.fill === 'outline') return undefined;
  const widest = cells.map(({ parameters }) => parameters.values.lineSpacingUm).reduce(wider, undefined);
  if (widest === undefined || widest.physical * LEAST_LINES_IN_CELL <= cellMm * UM_PER_MM) return undefined;
  const detail = `A cell of ${cellMm} mm would hold fewer than ${LEAST_LINES_IN_CELL} lines. Take a larger cell or a closer line spacing.`;
  return { pointer: '#/cellMm', detail };
}

function wider(widest: SetValue | undefined, next: SetValue | undefined): SetValue | undefined {
  return widest === undefined || (next !== undefined && next.physical > widest.physical) ? next : widest;
}
