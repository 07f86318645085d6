import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { Caution, CautionLevel, CautionScope, MaterialFamily, Panel, PhysicalProfile, SourceKind } from '@proofplate/recipe-model';
import { and, eq, sql } from 'drizzle-orm';
import type { SlotKey } from './finder-slots';

const { caution } = schema;

export type Withdrawal = { readonly by: string; readonly at: string; readonly reason: string };
export type RecipeRow = {
  readonly recipeId: string;
  readonly code: string;
  readonly title: string;
  readonly machineId: string;
  readonly lensId: string;
  readonly materialId: string;
  readonly finishId: string;
  readonly effectId: string;
  readonly groupMaterialIds: readonly string[];
  /** Its scope names a part diameter, so the part turns. */
  readonly isRound: boolean;
  readonly revisionId: string;
  readonly revisionNumber: number;
  readonly state: 'approved' | 'withdrawn';
  readonly withdrawal: Withdrawal | null;
};
export type CatalogueRow = {
  readonly slot: SlotKey;
  readonly id: string;
  readonly name: string;
  /** Family of a material, key of an effect, kind of source of a machine, focal length of a lens; else empty. */
  readonly kind: string;
  readonly words: string;
  readonly physical: PhysicalProfile | null;
  readonly panel: Panel | null;
};

@Injectable()
export class FinderRepository {
  /** Every recipe that is approved, or was until it was withdrawn. One row each, with the scope of the revision that holds now. */
  async recipes(tx: Tx, shopId: string): Promise<RecipeRow[]> {
    const rows = await tx.execute<RecipeRow>(sql`
      select r.id as "recipeId", r.code, r.title, r.machine_id as "machineId", r.lens_id as "lensId", r.material_id as "materialId",
        r.finish_id as "finishId", r.effect_id as "effectId", v.id as "revisionId", v.number as "revisionNumber", v.state,
        v.content #> '{scope,partDiameterMm}' is not null as "isRound",
        coalesce((select json_agg(g.material_id) from material_group_material g
          where g.shop_id = r.shop_id and g.material_group_id = (v.content #>> '{scope,materialGroupId}')::uuid), '[]'::json) as "groupMaterialIds",
        case when v.state = 'withdrawn' then (
          select json_build_object('by', s.printed_name, 'at', s.signed_at, 'reason', s.comment) from sign_off s
          where s.shop_id = v.shop_id and s.revision_id = v.id and s.meaning = 'withdrawn' order by s.signed_at desc limit 1) end as withdrawal
      from (
        select distinct on (recipe_id) shop_id, id, recipe_id, number, state, content from revision_now
        where shop_id = ${shopId} and state in ('approved', 'withdrawn')
        order by recipe_id, state = 'withdrawn', number desc
      ) v
      join recipe r on r.shop_id = v.shop_id and r.id = v.recipe_id
      order by r.code`);
    return [...rows];
  }

  /** What can stand in the slots, with the profile in force of each machine. */
  async catalogue(tx: Tx, shopId: string): Promise<CatalogueRow[]> {
    const rows = await tx.execute<CatalogueRow>(sql`
      select 'machine' as slot, m.id, m.name, m.source_kind as kind, m.name as words, p.physical, p.panel
      from machine m join machine_profile p on p.shop_id = m.shop_id and p.machine_id = m.id and p.number = m.profile_number
      where m.shop_id = ${shopId} and m.archived_at is null
      union all
      select 'lens', id, name, focal_length_mm::text, name, null, null from lens where shop_id = ${shopId} and archived_at is null
      union all
      select 'material', id, name, family, concat_ws(' ', name, grade, standard_designation), null, null
      from material where shop_id = ${shopId} and archived_at is null
      union all
      select 'finish', id, name, '', name, null, null from finish where shop_id = ${shopId} and archived_at is null
      union all
      select 'effect', id, name, key, name, null, null from effect where shop_id = ${shopId} and archived_at is null`);
    return [...rows];
  }

  /** All of the shop's cautions, the shipped ones in their order, then the shop's own. */
  async cautions(tx: Tx, shopId: string): Promise<Caution[]> {
    const rows = await tx
      .select()
      .from(caution)
      .where(and(eq(caution.shopId, shopId), eq(caution.isActive, true)))
      .orderBy(caution.id);
    // a constraint and the request classes of materials are the only ways into these columns
    return rows.map(({ id, level, subject, text, source, appliesTo }) => ({
      id,
      level: level as CautionLevel,
      subject,
      text,
      source,
      appliesTo: appliesTo as CautionScope,
    }));
  }
}

/** Constraints hold these columns to the closed lists. */
export const familyOf = (row: Pick<CatalogueRow, 'kind'>) => row.kind as MaterialFamily;
export const sourceKindOf = (row: Pick<CatalogueRow, 'kind'>) => row.kind as SourceKind;
