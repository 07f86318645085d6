import type { ParameterKey } from '../vocabulary/parameters';
import type { ParameterSet, ParameterValues, SetValue, WorkPower } from '../vocabulary/setting';
import { cellAddress } from './cell-address';

export type GridFactor = { parameter: ParameterKey; levels: readonly SetValue[] };

/** Two crossed factors over a base setting; without a row factor the grid is a single row. */
export type CrossedGrid = { columns: GridFactor; rows?: GridFactor; base: ParameterSet };

export type GridCell = { address: string; row: number; column: number; parameters: ParameterSet };

/**
 * Every cell of a crossed grid with its full parameter set, row by row.
 *
 * @param grid    factors with their levels, and the base setting that holds everything else
 * @param powerOf average power of a cell's values (workPower with the machine's profile and calibration)
 * @returns one cell per pair of levels, addressed A1, A2, …
 * @throws RangeError if both factors vary the same parameter or a factor has no levels
 */
export function cellsOfGrid({ columns, rows, base }: CrossedGrid, powerOf: (values: ParameterValues) => WorkPower): GridCell[] {
  if (rows?.parameter === columns.parameter) throw new RangeError('rows and columns must vary different parameters');
  if (columns.levels.length === 0 || rows?.levels.length === 0) throw new RangeError('a factor needs at least one level');
  const rowValues: ParameterValues[] = rows === undefined ? [{}] : rows.levels.map((level) => ({ [rows.parameter]: level }));
  return rowValues.flatMap((rowValue, row) =>
    columns.levels.map((level, column) => {
      const values: ParameterValues = { ...base.values, ...rowValue, [columns.parameter]: level };
      return { address: cellAddress(row, column), row, column, parameters: { ...base, values, power: powerOf(values) } };
    }),
  );
}
