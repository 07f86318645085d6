import { Injectable } from '@nestjs/common';
import type { Tx } from '@proofplate/db';
import type { Criterion, Panel, PhysicalProfile, RevisionContent, RouteKind } from '@proofplate/recipe-model';
import { type SQL, sql } from 'drizzle-orm';

export type HoldRow = { id: string; subject: 'recipe' | 'machine'; reason: string; placedBy: string; placedAt: string };
export type SignatureRow = { printedName: string; signedAt: string; isByAuthor: boolean };
export type CellMeasurementRow = { quantity: string; value: number | null; grade: string | null; unit: string; method: string };
export type PhotoRow = {
  shopId: string;
  id: string;
  masterSha256: string | null;
  largeSha256: string | null;
  smallSha256: string | null;
  corners: { x: number; y: number }[] | null;
  widthPx: number | null;
  heightPx: number | null;
  capturedAt: string | null;
  createdAt: string;
};
export type ReferenceCellRow = {
  cellId: string;
  address: string;
  couponCode: string;
  lot: string;
  criteria: Criterion[] | null;
  plate: { rows: number; columns: number; cellMm: number; gapMm: number; layoutVersion: string };
  measurements: CellMeasurementRow[];
  photo: PhotoRow | null;
};
export type ReadingRow = {
  measuredOn: string;
  frequencyKhz: number | null;
  pulseWidthNs: number | null;
  points: { percent: number; watts: number }[];
};
export type AnswerRow = {
  recipeId: string;
  revisionId: string;
  content: RevisionContent;
  contentHash: string;
  route: RouteKind;
  reviewDue: string | null;
  isOverdue: boolean;
  overdueBlocks: boolean;
  profileNumber: number;
  /** The machine is still what it was when the setting was proved. */
  isProfilePresent: boolean;
  panel: Panel;
  physical: PhysicalProfile;
  optics: { focalLengthMm: number; measuredSpotUm: number | null };
  signature: SignatureRow | null;
  holds: HoldRow[];
  reference: ReferenceCellRow | null;
  focus: { workingDistanceMm: number | null; focusMethod: string } | null;
  calibration: ReadingRow | null;
  /** Newest first. */
  laterReadings: ReadingRow[];
  powerShiftPercent: number;
};

@Injectable()
export class FinderAnswersRepository {
  /** Everything that stands beside these approved revisions at the machine, in one query. */
  async answers(tx: Tx, shopId: string, revisionIds: readonly string[]): Promise<AnswerRow[]> {
    if (revisionIds.length === 0) return [];
    const ids = sql.join(
      revisionIds.map((id) => sql`${id}::uuid`),
      sql`, `,
    );
    const rows = await tx.execute<AnswerRow>(sql`
      select v.recipe_id as "recipeId", v.id as "revisionId", v.content, v.content_hash as "contentHash", v.route,
        v.review_due as "reviewDue", coalesce(v.review_due < now(), false) as "isOverdue",
        coalesce((s.policy ->> 'overdueBlocks')::boolean, false) as "overdueBlocks",
        p.number as "profileNumber", p.physical_number = present.physical_number as "isProfilePresent", p.panel, p.physical,
        (select json_build_object('printedName', o.printed_name, 'signedAt', o.signed_at, 'isByAuthor', o.is_by_author) from sign_off o
          where o.shop_id = v.shop_id and o.revision_id = v.id and o.meaning = 'approved' order by o.signed_at desc limit 1) as signature,
        coalesce((select json_agg(json_build_object('id', h.id, 'subject', case when h.recipe_id is null then 'machine' else 'recipe' end,
            'reason', h.reason, 'placedBy', h.placed_by_name, 'placedAt', h.created_at) order by h.created_at)
          from hold h where h.shop_id = v.shop_id and h.released_at is null
            and (h.recipe_id = r.id or h.machine_id = r.machine_id)), '[]'::json) as holds,
        (select json_build_object('workingDistanceMm', ml.working_distance_mm, 'focusMethod', ml.focus_method) from machine_lens ml
          where ml.shop_id = r.shop_id and ml.machine_id = r.machine_id and ml.lens_id = r.lens_id) as focus,
        (select json_build_object('focalLengthMm', l.focal_length_mm, 'measuredSpotUm', ml.measured_spot_um) from lens l
          left join machine_lens ml on ml.shop_id = l.shop_id and ml.machine_id = r.machine_id and ml.lens_id = l.id
          where l.shop_id = r.shop_id and l.id = r.lens_id) as optics,
        case when k.id is null then null else ${readingOf(sql`k`)} end as calibration,
        coalesce((select json_agg(${readingOf(sql`n`)} order by n.measured_on desc, n.id desc) from power_calibration n
          where n.shop_id = k.shop_id and n.machine_id = k.machine_id and (n.measured_on, n.id) > (k.measured_on, k.id)), '[]'::json)
          as "laterReadings",
        coalesce((s.policy ->> 'powerShiftPercent')::double precision, 0) as "powerShiftPercent",
        (${referenceCell}) as reference
      from revision_now v
      join recipe r on r.shop_id = v.shop_id and r.id = v.recipe_id
      join shop s on s.id = v.shop_id
      join machine m on m.shop_id = r.shop_id and m.id = r.machine_id
      join machine_profile p on p.shop_id = v.shop_id and p.id = v.profile_id
      left join power_calibration k on k.shop_id = v.shop_id and k.id = v.calibration_id
      join machine_profile present on present.shop_id = m.shop_id and present.machine_id = m.id and present.number = m.profile_number
      where v.shop_id = ${shopId} and v.state = 'approved' and v.id in (${ids})`);
    return [...rows];
  }
}

