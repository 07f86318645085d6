import type { Actor } from '../common/actor';
import type { LensDto } from './dto/lens.dto';
import { lensActions } from './lenses.policy';
import type { LensRow } from './lenses.repository';

export function toLensDto(row: LensRow, actor: Pick<Actor, 'role'>): LensDto {
  return {
    id: row.id,
    name: row.name,
    focalLengthMm: row.focalLengthMm,
    fieldSizeMm: row.fieldSizeMm,
    notes: row.notes,
    archivedAt: row.archivedAt?.toISOString() ?? null,
    version: row.version,
    allowedActions: lensActions(actor, row),
  };
}
