import { Injectable } from '@nestjs/common';
import { MATERIAL_FAMILIES, materialFamilyOf } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { StaleError } from '../common/errors/domain-error';
import { NameTakenError } from '../common/errors/name-taken.error';
import { decodeCursor, type Page, pageOf } from '../common/pagination/page';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { CautionsService } from './cautions.service';
import type {
  CreateMaterialDto,
  ListMaterialsQuery,
  MaterialDto,
  MaterialFacetsDto,
  MaterialPropertiesDto,
  UpdateMaterialDto,
} from './dto/material.dto';
import { ArchivedError, NotInCatalogueError } from './materials.errors';
import { toMaterialDto } from './materials.mapper';
import { type MaterialRow, MaterialsRepository, type MaterialValues } from './materials.repository';

const PROPERTY_UNITS = { thermalConductivityWPerMK: 'W/(m·K)', densityKgPerM3: 'kg/m³', heatCapacityJPerKgK: 'J/(kg·K)' } as const;

@Injectable()
export class MaterialsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly materials: MaterialsRepository,
    private readonly cautions: CautionsService,
    private readonly ledger: LedgerService,
  ) {}

  async list(actor: Actor, query: ListMaterialsQuery): Promise<Page<MaterialDto>> {
    const [name, id] = decodeCursor(query.cursor, ['string', 'id']) ?? [];
    const after = name === undefined ? {} : { after: { name: String(name), id: String(id) } };
    const filter = { archived: query.archived, families: query.family, words: query.q };
    return this.unitOfWork.read(actor, async (tx) => {
      const rows = await this.materials.list(tx, actor.shopId, filter, { limit: query.limit + 1, ...after });
      const cautions = await this.cautions.allCautions(tx, actor.shopId);
      return pageOf(rows, query.limit, { item: (row) => toMaterialDto(row, cautions, actor), cursor: (row) => [row.name, row.id] });
    });
  }

  async facets(actor: Actor): Promise<MaterialFacetsDto> {
    const counts = await this.unitOfWork.read(actor, (tx) => this.materials.countByFamily(tx, actor.shopId));
    const families = counts.map(({ family, count }) => ({ family, label: MATERIAL_FAMILIES[family].label, count }));
    return { families: families.sort((a, b) => a.label.localeCompare(b.label, 'en')) };
  }

  async get(actor: Actor, id: string): Promise<MaterialDto> {
    return this.unitOfWork.read(actor, async (tx) => this.toDto(tx, await this.getMaterial(tx, actor.shopId, id), actor));
  }

  async create(actor: Actor, dto: CreateMaterialDto): Promise<MaterialDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      await this.refuseTakenName(tx, actor.shopId, dto.name);
      const values: MaterialValues = {
        name: dto.name,
        family: materialFamilyOf(dto.family),
        grade: dto.grade ?? '',
        standardDesignation: dto.standardDesignation ?? '',
        supplier: dto.supplier ?? '',
        thicknessMm: dto.thicknessMm ?? null,
        properties: storedProperties(dto.properties),
        notes: dto.notes ?? '',
      };
      const row = await this.materials.insert(tx, actor.shopId, actor.memberId, values);
      await this.ledger.record(tx, { actor, action: 'material.created', subjectType: 'material', subjectId: row.id, after: values });
      return this.toDto(tx, row, actor);
    });
  }

  async update(actor: Actor, id: string, version: number, dto: UpdateMaterialDto): Promise<MaterialDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const before = await this.lockVersion(tx, actor, id, version);
      if (before.archivedAt !== null) throw new ArchivedError('material');
      if (dto.name != null) await this.refuseTakenName(tx, actor.shopId, dto.name, id);
      const values: MaterialValues = {
        name: dto.name ?? before.name,
        family: dto.family == null ? before.family : materialFamilyOf(dto.family),
        grade: dto.grade ?? before.grade,
        standardDesignation: dto.standardDesignation ?? before.standardDesignation,
        supplier: dto.supplier ?? before.supplier,
        thicknessMm: dto.thicknessMm === undefined ? before.thicknessMm : dto.thicknessMm,
        properties: dto.properties == null ? before.properties : storedProperties(dto.properties),
        notes: dto.notes ?? before.notes,
      };
      const row = await this.materials.update(tx, actor.shopId, id, values);
      const entry = { actor, action: 'material.changed', subjectType: 'material', subjectId: id };
      await this.ledger.record(tx, { ...entry, before: valuesOf(before), after: values });
      return this.toDto(tx, row, actor);
    });
  }

  /** Takes the material out of the choices, or back; what was proved on it keeps it. */
  async setArchived(actor: Actor, id: string, version: number, isArchived: boolean): Promise<MaterialDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const before = await this.lockVersion(tx, actor, id, version);
      if ((before.archivedAt !== null) === isArchived) return this.toDto(tx, before, actor);
      const row = await this.materials.update(tx, actor.shopId, id, { archivedAt: isArchived ? new Date() : null });
      const action = isArchived ? 'material.archived' : 'material.restored';
      await this.ledger.record(tx, { actor, action, subjectType: 'material', subjectId: id });
      return this.toDto(tx, row, actor);
    });
  }

  /** For other modules' use cases. @throws NotInCatalogueError also for another shop's material */
  async getMaterial(tx: Tx, shopId: string, materialId: string): Promise<MaterialRow> {
    const row = await this.materials.findById(tx, shopId, materialId);
    if (row === undefined) throw new NotInCatalogueError('material');
    return row;
  }

  private async toDto(tx: Tx, row: MaterialRow, actor: Actor): Promise<MaterialDto> {
    return toMaterialDto(row, await this.cautions.allCautions(tx, actor.shopId), actor);
  }

  private async lockVersion(tx: Tx, actor: Actor, id: string, version: number): Promise<MaterialRow> {
    const row = await this.materials.lockById(tx, actor.shopId, id);
    if (row === undefined) throw new NotInCatalogueError('material');
    if (row.version !== version) throw new StaleError(await this.toDto(tx, row, actor));
    return row;
  }

  private async refuseTakenName(tx: Tx, shopId: string, name: string, exceptId?: string): Promise<void> {
    if (await this.materials.isNameTaken(tx, shopId, name, exceptId)) throw new NameTakenError('material', name);
  }
}

function valuesOf(row: MaterialRow): MaterialValues {
  const { name, family, grade, standardDesignation, supplier, thicknessMm, properties, notes } = row;
  return { name, family, grade, standardDesignation, supplier, thicknessMm, properties, notes };
}

/** Each number with its fixed unit beside it, so that the stored row explains itself. */
function storedProperties(dto: MaterialPropertiesDto = {}): MaterialValues['properties'] {
  const given = Object.entries(PROPERTY_UNITS).flatMap(([key, unit]) => {
    // the keys of the units are the keys of the request class
    const property = dto[key as keyof typeof PROPERTY_UNITS];
    return property == null ? [] : [[key, { value: property.value, unit, source: property.source }] as const];
  });
  return Object.fromEntries(given);
}
