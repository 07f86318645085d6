import { Injectable } from '@nestjs/common';
import { COUPON_STATE_LABELS, type CouponState } from '@proofplate/recipe-model';
import { stringify } from 'csv-stringify/sync';
import type { Actor } from '../common/actor';
import { decodeCursor, type Page, pageOf } from '../common/pagination/page';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import type { PlatePhotoDto } from '../photos/dto/photo.dto';
import { PhotosService } from '../photos/photos.service';
import { toCouponSummaryDto } from './coupon-faces.mapper';
import { type CouponFilter, CouponListRepository, type FaceCell } from './coupon-list.repository';
import type { CouponView } from './coupons.repository';
import type { CouponSummaryDto } from './dto/coupon.dto';
import type { CouponFacetsDto, ListCouponsQuery } from './dto/list-coupons.query.dto';

/** More than a shop burns in years; keeps an export within one answer. */
const EXPORT_LIMIT = 5_000;
const EXPORT_TIMEOUT_MS = 10_000;

@Injectable()
export class CouponListService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly coupons: CouponListRepository,
    private readonly photos: PhotosService,
  ) {}

  async list(actor: Actor, query: ListCouponsQuery): Promise<Page<CouponSummaryDto>> {
    const [createdAt, id] = decodeCursor(query.cursor, ['moment', 'id']) ?? [];
    const after = createdAt === undefined ? {} : { after: { createdAt: String(createdAt), id: String(id) } };
    return this.unitOfWork.read(actor, async (tx) => {
      const views = await this.coupons.list(tx, actor.shopId, { filter: filterOf(query), limit: query.limit + 1, ...after });
      const shown = views.slice(0, query.limit);
      const ids = shown.map(({ coupon }) => coupon.id);
      const summaryOf = await this.summaries(tx, actor.shopId, shown, await this.photos.platePhotos(tx, actor.shopId, ids));
      return pageOf(views, query.limit, {
        item: summaryOf,
        cursor: ({ coupon }) => [coupon.createdAt.toISOString(), coupon.id],
      });
    });
  }

  async facets(actor: Actor, query: ListCouponsQuery): Promise<CouponFacetsDto> {
    const filter = filterOf(query);
    return this.unitOfWork.read(actor, async (tx) => {
      const states = await this.coupons.facet(tx, actor.shopId, 'state', filter);
      return {
        // a check constraint holds the column to these states
        states: states.map((state) => ({ ...state, label: COUPON_STATE_LABELS[state.value as CouponState] })),
        materials: await this.coupons.facet(tx, actor.shopId, 'materialId', filter),
        effects: await this.coupons.facet(tx, actor.shopId, 'effectId', filter),
        machines: await this.coupons.facet(tx, actor.shopId, 'machineId', filter),
        matchCount: await this.coupons.count(tx, actor.shopId, filter),
        totalCount: await this.coupons.count(tx, actor.shopId, { words: [] }),
      };
    });
  }

  /** All that match, as CSV; cells that a spreadsheet would read as a formula are escaped. */
  async exportCsv(actor: Actor, query: ListCouponsQuery): Promise<string> {
    return this.unitOfWork.read(
      actor,
      async (tx) => {
        const views = await this.coupons.list(tx, actor.shopId, { filter: filterOf(query), limit: EXPORT_LIMIT });
        const summaryOf = await this.summaries(tx, actor.shopId, views);
        return stringify(views.map(summaryOf).map(csvRow), { header: true, bom: true, escape_formulas: true, columns: CSV_COLUMNS });
      },
      { statementTimeoutMs: EXPORT_TIMEOUT_MS },
    );
  }

  private async summaries(
    tx: Tx,
    shopId: string,
    views: readonly CouponView[],
    photos: ReadonlyMap<string, PlatePhotoDto> = new Map(),
  ): Promise<(view: CouponView) => CouponSummaryDto> {
    const ids = views.map(({ coupon }) => coupon.id);
    const cells = await this.coupons.faceCells(tx, shopId, ids);
    const byCoupon = new Map<string, FaceCell[]>(ids.map((id) => [id, []]));
    for (const cell of cells) byCoupon.get(cell.couponId)?.push(cell);
    return (view) => toCouponSummaryDto(view, byCoupon.get(view.coupon.id) ?? [], photos.get(view.coupon.id) ?? null);
  }
}

function filterOf({ state, purpose, materialId, effectId, machineId, q = '' }: ListCouponsQuery): CouponFilter {
  return {
    ...(state === undefined ? {} : { state }),
    ...(purpose === undefined ? {} : { purpose }),
    ...(materialId === undefined ? {} : { materialId }),
    ...(effectId === undefined ? {} : { effectId }),
    ...(machineId === undefined ? {} : { machineId }),
    words: q.split(/\s+/u).filter((word) => word !== ''),
  };
}

const CSV_COLUMNS = [
  'code',
  'title',
  'purpose',
  'state',
  'material',
  'finish',
  'effect',
  'machine',
  'lens',
  'lot',
  'thickness mm',
  'stored at',
  'cells',
  'cells rated',
  'best rating',
  'created at',
  'created by',
  'marked at',
  'invented',
];

function csvRow(coupon: CouponSummaryDto) {
  return [
    coupon.code,
    coupon.title,
    coupon.purpose,
    coupon.state,
    coupon.material.name,
    coupon.finish.name,
    coupon.effect.name,
    coupon.machine.name,
    coupon.lens.name,
    coupon.lot,
    coupon.thicknessMm,
    coupon.storedAt,
    coupon.cellCount,
    coupon.ratedCount,
    coupon.bestRating,
    coupon.createdAt,
    coupon.createdBy,
    coupon.markedAt,
    coupon.isInvented ? 'yes' : 'no',
  ];
}
