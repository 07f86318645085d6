import { type Caution, MATERIAL_FAMILIES } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { cautionsNaming } from './caution-order';
import type { MaterialDto } from './dto/material.dto';
import { catalogueActions } from './materials.policy';
import type { MaterialRow } from './materials.repository';

export function toMaterialDto(row: MaterialRow, cautions: readonly Caution[], actor: Pick<Actor, 'role'>): MaterialDto {
  return {
    id: row.id,
    name: row.name,
    family: row.family,
    familyLabel: MATERIAL_FAMILIES[row.family].label,
    grade: row.grade,
    standardDesignation: row.standardDesignation,
    supplier: row.supplier,
    thicknessMm: row.thicknessMm,
    properties: row.properties,
    notes: row.notes,
    cautions: cautionsNaming({ family: row.family, materialId: row.id }, cautions).map(({ id, level, subject }) => ({
      id,
      level,
      subject,
    })),
    archivedAt: row.archivedAt?.toISOString() ?? null,
    version: row.version,
    allowedActions: catalogueActions(actor, row),
  };
}
