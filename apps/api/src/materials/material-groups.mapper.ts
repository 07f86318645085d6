import type { Actor } from '../common/actor';
import type { MaterialGroupDto } from './dto/material-group.dto';
import type { MaterialGroupView } from './material-groups.repository';
import { groupActions } from './materials.policy';

export function toMaterialGroupDto({ group, materials }: MaterialGroupView, actor: Pick<Actor, 'role'>): MaterialGroupDto {
  return { id: group.id, name: group.name, materials, version: group.version, allowedActions: groupActions(actor) };
}
