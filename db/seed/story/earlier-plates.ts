import { schema } from '@proofplate/db';
import { cellAddress, type ParameterSet } from '@proofplate/recipe-model';
import { PUBLISHED_RUNS, type PublishedRun } from '../published/plastic-marking-doe16';
import { authored, type Turn } from '../stage/stage';
import { type Cast, effectOf } from './cast';
import { CELL_MM, careIds, GAP_MM, INVENTED, keysOf } from './coupon-planning';
import { WORK } from './coupon-specs';
import type { World } from './coupons';
import { PUBLISHED_PANEL } from './published-panel';
import { enterFactor, enterSetting, powerOf, type StoredFactor } from './setting';
import { teller } from './shop';

const { cell, coupon, measurement, testGrid } = schema;

const EARLIER_LAYOUT = 'earlier-plate';
const CIRCUMSTANCES = ['fill', 'assist', 'cellMm', 'gapMm', 'markedBy', 'profile'];
const COLUMNS_OF_TABLE = 4;
const SOURCE =
  'Published data, not ours: 16-run orthogonal design from leberneids/A-data-driven-approach-to-marking-of-plastic-materials-by-laser-micro-machining (MIT licence, © 2023 Lluís Barnadas Fíguls). The source states no units, material or machine; the units here are our reading.';

/** Plates burnt before the shop kept a book, and a table from elsewhere. */
export function writeEarlierPlates({ script, cast }: World): void {
  const operator = teller(cast.people.operator);
  script.add(new Date('2026-01-21T10:00:00Z'), operator, (turn) => importOldPlate(turn, cast));
  script.add(new Date('2026-01-22T10:00:00Z'), operator, (turn) => importPublishedTable(turn, cast));
}

type Imported = {
  readonly coupon: Omit<typeof coupon.$inferInsert, 'shopId' | 'id' | 'code' | 'createdBy'>;
  readonly grid: {
    readonly rows: number;
    readonly columns: number;
    readonly rowFactor: StoredFactor | null;
    readonly columnFactor: StoredFactor | null;
  };
  readonly baseSetting: ParameterSet;
  readonly cells: readonly { readonly parameters: ParameterSet; readonly note: string }[];
};

async function importPlate(
  turn: Turn,
  { coupon: values, grid, baseSetting, cells }: Imported,
): Promise<{ id: string; code: string; cellIds: string[] }> {
  const [id, gridId] = [turn.newId(), turn.newId()];
  const code = await turn.nextCode('coupon');
  const { rowFactor, columnFactor, rows, columns } = grid;
  await turn.tx.insert(coupon).values({ ...authored(turn), id, code, isImported: true, state: 'marked', ...values });
  await turn.tx.insert(testGrid).values({
    ...{ ...authored(turn), id: gridId, couponId: id, rows, columns, cellMm: CELL_MM, gapMm: GAP_MM, layoutVersion: EARLIER_LAYOUT },
    ...{ baseSetting: { ...baseSetting }, rowFactor: rowFactor === null ? null : { ...rowFactor } },
    columnFactor: columnFactor === null ? null : { ...columnFactor },
  });
  const placed = cells.map(({ parameters, note: markNote }, index) => {
    const [rowIndex, columnIndex] = [Math.floor(index / columns), index % columns];
    const at = { rowIndex, columnIndex, address: cellAddress(rowIndex, columnIndex), runOrder: index + 1 };
    return {
      shopId: turn.shopId,
      id: turn.newId(),
      couponId: id,
      gridId,
      ...at,
      parameters: { ...parameters },
      markState: 'marked',
      markNote,
    };
  });
  await turn.tx.insert(cell).values(placed);
  const after = { ...values, rows, columns, rowFactor, columnFactor, baseSetting, cells: cells.length };
  await turn.tell({ action: 'coupon.imported', subjectType: 'coupon', subjectId: id, subjectCode: code, after });
  return { id, code, cellIds: placed.map((each) => each.id) };
}

