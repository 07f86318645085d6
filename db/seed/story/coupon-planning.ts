import { schema } from '@proofplate/db';
import { COUPON_LAYOUT_VERSION, cellAddress, couponLayout } from '@proofplate/imaging';
import { cautionsFor, cellsOfGrid, type ParameterSet, runOrder } from '@proofplate/recipe-model';
import { seedOf } from '../photos/noise';
import { authored, type Turn } from '../stage/stage';
import { type Cast, effectOf } from './cast';
import type { CouponSpec, ProofSpec, WorkSpec } from './coupon-specs';
import type { CouponRecord, MarkedCell, RevisionRecord } from './records';
import { calibrationFor, enterFactor, enterSetting, powerOf, type StoredFactor } from './setting';

const { cell, coupon, testGrid } = schema;

export const CELL_MM = 5;
export const GAP_MM = 1.2;
export const INVENTED = 'Invented numbers of the demo shop. They describe no real machine or material.';
const REFERENCE_DIGITS = 8;

export type PlateGrid = {
  readonly rows: number;
  readonly columns: number;
  readonly rowFactor: StoredFactor | null;
  readonly columnFactor: StoredFactor | null;
  readonly baseSetting: ParameterSet;
  readonly labelStep: ParameterSet | null;
  readonly runOrderSeed: number | null;
};
type PlacedCell = {
  readonly row: number;
  readonly column: number;
  readonly address: string;
  readonly parameters: ParameterSet;
  readonly runOrder: number;
};
type Plate = { readonly grid: PlateGrid; readonly cells: readonly PlacedCell[]; readonly action: string };
type CouponValues = Pick<typeof coupon.$inferInsert, 'title' | 'purpose' | 'lot' | 'storedAt' | 'calibrationId' | 'confirmsRevisionId'>;

/** Plans a plate that looks for a setting. */
export async function planCoupon(turn: Turn, cast: Cast, spec: CouponSpec): Promise<CouponRecord> {
  const bench = cast.benches[spec.bench];
  const { base } = spec.grid;
  const calibration = calibrationFor(bench, turn.at, base.values);
  const baseSetting = enterSetting(bench, calibration, base);
  const [rowFactor, columnFactor] = [enterFactor(bench, spec.grid.rows), enterFactor(bench, spec.grid.columns)];
  const seed = seedOf(spec.key) % 10_000;
  const placed = cellsOfGrid({ columns: columnFactor, rows: rowFactor, base: baseSetting }, (values) =>
    powerOf(bench, calibration, values),
  );
  const places = new Map(runOrder(placed.length, seed).map((index, order) => [index, order + 1]));
  const [rows, columns] = [rowFactor.levels.length, columnFactor.levels.length];
  const grid = { rows, columns, rowFactor, columnFactor, baseSetting, labelStep: null, runOrderSeed: seed };
  const { title, lot, storedAt } = spec;
  const values = { title, purpose: 'exploration', lot, storedAt, calibrationId: calibration?.id ?? null, confirmsRevisionId: null };
  const cells = placed.map((each, index) => ({ ...each, runOrder: places.get(index) ?? index + 1 }));
  return store(turn, cast, spec, { values, plate: { grid, cells, action: 'coupon.planned' } });
}

/** Plans a plate of equal marks with exactly what a draft says. */
export async function planProof(turn: Turn, cast: Cast, spec: ProofSpec, draft: RevisionRecord): Promise<CouponRecord> {
  const [step] = draft.content.steps;
  if (step === undefined) throw new RangeError(`${spec.proves} has no mark step`);
  const { parameters } = step;
  const grid = {
    rows: 1,
    columns: spec.count,
    rowFactor: null,
    columnFactor: null,
    baseSetting: parameters,
    labelStep: null,
    runOrderSeed: null,
  };
  const cells = Array.from({ length: spec.count }, (_, column) => ({
    ...{ row: 0, column, address: cellAddress(0, column), parameters, runOrder: column + 1 },
  }));
  const { lot, storedAt } = spec;
  const title = `Proof of ${draft.recipeCode}, ${draft.recipeTitle}`;
  const values = { title, purpose: 'confirmation', lot, storedAt, calibrationId: draft.calibrationId, confirmsRevisionId: draft.id };
  return store(turn, cast, spec, { values, plate: { grid, cells, action: 'coupon.planned-as-proof' } });
}