/** A reading of the power meter as the model weighs it. */
function readingOf(table: SQL): SQL {
  return sql`json_build_object('measuredOn', ${table}.measured_on, 'frequencyKhz', ${table}.frequency_khz,
    'pulseWidthNs', ${table}.pulse_width_ns, 'points', ${table}.points)`;
}

/** The best rated cell that the setting comes from; without one, a cell that proved it. */
const referenceCell = sql`
  select json_build_object('cellId', c.id, 'address', c.address,
    'couponCode', k.code, 'lot', k.lot, 'criteria', k.criteria, 
    'plate', json_build_object('rows', g.rows, 'columns', g.columns, 'cellMm', g.cell_mm, 'gapMm', g.gap_mm, 'layoutVersion', g.layout_version),
    'measurements', coalesce((
      select json_agg(json_build_object('quantity', q.quantity, 'value', q.value, 'grade', q.grade, 'unit', q.unit, 'method', q.method)
        order by q.quantity, q.measured_at desc)
      from measurement q where q.shop_id = c.shop_id and q.cell_id = c.id
        and not exists (select 1 from measurement later where later.shop_id = q.shop_id and later.supersedes_id = q.id)), '[]'::json),
    'photo', (
      select json_build_object('shopId', f.shop_id, 'id', f.id, 'masterSha256', f.master_sha256, 'largeSha256', f.large_sha256,
        'smallSha256', f.small_sha256, 'corners', f.corners, 'widthPx', f.width_px, 'heightPx', f.height_px,
        'capturedAt', f.captured_at, 'createdAt', f.created_at)
      from photo f where f.shop_id = k.shop_id and f.coupon_id = k.id and f.state = 'ready'
      order by f.corners is not null desc, f.id desc limit 1))
  from revision_evidence e
  join cell c on c.shop_id = e.shop_id and c.id = e.cell_id
  join coupon k on k.shop_id = c.shop_id and k.id = c.coupon_id
  join test_grid g on g.shop_id = c.shop_id and g.id = c.grid_id
  where e.shop_id = v.shop_id and e.revision_id = v.id
  order by e.kind = 'basis' desc,
    (select avg(t.rating) from cell_rating t where t.shop_id = c.shop_id and t.cell_id = c.id) desc nulls last, c.id
  limit 1`;