/** A plate from a drawer: speed and power stand on it in pencil, the rest nobody knows any more. */
async function importOldPlate(turn: Turn, cast: Cast): Promise<void> {
  const bench = cast.benches['bench 1'];
  const rowFactor = enterFactor(bench, { parameter: 'speedMmPerS', from: 100, to: 400, count: 4, spacing: 'steps' });
  const columnFactor = enterFactor(bench, { parameter: 'powerPercent', from: 20, to: 100, count: 5, spacing: 'steps' });
  const baseSetting = enterSetting(bench, undefined, { values: {} });
  const cells = rowFactor.levels.flatMap((speedMmPerS) =>
    columnFactor.levels.map((powerPercent) => {
      const values = { powerPercent, speedMmPerS };
      return { parameters: { ...baseSetting, values, power: powerOf(bench, undefined, values) }, note: '' };
    }),
  );
  const unknownFields = ['frequencyKhz', 'lineSpacingUm', 'passes', 'focusOffsetMm', 'hatchAngleDeg', ...CIRCUMSTANCES];
  await importPlate(turn, {
    coupon: {
      ...{
        ...keysOf(cast, WORK.brass),
        title: 'Old brass plate from the drawer',
        lot: '',
        storedAt: 'Drawer 5, at the back',
        calibrationId: null,
      },
      ...{ profileId: bench.profileId, acknowledgedCautionIds: careIds(cast, WORK.brass), unknownFields, markedAt: new Date('2023-05-10') },
      ...{ notes: 'Speed and power stand on the plate in pencil.', isInvented: true, sourceNote: INVENTED },
    },
    grid: { rows: rowFactor.levels.length, columns: columnFactor.levels.length, rowFactor, columnFactor },
    baseSetting,
    cells,
  });
}

async function importPublishedTable(turn: Turn, cast: Cast): Promise<void> {
  const [effect, lens] = [effectOf(cast, 'dark-mark'), cast.lenses.F160];
  const contrast = effect.criteria.filter(({ quantity }) => quantity === 'contrast');
  const {
    id: couponId,
    code,
    cellIds,
  } = await importPlate(turn, {
    coupon: {
      ...{ materialId: cast.materials['not stated'].id, finishId: cast.finishes['as supplied'].id, effectId: effect.id, lensId: lens.id },
      ...{
        machineId: cast.unstatedBench.id,
        profileId: cast.unstatedBench.profileId,
        title: 'Published table: 16 runs on a plastic',
        calibrationId: null,
      },
      ...{ unknownFields: ['passes', 'markedAt', ...CIRCUMSTANCES], criteria: contrast, criteriaRecordedAt: turn.at },
      ...{ notes: 'Lens and effect are placeholders; the source names neither.', isInvented: false, sourceNote: SOURCE },
    },
    grid: { rows: PUBLISHED_RUNS.length / COLUMNS_OF_TABLE, columns: COLUMNS_OF_TABLE, rowFactor: null, columnFactor: null },
    baseSetting: publishedSetting({}),
    cells: PUBLISHED_RUNS.map((run) => ({ parameters: publishedSetting(valuesOf(run)), note: asPrinted(run) })),
  });
  const rows = PUBLISHED_RUNS.map(({ udiContrast }, index) => ({
    ...{ ...authored(turn), id: turn.newId(), cellId: cellIds[index] ?? '', quantity: 'contrast', value: udiContrast / 100, unit: '1' },
    ...{ method: 'verifier', instrument: 'Not stated (published table)', measuredAt: turn.at },
  }));
  await turn.tx.insert(measurement).values(rows);
  const after = rows.map(({ shopId: _shop, createdAt: _at, createdBy: _by, ...each }) => each);
  await turn.tell({ action: 'coupon.cells-measured', subjectType: 'coupon', subjectId: couponId, subjectCode: code, after });
}

const valuesOf = ({ width, laserpower, speed, pulsefrequency }: PublishedRun) => ({
  ...{ lineSpacingUm: width, powerPercent: laserpower, speedMmPerS: speed, frequencyKhz: pulsefrequency },
});
/** The whole row, so that nobody takes the units for the source's. */
const asPrinted = ({ width, laserpower, speed, pulsefrequency, udiContrast, contrast1, percentage }: PublishedRun) =>
  `Units are our reading. As printed: Width ${width}, Laserpower ${laserpower}, Speed ${speed}, Pulsefrequency ${pulsefrequency}, UDIcontrast ${udiContrast}, Contrast1 ${contrast1}, percentage ${percentage}.`;

/** The table tells percents of a source that nobody names: there are no watts. */
function publishedSetting(values: Parameters<typeof enterSetting>[2]['values']): ParameterSet {
  const machine = { panel: PUBLISHED_PANEL, physical: { sourceKind: 'fibre-q-switched', wavelengthNm: 1064, ratedPowerW: 1 } } as const;
  const setting = enterSetting(machine, undefined, { values });
  return { ...setting, power: { watts: null, reason: 'The published table states no watts.' } };
}