async function store(
  turn: Turn,
  cast: Cast,
  work: WorkSpec,
  { values, plate }: { values: CouponValues; plate: Plate },
): Promise<CouponRecord> {
  const { criteria } = effectOf(cast, work.effect);
  const id = turn.newId();
  const code = await turn.nextCode('coupon');
  const keys = keysOf(cast, work);
  const rest = {
    profileId: cast.benches[work.bench].profileId,
    acknowledgedCautionIds: careIds(cast, work),
    isInvented: true,
    sourceNote: INVENTED,
  };
  await turn.tx.insert(coupon).values({ ...authored(turn), id, code, ...keys, ...values, ...rest });
  const cells = await storeGrid(turn, id, plate);
  const { rows, columns, rowFactor, columnFactor, baseSetting, runOrderSeed } = plate.grid;
  const told = { ...keys, ...values, ...rest, rows, columns, rowFactor, columnFactor, baseSetting, runOrderSeed, cells: cells.length };
  await turn.tell({ action: plate.action, subjectType: 'coupon', subjectId: id, subjectCode: code, after: told });
  const reference = `${code}.${id.replaceAll('-', '').slice(-REFERENCE_DIGITS)}`;
  const layout = couponLayout({ rows, columns, cellMm: CELL_MM, gapMm: GAP_MM, reference });
  return { id, code, lot: values.lot ?? '', layout, cells, criteria, calibrationId: values.calibrationId ?? null };
}

async function storeGrid(turn: Turn, couponId: string, { grid, cells }: Plate): Promise<MarkedCell[]> {
  const gridId = turn.newId();
  const { rowFactor, columnFactor, baseSetting, labelStep, ...size } = grid;
  await turn.tx.insert(testGrid).values({
    ...{ ...authored(turn), id: gridId, couponId, ...size, cellMm: CELL_MM, gapMm: GAP_MM, layoutVersion: COUPON_LAYOUT_VERSION },
    rowFactor: rowFactor === null ? null : { ...rowFactor },
    columnFactor: columnFactor === null ? null : { ...columnFactor },
    baseSetting: { ...baseSetting },
    labelStep: labelStep === null ? null : { ...labelStep },
  });
  const rows = cells.map(({ row: rowIndex, column: columnIndex, ...each }) => ({ ...each, id: turn.newId(), rowIndex, columnIndex }));
  await turn.tx
    .insert(cell)
    .values(rows.map((each) => ({ shopId: turn.shopId, couponId, gridId, ...each, parameters: { ...each.parameters } })));
  return [...rows]
    .sort((one, other) => one.runOrder - other.runOrder)
    .map(({ id, address, parameters }) => ({ id, address, parameters, measured: [] }));
}

/** The five ids that name a piece of work. */
export function keysOf(cast: Cast, { material, finish, effect, bench, lens }: WorkSpec) {
  return {
    materialId: cast.materials[material].id,
    finishId: cast.finishes[finish].id,
    effectId: effectOf(cast, effect).id,
    machineId: cast.benches[bench].id,
    lensId: cast.lenses[lens].id,
  };
}

/** The cautions that whoever plans, drafts or signs this work acknowledges. */
export function careIds(cast: Cast, work: WorkSpec, roundPart = false): string[] {
  const { id: materialId, family } = cast.materials[work.material];
  const subject = {
    ...{ family, materialId, roundPart, effectKey: work.effect },
    finishId: cast.finishes[work.finish].id,
    sourceKind: cast.benches[work.bench].sourceKind,
  };
  return cautionsFor(subject, cast.cautions).flatMap(({ id, level }) => (level === 'care' ? [id] : []));
}
