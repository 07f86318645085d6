import type { Actor } from '../common/actor';
import type { FinishDto } from './dto/finish.dto';
import type { FinishRow } from './finishes.repository';
import { catalogueActions } from './materials.policy';

export function toFinishDto(row: FinishRow, actor: Pick<Actor, 'role'>): FinishDto {
  const { id, name, preparation, treatment, archivedAt, version } = row;
  const allowedActions = catalogueActions(actor, row);
  return { id, name, preparation, treatment, archivedAt: archivedAt?.toISOString() ?? null, version, allowedActions };
}
