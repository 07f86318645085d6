import type { Actor } from '../common/actor';
import type { CautionRow } from './cautions.repository';
import type { CautionDto } from './dto/caution.dto';
import { cautionActions } from './materials.policy';

export function toCautionDto(row: CautionRow, actor: Pick<Actor, 'role'>): CautionDto {
  const { id, level, subject, text, source, appliesTo, shippedKey, version } = row;
  return {
    id,
    level,
    subject,
    text,
    source,
    appliesTo,
    isShipped: shippedKey !== null,
    version,
    allowedActions: cautionActions(actor, row),
  };
}
