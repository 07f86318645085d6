import {
  acceptEntered,
  cellAddress,
  PARAMETER_KEYS,
  type Panel,
  type ParameterKey,
  type ParameterSet,
  type ParameterValues,
  type SetValue,
} from '@proofplate/recipe-model';
import type { FieldProblem } from '../common/errors/domain-error';
import { type ReadCell, readTable, unlimitedField } from './coupon-import-table';
import { powerOf, type SettingMachine } from './coupon-plan-setting';
import type { StoredFactor } from './coupons.repository';
import type { TypedValueDto } from './dto/entered-setting.dto';
import type { ImportCouponDto, KnownFactorDto, RefusedRowDto } from './dto/import-coupon.dto';

export type EarlierCell = {
  readonly address: string;
  readonly row: number;
  readonly column: number;
  readonly parameters: ParameterSet;
  readonly note: string;
};
export type EarlierPlate = {
  readonly rows: number;
  readonly columns: number;
  readonly rowFactor: StoredFactor | null;
  readonly columnFactor: StoredFactor | null;
  readonly baseSetting: ParameterSet;
  readonly cells: readonly EarlierCell[];
  readonly refusedRows: readonly RefusedRowDto[];
  readonly ignoredHeadings: readonly string[];
  readonly unknownFields: readonly string[];
  readonly problems: readonly FieldProblem[];
};

/** A plate burnt earlier, with only what is known of it. */
export function earlierPlate(machine: SettingMachine, dto: ImportCouponDto): EarlierPlate {
  const common = enterKnown(machine.panel, dto.common ?? {}, '#/common');
  const setOf = (values: ParameterValues): ParameterSet => ({
    values,
    // not asked of the plate when unknown: unknownFields says so, and no dose is worked out from it
    fill: dto.fill ?? 'both directions',
    assist: dto.assist ?? 'none',
    power: powerOf(machine, values),
  });
  const laid = dto.table === undefined ? fromGrid(machine.panel, dto) : fromTable(machine.panel, dto.table, dto.decimalSign ?? '.');
  const cells = laid.cells.map(({ row, column, values, note }) => {
    const parameters = setOf({ ...common.values, ...values });
    return { address: cellAddress(row, column), row, column, parameters, note };
  });
  const { rows, columns, rowFactor, columnFactor, refusedRows, ignoredHeadings } = laid;
  return {
    ...{ rows, columns, rowFactor, columnFactor, refusedRows, ignoredHeadings, cells },
    baseSetting: setOf(common.values),
    unknownFields: unknownOf(machine.panel, cells, dto),
    problems: [...common.problems, ...laid.problems, ...formProblems(dto)],
  };
}

type Laid = Pick<EarlierPlate, 'rows' | 'columns' | 'rowFactor' | 'columnFactor' | 'refusedRows' | 'ignoredHeadings' | 'problems'> & {
  readonly cells: readonly ReadCell[];
};

function fromTable(panel: Panel, text: string, decimalSign: '.' | ','): Laid {
  const { cells, refusedRows, ignoredHeadings } = readTable(text, { panel, decimalSign });
  const [rows, columns] = [1 + Math.max(-1, ...cells.map(({ row }) => row)), 1 + Math.max(-1, ...cells.map(({ column }) => column))];
  const none = { pointer: '#/table', detail: 'No row can be read. Begin with a row of headings, such as Cell, Speed (mm/s), Power (%).' };
  return {
    rows,
    columns,
    rowFactor: null,
    columnFactor: null,
    cells,
    refusedRows,
    ignoredHeadings,
    problems: cells.length === 0 ? [none] : [],
  };
}

function fromGrid(panel: Panel, { grid }: ImportCouponDto): Laid {
  const { rows = 0, columns = 0 } = grid ?? {};
  const down = enterFactor(panel, grid?.rowFactor, { pointer: '#/grid/rowFactor', count: rows });
  const across = enterFactor(panel, grid?.columnFactor, { pointer: '#/grid/columnFactor', count: columns });
  const same = down.factor !== null && down.factor.parameter === across.factor?.parameter;
  const double = {
    pointer: '#/grid/columnFactor/parameter',
    detail: 'Rows and columns vary the same. Choose another parameter for one of them.',
  };
  const cells = Array.from({ length: rows * columns }, (_, index) => {
    const [row, column] = [Math.floor(index / columns), index % columns];
    return { row, column, values: { ...levelOf(down.factor, row), ...levelOf(across.factor, column) }, note: '' };
  });
  const problems = [...down.problems, ...across.problems, ...(same ? [double] : [])];
  return { rows, columns, rowFactor: down.factor, columnFactor: across.factor, cells, refusedRows: [], ignoredHeadings: [], problems };
}

function levelOf(factor: StoredFactor | null, index: number): ParameterValues {
  const level = factor?.levels[index];
  return factor === null || level === undefined ? {} : { [factor.parameter]: level };
}

function enterFactor(panel: Panel, known: KnownFactorDto | undefined, { pointer, count }: { pointer: string; count: number }) {
  if (known === undefined) return { factor: null, problems: [] as FieldProblem[] };
  const { parameter } = known;
  const levels: SetValue[] = [];
  const problems: FieldProblem[] = [];
  for (const [index, level] of known.levels.entries()) {
    const entry = acceptEntered(unlimitedField(panel, parameter), level);
    if (entry.kind === 'accepted') levels.push(entry.value);
    else problems.push({ pointer: `${pointer}/levels/${index}`, detail: entry.message });
  }
  if (known.levels.length !== count)
    problems.push({ pointer: `${pointer}/levels`, detail: `Enter ${count} levels, one for each; ${known.levels.length} are there.` });
  const factor: StoredFactor = { parameter, spacing: 'list', levels };
  return { factor, problems };
}

function enterKnown(panel: Panel, typed: Readonly<Partial<Record<ParameterKey, TypedValueDto>>>, pointer: string) {
  const values: ParameterValues = {};
  const problems: FieldProblem[] = [];
  for (const key of PARAMETER_KEYS) {
    const entered = typed[key];
    if (entered === undefined) continue;
    const entry = acceptEntered(unlimitedField(panel, key), entered);
    if (entry.kind === 'accepted') values[key] = entry.value;
    else problems.push({ pointer: `${pointer}/${key}`, detail: entry.message });
  }
  return { values, problems };
}

function formProblems({ grid, table }: ImportCouponDto): FieldProblem[] {
  if (grid === undefined && table === undefined) return [{ pointer: '#/grid', detail: 'Enter the size of the grid, or paste a table.' }];
  if (grid !== undefined && table !== undefined)
    return [{ pointer: '#/table', detail: 'Enter the size of the grid or paste a table, not both.' }];
  return [];
}

/** What nobody knows: of the setting whatever the panel shows and some cell has no value for, and of the circumstances what was left out. */
function unknownOf(panel: Panel, cells: readonly EarlierCell[], dto: ImportCouponDto): string[] {
  const keys = panel.fields
    .map(({ parameter }) => parameter)
    .filter((key) => cells.some(({ parameters }) => parameters.values[key] === undefined));
  const { fill, assist, cellMm, gapMm, markedOn, markedByMe, isMachineUnchanged } = dto;
  const circumstances = { fill, assist, cellMm, gapMm, markedAt: markedOn };
  return [
    ...keys,
    ...Object.entries(circumstances).flatMap(([field, value]) => (value === undefined ? [field] : [])),
    ...(markedByMe === true ? [] : ['markedBy']),
    ...(isMachineUnchanged === true ? [] : ['profile']),
  ];
}
