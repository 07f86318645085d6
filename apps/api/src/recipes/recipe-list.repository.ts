import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { MaterialFamily, SourceKind } from '@proofplate/recipe-model';
import { and, eq, inArray, type SQL, sql } from 'drizzle-orm';
import { containsText } from '../database/contains-text';
import type { RecipeNeed, RecipeState } from './dto/recipe.dto';
import type { EvidencePhoto } from './stored-revision';

const { run } = schema;

/** Whose list it is, and what that person may sign. */
export type Viewer = { readonly shopId: string; readonly memberId: string; readonly maySign: boolean; readonly maySignOwn: boolean };
export type ListFilter = {
  readonly recipeId?: string | undefined;
  readonly state?: RecipeState | undefined;
  readonly materialId?: string | undefined;
  readonly effectId?: string | undefined;
  readonly machineId?: string | undefined;
  readonly q?: string | undefined;
};
export type ListCursor = { readonly rank: number; readonly activeAt: string; readonly id: string };

export type RecipeFaceRow = {
  id: string;
  code: string;
  title: string;
  version: number;
  created_at: string;
  created_by: string;
  material_id: string;
  material_name: string;
  material_family: MaterialFamily;
  finish_id: string;
  finish_name: string;
  effect_id: string;
  effect_name: string;
  effect_key: string;
  machine_id: string;
  machine_name: string;
  source_kind: SourceKind;
  lens_id: string;
  lens_name: string;
  state: RecipeState;
  need: RecipeNeed | null;
  rank: number;
  active_text: string;
  current_id: string | null;
  under_way_id: string | null;
  is_held: boolean;
};
export type FacetRow = {
  facet: 'states' | 'materials' | 'effects' | 'machines' | 'match' | 'total';
  value: string;
  label: string;
  count: number;
};
export type PlateRow = {
  revisionId: string;
  couponId: string;
  couponCode: string;
  cellId: string;
  address: string;
  rowIndex: number;
  columnIndex: number;
  rows: number;
  columns: number;
  cellMm: number;
  gapMm: number;
  photo: EvidencePhoto | null;
};

@Injectable()
export class RecipeListRepository {
  /** What needs this person first, then what moved last. */
  async page(
    tx: Tx,
    viewer: Viewer,
    filter: ListFilter,
    { limit, after }: { limit: number; after?: ListCursor },
  ): Promise<RecipeFaceRow[]> {
    const isAfter =
      after === undefined
        ? sql`true`
        : sql`(rank > ${after.rank} or (rank = ${after.rank} and (active_at, id) < (${after.activeAt}::timestamptz, ${after.id}::uuid)))`;
    const rows = await tx.execute<RecipeFaceRow>(sql`with ${faces(viewer)}
      select face.*, face.active_at::text as active_text from face where ${conditions(filter)} and ${isAfter}
      order by rank, face.active_at desc, id desc limit ${limit}`);
    return [...rows];
  }

  /** Counts of every choice, with the other choices held. */
  async facets(tx: Tx, viewer: Viewer, filter: ListFilter): Promise<FacetRow[]> {
    const without = (...keys: (keyof ListFilter)[]) =>
      conditions(Object.fromEntries(Object.entries(filter).filter(([key]) => !keys.some((left) => left === key))));
    const rows = await tx.execute<FacetRow>(sql`with ${faces(viewer)}
      select 'states' as facet, state as value, state as label, count(*)::int as count from face where ${without('state')} group by state
      union all select 'materials', material_id::text, material_name, count(*)::int from face where ${without('materialId')}
        group by material_id, material_name
      union all select 'effects', effect_id::text, effect_name, count(*)::int from face where ${without('effectId')} group by effect_id, effect_name
      union all select 'machines', machine_id::text, machine_name, count(*)::int from face where ${without('machineId')}
        group by machine_id, machine_name
      union all select 'match', '', '', count(*)::int from face where ${conditions(filter)}
      union all select 'total', '', '', count(*)::int from face
      order by 1, 4 desc, 3`);
    return [...rows];
  }

  /** The first basis cell of each revision with the plate that it lies on. */
  async plates(tx: Tx, shopId: string, revisionIds: readonly string[]): Promise<PlateRow[]> {
    if (revisionIds.length === 0) return [];
    const rows = await tx.execute<PlateRow>(sql`
      select distinct on (e.revision_id) e.revision_id as "revisionId", k.id as "couponId", k.code as "couponCode", c.id as "cellId", c.address,
        c.row_index as "rowIndex", c.column_index as "columnIndex", g.rows, g.columns,
        g.cell_mm as "cellMm", g.gap_mm as "gapMm",
        (select json_build_object('shopId', p.shop_id, 'id', p.id, 'masterSha256', p.master_sha256, 'largeSha256', p.large_sha256,
           'smallSha256', p.small_sha256, 'corners', p.corners, 'widthPx', p.width_px, 'heightPx', p.height_px)
         from photo p where p.shop_id = k.shop_id and p.coupon_id = k.id and p.state = 'ready' order by p.id desc limit 1) as photo
      from revision_evidence e
      join cell c on c.shop_id = e.shop_id and c.id = e.cell_id
      join coupon k on k.shop_id = e.shop_id and k.id = e.coupon_id
      join test_grid g on g.shop_id = c.shop_id and g.id = c.grid_id
      where e.shop_id = ${shopId} and e.kind = 'basis' and e.revision_id = any(${sql.param(`{${revisionIds.join(',')}}`)}::uuid[])
      order by e.revision_id, e.created_at, k.code, c.row_index, c.column_index`);
    return [...rows];
  }

