import { schema } from '@proofplate/db';
import { type Criterion, type MeasurementQuantity, QUANTITIES } from '@proofplate/recipe-model';
import { and, eq } from 'drizzle-orm';
import { luminanceOf } from '../photos/colour';
import type { CouponPhotoTruth } from '../photos/render-coupon-photo';
import { authored, type Turn } from '../stage/stage';
import type { Bench } from './cast';
import { exposureOf } from './exposure';
import { bestCell, type CouponRecord, type MarkedCell } from './records';

const { cellRating, coupon, measurement } = schema;

export type Measured = {
  readonly quantity: MeasurementQuantity;
  readonly value: number;
  readonly method: string;
  readonly instrument?: string;
  readonly methodDetail?: Record<string, string>;
};

export async function recordCriteria(turn: Turn, { id, code, criteria }: CouponRecord): Promise<void> {
  const isCoupon = and(eq(coupon.shopId, turn.shopId), eq(coupon.id, id));
  await turn.tx
    .update(coupon)
    .set({ criteria: [...criteria], criteriaRecordedAt: turn.at, version: 4 })
    .where(isCoupon);
  const subject = { subjectType: 'coupon', subjectId: id, subjectCode: code };
  await turn.tell({ action: 'coupon.criteria-recorded', ...subject, before: { criteria: null }, after: { criteria } });
}

/** Everything that a photo and a few instruments tell of the cells. */
export async function measureCells(turn: Turn, record: CouponRecord, bench: Bench): Promise<void> {
  const { id, code, cells, criteria, photoId = null, truth } = record;
  if (truth === undefined) throw new RangeError(`${code} has no photo yet`);
  const truths = new Map(truth.cells.map((each) => [each.address, each]));
  const rows = cells.flatMap((cell) => {
    const found = truths.get(cell.address);
    if (found === undefined) return [];
    const measured = [...fromPhoto(found, truth.groundLab), ...byInstrument(cell, criteria, bench)];
    cell.measured = measured.map(({ quantity, value }) => ({ quantity, value, unit: QUANTITIES[quantity].unit }));
    return measured.map(({ methodDetail = {}, instrument = '', ...each }) => ({
      ...{ ...authored(turn), id: turn.newId(), cellId: cell.id, ...each, methodDetail, instrument, measuredAt: turn.at },
      unit: QUANTITIES[each.quantity].unit,
      photoId: each.method === 'photo' ? photoId : null,
    }));
  });
  await turn.tx.insert(measurement).values(rows);
  const addresses = new Map(cells.map((cell) => [cell.id, cell.address]));
  const after = rows.map(({ shopId: _shop, createdAt: _at, createdBy: _by, cellId, ...each }) => ({
    address: addresses.get(cellId),
    ...each,
  }));
  await turn.tell({ action: 'coupon.cells-measured', subjectType: 'coupon', subjectId: id, subjectCode: code, after });
}

/** One person's ratings, as the model would give them; a proof that meets its criteria is as wanted. */
export async function rateCells(turn: Turn, record: CouponRecord, cells: readonly MarkedCell[], note = ''): Promise<void> {
  if (turn.by.memberId === null) throw new Error('only members rate');
  const memberId = turn.by.memberId;
  const rows = cells.flatMap((cell) => {
    if (cell.mark === undefined) return [];
    const { rating, outcome } = cell.mark;
    cell.rating = rating;
    return [
      {
        shopId: turn.shopId,
        id: turn.newId(),
        cellId: cell.id,
        memberId,
        rating,
        outcome: outcome.replaceAll(' ', '-'),
        tags: [],
        note,
        ratedAt: turn.at,
      },
    ];
  });
  await turn.tx.insert(cellRating).values(rows);
  const addresses = new Map(record.cells.map((cell) => [cell.id, cell.address]));
  const after = rows.map(({ cellId, rating, outcome, tags, note: said }) => ({
    address: addresses.get(cellId),
    rating,
    outcome,
    tags,
    note: said,
  }));
  const subject = { subjectType: 'coupon', subjectId: record.id, subjectCode: record.code };
  await turn.tell({ action: 'coupon.cells-rated', ...subject, before: [], after });
}

