import { EFFECT_LABELS, isCodeOf } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import type { EffectDto } from './dto/effect.dto';
import type { EffectRow } from './effects.repository';
import { catalogueActions } from './materials.policy';

export function toEffectDto(row: EffectRow, actor: Pick<Actor, 'role'>): EffectDto {
  return {
    id: row.id,
    key: row.key,
    isShipped: isCodeOf(EFFECT_LABELS, row.key),
    name: row.name,
    criteria: row.criteria,
    notes: row.notes,
    archivedAt: row.archivedAt?.toISOString() ?? null,
    version: row.version,
    allowedActions: catalogueActions(actor, row),
  };
}
