import type { Actor } from '../common/actor';
import type { PowerShiftDto } from './dto/power-shift.dto';
import type { RecipeFaceDto, RecipeFacetsDto, RecipeHoldDto, RecipeSummaryDto } from './dto/recipe.dto';
import { RECIPE_STATES } from './dto/recipe.dto';
import { type MapPhoto, toEvidencePhotoDto } from './evidence.mapper';
import type { FacetRow, PlateRow, RecipeFaceRow } from './recipe-list.repository';
import { toRevisionBriefDto } from './recipe-revisions.mapper';
import { recipeActions } from './recipes.policy';
import type { HoldRow } from './recipes.repository';
import type { RevisionBrief, StoredSignOff } from './stored-revision';

export type SummaryParts = {
  readonly actor: Pick<Actor, 'role' | 'memberId'>;
  readonly ladders: readonly RevisionBrief[];
  readonly signOffs: readonly StoredSignOff[];
  readonly plates: readonly PlateRow[];
  readonly runs: readonly { recipeId: string; good: number; scrap: number }[];
  readonly checkDue: ReadonlyMap<string, PowerShiftDto>;
  readonly photoUrls: MapPhoto;
};

export function toRecipeSummaryDto(row: RecipeFaceRow, parts: SummaryParts): RecipeSummaryDto {
  const briefOf = (id: string | null) => {
    const brief = parts.ladders.find((rung) => rung.id === id);
    if (brief === undefined) return null;
    return toRevisionBriefDto(
      brief,
      parts.signOffs.filter(({ revisionId }) => revisionId === id),
    );
  };
  const plateOf = (id: string | null) => parts.plates.find(({ revisionId }) => revisionId === id);
  const plate = plateOf(row.current_id) ?? plateOf(row.under_way_id);
  const hasSigned = parts.ladders.some(({ recipeId, state }) => recipeId === row.id && (state === 'approved' || state === 'scheduled'));
  const { good = 0, scrap = 0 } = parts.runs.find(({ recipeId }) => recipeId === row.id) ?? {};
  return {
    id: row.id,
    code: row.code,
    title: row.title,
    material: { id: row.material_id, name: row.material_name, family: row.material_family },
    finish: { id: row.finish_id, name: row.finish_name },
    effect: { id: row.effect_id, name: row.effect_name, key: row.effect_key },
    machine: { id: row.machine_id, name: row.machine_name, sourceKind: row.source_kind },
    lens: { id: row.lens_id, name: row.lens_name },
    state: row.state,
    current: briefOf(row.current_id),
    underWay: briefOf(row.under_way_id),
    isHeld: row.is_held,
    checkDue: (row.current_id === null ? undefined : parts.checkDue.get(row.current_id)) ?? null,
    face: plate === undefined ? null : toFaceDto(plate, parts.photoUrls),
    last30Days: { good, scrap },
    needsYou: row.need,
    allowedActions: recipeActions(parts.actor, { createdBy: row.created_by, hasSigned }),
  };
}

function toFaceDto({ revisionId: _, photo, ...plate }: PlateRow, photoUrls: MapPhoto): RecipeFaceDto {
  return { ...plate, photo: toEvidencePhotoDto(photo, photoUrls) };
}

export function toFacetsDto(rows: readonly FacetRow[]): RecipeFacetsDto {
  const of = (facet: FacetRow['facet']) =>
    rows.filter((row) => row.facet === facet).map(({ value, label, count }) => ({ value, label, count }));
  const states = of('states');
  return {
    states: RECIPE_STATES.flatMap((state) => states.filter(({ value }) => value === state)),
    materials: of('materials'),
    effects: of('effects'),
    machines: of('machines'),
    matchCount: of('match')[0]?.count ?? 0,
    totalCount: of('total')[0]?.count ?? 0,
  };
}

export function toHoldDto({ id, recipeId, reason, placedByName, createdAt }: HoldRow): RecipeHoldDto {
  return { id, subject: recipeId === null ? 'machine' : 'recipe', reason, placedBy: placedByName, placedAt: createdAt.toISOString() };
}