/** A second pair of eyes on the cell that the setting is to come from. */
export async function rateBest(turn: Turn, record: CouponRecord): Promise<void> {
  await rateCells(turn, record, [bestCell(record)], 'Seen at 30°, no shine; cloth test passed.');
}

export async function moveOn(turn: Turn, { id, code, photoId }: CouponRecord, to: 'inspected' | 'sealed'): Promise<void> {
  const isCoupon = and(eq(coupon.shopId, turn.shopId), eq(coupon.id, id));
  const by = turn.by.memberId;
  const change =
    to === 'inspected' ? { inspectedAt: turn.at, inspectedBy: by, version: 5 } : { sealedAt: turn.at, sealedBy: by, version: 6 };
  await turn.tx
    .update(coupon)
    .set({ state: to, ...change })
    .where(isCoupon);
  const before = { state: to === 'inspected' ? 'marked' : 'inspected' };
  const after = to === 'inspected' ? { state: to, unratedCells: [] } : { state: to, photoIds: photoId === undefined ? [] : [photoId] };
  await turn.tell({ action: `coupon.${to}`, subjectType: 'coupon', subjectId: id, subjectCode: code, before, after });
}

export const rounded = (value: number, digits: number) => Number(value.toFixed(digits));

/** 100 % less the coefficient of variation of L* inside the cell. */
export const evennessPercent = (lightness: number, deviation: number) => rounded(Math.max(0, 100 * (1 - deviation / lightness)), 1);

function fromPhoto({ lab, evenness }: CouponPhotoTruth['cells'][number], groundLab: readonly number[]): Measured[] {
  const [lightness, a, b] = lab;
  const [bare, marked] = [luminanceOf(groundLab[0] ?? 0), luminanceOf(lightness)];
  return [
    { quantity: 'lightness', value: rounded(lightness, 1), method: 'photo' },
    { quantity: 'a', value: rounded(a, 1), method: 'photo' },
    { quantity: 'b', value: rounded(b, 1), method: 'photo' },
    { quantity: 'contrast', value: rounded(Math.abs(bare - marked) / Math.max(bare, marked), 3), method: 'photo' },
    { quantity: 'evenness', value: evennessPercent(lightness, evenness), method: 'photo' },
  ];
}

const COLORIMETER = {
  method: 'colorimeter',
  instrument: 'Colorimeter no. 1 (invented)',
  methodDetail: { illuminant: 'D65', observer: '10°', geometry: '45/0' },
};
const LEAST_RATING_TO_TEST = 4;
const UM_PER_J_PER_MM2 = 3.2;
/** Share of the plain colour distance that the newer formula usually finds between saturated blues. */
const SHARE_OF_DELTA_E = 0.5;

/** What only instruments and hands can tell, where the effect asks for it and the cell is worth the work. */
export function byInstrument(
  { mark, parameters }: Pick<MarkedCell, 'mark' | 'parameters'>,
  criteria: readonly Criterion[],
  { physical }: Bench,
): Measured[] {
  if (mark === undefined || mark.rating < LEAST_RATING_TO_TEST) return [];
  const depthUm = rounded(UM_PER_J_PER_MM2 * exposureOf(parameters, physical).doseJPerMm2, 1);
  const possible: readonly Measured[] = [
    { quantity: 'wipe-test', value: 25, method: 'manual' },
    { quantity: 'tape-class', value: mark.rating === 5 ? 0 : 1, method: 'manual' },
    { quantity: 'depth', value: depthUm, method: 'profilometer', instrument: 'Stylus no. 3 (invented)' },
    { quantity: 'delta-e-2000', value: rounded(SHARE_OF_DELTA_E * mark.deltaETarget, 2), ...COLORIMETER },
  ];
  return possible.filter(({ quantity }) => criteria.some((criterion) => criterion.quantity === quantity));
}
