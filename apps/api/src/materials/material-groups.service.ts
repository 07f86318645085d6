import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { InvalidError, StaleError } from '../common/errors/domain-error';
import { NameTakenError } from '../common/errors/name-taken.error';
import { decodeCursor, type Page, type PageQuery, pageOf } from '../common/pagination/page';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import type { CreateMaterialGroupDto, MaterialGroupDto, UpdateMaterialGroupDto } from './dto/material-group.dto';
import { toMaterialGroupDto } from './material-groups.mapper';
import { MaterialGroupsRepository, type MaterialGroupView } from './material-groups.repository';
import { GroupSignedError, NotInCatalogueError } from './materials.errors';
import { MaterialsRepository } from './materials.repository';

/** Materials that one approval may cover, named one by one. */
@Injectable()
export class MaterialGroupsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly groups: MaterialGroupsRepository,
    private readonly materials: MaterialsRepository,
    private readonly ledger: LedgerService,
  ) {}

  async list(actor: Actor, query: PageQuery): Promise<Page<MaterialGroupDto>> {
    const [name, id] = decodeCursor(query.cursor, ['string', 'id']) ?? [];
    const after = name === undefined ? {} : { after: { name: String(name), id: String(id) } };
    const views = await this.unitOfWork.read(actor, (tx) => this.groups.list(tx, actor.shopId, { limit: query.limit + 1, ...after }));
    return pageOf(views, query.limit, { item: (view) => toMaterialGroupDto(view, actor), cursor: ({ group }) => [group.name, group.id] });
  }

  async get(actor: Actor, id: string): Promise<MaterialGroupDto> {
    return this.unitOfWork.read(actor, async (tx) => toMaterialGroupDto(await this.getGroup(tx, actor.shopId, id), actor));
  }

  async create(actor: Actor, { name, materialIds }: CreateMaterialGroupDto): Promise<MaterialGroupDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      await this.refuseTakenName(tx, actor.shopId, name);
      await this.refuseUnknownMaterials(tx, actor.shopId, materialIds);
      const id = await this.groups.insert(tx, actor.shopId, actor.memberId, name);
      await this.groups.replaceMaterials(tx, actor.shopId, id, materialIds);
      const entry = { actor, action: 'material-group.created', subjectType: 'material-group', subjectId: id };
      await this.ledger.record(tx, { ...entry, after: { name, materialIds } });
      return toMaterialGroupDto(await this.getGroup(tx, actor.shopId, id), actor);
    });
  }

  async update(actor: Actor, id: string, version: number, dto: UpdateMaterialGroupDto): Promise<MaterialGroupDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const row = await this.groups.lockById(tx, actor.shopId, id);
      if (row === undefined) throw new NotInCatalogueError('group');
      const before = await this.getGroup(tx, actor.shopId, id);
      if (row.version !== version) throw new StaleError(toMaterialGroupDto(before, actor));
      if (dto.name != null) await this.refuseTakenName(tx, actor.shopId, dto.name, id);
      await this.groups.rename(tx, actor.shopId, id, dto.name ?? row.name);
      if (dto.materialIds != null) {
        await this.refuseUnknownMaterials(tx, actor.shopId, dto.materialIds);
        await this.refuseWidening(tx, actor.shopId, before, dto.materialIds);
        await this.groups.replaceMaterials(tx, actor.shopId, id, dto.materialIds);
      }
      const after = await this.getGroup(tx, actor.shopId, id);
      const entry = { actor, action: 'material-group.changed', subjectType: 'material-group', subjectId: id };
      await this.ledger.record(tx, { ...entry, before: ledgerBody(before), after: ledgerBody(after) });
      return toMaterialGroupDto(after, actor);
    });
  }

  /** For other modules' use cases. @throws NotInCatalogueError also for another shop's group */
  async getGroup(tx: Tx, shopId: string, groupId: string): Promise<MaterialGroupView> {
    const view = await this.groups.findById(tx, shopId, groupId);
    if (view === undefined) throw new NotInCatalogueError('group');
    return view;
  }

  /** A recipe that covers the group would cover one material more than what was signed. */
  private async refuseWidening(tx: Tx, shopId: string, { group, materials }: MaterialGroupView, ids: readonly string[]): Promise<void> {
    if (ids.every((id) => materials.some((material) => material.id === id))) return;
    const covering = await this.groups.recipesCovering(tx, shopId, group.id);
    if (covering.length > 0) throw new GroupSignedError(covering);
  }

  private async refuseTakenName(tx: Tx, shopId: string, name: string, exceptId?: string): Promise<void> {
    if (await this.groups.isNameTaken(tx, shopId, name, exceptId)) throw new NameTakenError('group', name);
  }

  /** Whoever signs for the group signs for the materials that it has: none is added until the signature is stored. */
  async lockAsCovered(tx: Tx, shopId: string, groupId: string): Promise<void> {
    await this.groups.lockAsCovered(tx, shopId, groupId);
  }

  private async refuseUnknownMaterials(tx: Tx, shopId: string, materialIds: readonly string[]): Promise<void> {
    const known = await this.materials.knownIds(tx, shopId, materialIds);
    if (known.length === materialIds.length) return;
    throw new InvalidError('One field needs another look.', [
      { pointer: '#/materialIds', detail: 'A material of the list is not in the shop. Choose again.' },
    ]);
  }
}

const ledgerBody = ({ group, materials }: MaterialGroupView) => ({ name: group.name, materialIds: materials.map(({ id }) => id) });