  /** Parts of finished production runs of the last 30 days, by recipe. */
  async recentRuns(tx: Tx, shopId: string, recipeIds: readonly string[]): Promise<{ recipeId: string; good: number; scrap: number }[]> {
    if (recipeIds.length === 0) return [];
    return tx
      .select({
        recipeId: run.recipeId,
        good: sql<number>`sum(${run.goodCount})::int`,
        scrap: sql<number>`sum(${run.scrapCount})::int`,
      })
      .from(run)
      .where(
        and(
          eq(run.shopId, shopId),
          inArray(run.recipeId, [...recipeIds]),
          eq(run.kind, 'production'),
          eq(run.state, 'finished'),
          sql`${run.startedAt} > now() - interval '30 days'`,
        ),
      )
      .groupBy(run.recipeId);
  }
}

/** Every recipe of the shop with how it stands; an approved revision stands before one that is under way. */
function faces({ shopId, memberId, maySign, maySignOwn }: Viewer): SQL {
  return sql`stand as (
    select v.recipe_id,
      (array_agg(v.id) filter (where v.state = 'approved'))[1] as current_id,
      bool_or(v.state = 'approved' and coalesce(v.review_due < now(), false)) as is_due,
      bool_or(v.state = 'scheduled') as is_scheduled, bool_or(v.state = 'in_review') as is_in_review, bool_or(v.state = 'draft') as is_draft,
      bool_or(v.state = 'withdrawn') as is_withdrawn,
      bool_or(v.state = 'in_review' and (${maySignOwn} or (v.created_by <> ${memberId}::uuid and not v.editor_ids ? ${memberId}))) as waits_for_signature,
      bool_or(v.state = 'draft' and v.created_by = ${memberId}::uuid) as is_own_draft,
      max(greatest(v.created_at, v.submitted_at, v.approved_at, v.superseded_at, v.withdrawn_at)) as moved_at
    from revision_now v where v.shop_id = ${shopId} group by v.recipe_id),
  newest as (
    select distinct on (v.recipe_id) v.recipe_id, v.id, v.state, v.created_by
    from revision_now v where v.shop_id = ${shopId} and v.number is not null order by v.recipe_id, v.number desc),
  under_way as (
    select distinct on (v.recipe_id) v.recipe_id, v.id from revision_now v left join newest n on n.recipe_id = v.recipe_id
    where v.shop_id = ${shopId} and (v.state in ('in_review','draft','scheduled') or (v.state = 'returned' and v.id = n.id))
    order by v.recipe_id, array_position(array['in_review','draft','scheduled','returned'], v.state), v.number desc nulls first, v.id desc),
  face as (
    select r.id, r.code, r.title, r.version, r.created_at, r.created_by,
      m.id as material_id, m.name as material_name, m.family as material_family, f.id as finish_id, f.name as finish_name,
      e.id as effect_id, e.name as effect_name, e.key as effect_key, b.id as machine_id, b.name as machine_name, b.source_kind,
      l.id as lens_id, l.name as lens_name, s.current_id, u.id as under_way_id,
      greatest(r.created_at, s.moved_at) as active_at,
      exists (select 1 from hold h where h.shop_id = r.shop_id and h.released_at is null and (h.recipe_id = r.id or h.machine_id = r.machine_id))
        as is_held,
      case when s.is_due then 'due' when s.current_id is not null then 'approved' when s.is_scheduled then 'scheduled'
        when s.is_withdrawn then 'withdrawn' when s.is_in_review then 'in_review' when s.is_draft then 'draft'
        when n.state = 'returned' then 'returned' else 'draft' end as state,
      case when ${maySign} and s.waits_for_signature then 'sign' when ${maySign} and s.is_due then 'review-due'
        when n.state = 'returned' and n.created_by = ${memberId}::uuid and not s.is_draft then 'returned'
        when s.is_own_draft then 'draft' end as need,
      case when ${maySign} and s.waits_for_signature then 0 when ${maySign} and s.is_due then 1
        when n.state = 'returned' and n.created_by = ${memberId}::uuid and not s.is_draft then 2
        when s.is_own_draft then 3 else 9 end as rank
    from recipe r
    join material m on m.shop_id = r.shop_id and m.id = r.material_id
    join finish f on f.shop_id = r.shop_id and f.id = r.finish_id
    join effect e on e.shop_id = r.shop_id and e.id = r.effect_id
    join machine b on b.shop_id = r.shop_id and b.id = r.machine_id
    join lens l on l.shop_id = r.shop_id and l.id = r.lens_id
    left join stand s on s.recipe_id = r.id
    left join newest n on n.recipe_id = r.id
    left join under_way u on u.recipe_id = r.id
    where r.shop_id = ${shopId})`;
}

function conditions({ recipeId, state, materialId, effectId, machineId, q }: ListFilter): SQL {
  const parts = [
    sql`true`,
    ...(recipeId === undefined ? [] : [sql`id = ${recipeId}::uuid`]),
    ...(state === undefined ? [] : [sql`state = ${state}`]),
    ...(materialId === undefined ? [] : [sql`material_id = ${materialId}::uuid`]),
    ...(effectId === undefined ? [] : [sql`effect_id = ${effectId}::uuid`]),
    ...(machineId === undefined ? [] : [sql`machine_id = ${machineId}::uuid`]),
    ...wordsOf(q).map(
      (word) =>
        sql`concat_ws(' ', code, title, material_name, finish_name, effect_name, machine_name, lens_name) ilike ${containsText(word)}`,
    ),
  ];
  return sql.join(parts, sql` and `);
}

/** Each word must be found somewhere. */
const wordsOf = (q = '') => q.split(/\s+/u).filter((word) => word !== '');
