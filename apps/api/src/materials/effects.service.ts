import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { InvalidError, StaleError } from '../common/errors/domain-error';
import { NameTakenError } from '../common/errors/name-taken.error';
import type { ArchivedQuery } from '../common/pagination/archived.query';
import { decodeCursor, type Page, pageOf } from '../common/pagination/page';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import type { CreateEffectDto, EffectDto, UpdateEffectDto } from './dto/effect.dto';
import { criteriaAsStored, criteriaProblems, type EnteredCriterion } from './effect-criteria';
import { effectKeyStem, ownEffectKey } from './effect-key';
import { toEffectDto } from './effects.mapper';
import { type EffectRow, EffectsRepository, type EffectValues } from './effects.repository';
import { ArchivedError, NotInCatalogueError } from './materials.errors';

@Injectable()
export class EffectsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly effects: EffectsRepository,
    private readonly ledger: LedgerService,
  ) {}

  async list(actor: Actor, query: ArchivedQuery): Promise<Page<EffectDto>> {
    const [name, id] = decodeCursor(query.cursor, ['string', 'id']) ?? [];
    const after = name === undefined ? {} : { after: { name: String(name), id: String(id) } };
    const rows = await this.unitOfWork.read(actor, (tx) =>
      this.effects.list(tx, actor.shopId, query.archived, { limit: query.limit + 1, ...after }),
    );
    return pageOf(rows, query.limit, { item: (row) => toEffectDto(row, actor), cursor: (row) => [row.name, row.id] });
  }

  async get(actor: Actor, id: string): Promise<EffectDto> {
    return this.unitOfWork.read(actor, async (tx) => toEffectDto(await this.getEffect(tx, actor.shopId, id), actor));
  }

  async create(actor: Actor, dto: CreateEffectDto): Promise<EffectDto> {
    const criteria = checkedCriteria(dto.criteria ?? []);
    return this.unitOfWork.run(actor, async (tx) => {
      await this.refuseTakenName(tx, actor.shopId, dto.name);
      const taken = await this.effects.keysHolding(tx, actor.shopId, effectKeyStem(dto.name));
      const values = { name: dto.name, key: ownEffectKey(dto.name, taken), criteria, notes: dto.notes ?? '' };
      const row = await this.effects.insert(tx, actor.shopId, actor.memberId, values);
      await this.ledger.record(tx, { actor, action: 'effect.created', subjectType: 'effect', subjectId: row.id, after: values });
      return toEffectDto(row, actor);
    });
  }

  /** Changes an effect. Coupons keep the criteria that were recorded on them. */
  async update(actor: Actor, id: string, version: number, dto: UpdateEffectDto): Promise<EffectDto> {
    const criteria = dto.criteria == null ? undefined : checkedCriteria(dto.criteria);
    return this.unitOfWork.run(actor, async (tx) => {
      const before = await this.lockVersion(tx, actor, id, version);
      if (before.archivedAt !== null) throw new ArchivedError('effect');
      if (dto.name != null) await this.refuseTakenName(tx, actor.shopId, dto.name, id);
      const values = { name: dto.name ?? before.name, criteria: criteria ?? before.criteria, notes: dto.notes ?? before.notes };
      const row = await this.effects.update(tx, actor.shopId, id, values);
      const entry = { actor, action: 'effect.changed', subjectType: 'effect', subjectId: id };
      await this.ledger.record(tx, { ...entry, before: valuesOf(before), after: values });
      return toEffectDto(row, actor);
    });
  }

  /** Takes the effect out of the choices, or back; what was proved for it keeps it. */
  async setArchived(actor: Actor, id: string, version: number, isArchived: boolean): Promise<EffectDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const before = await this.lockVersion(tx, actor, id, version);
      if ((before.archivedAt !== null) === isArchived) return toEffectDto(before, actor);
      const row = await this.effects.update(tx, actor.shopId, id, { archivedAt: isArchived ? new Date() : null });
      const action = isArchived ? 'effect.archived' : 'effect.restored';
      await this.ledger.record(tx, { actor, action, subjectType: 'effect', subjectId: id });
      return toEffectDto(row, actor);
    });
  }

  /** For other modules' use cases. @throws NotInCatalogueError also for another shop's effect */
  async getEffect(tx: Tx, shopId: string, effectId: string): Promise<EffectRow> {
    const row = await this.effects.findById(tx, shopId, effectId);
    if (row === undefined) throw new NotInCatalogueError('effect');
    return row;
  }

  private async lockVersion(tx: Tx, actor: Actor, id: string, version: number): Promise<EffectRow> {
    const row = await this.effects.lockById(tx, actor.shopId, id);
    if (row === undefined) throw new NotInCatalogueError('effect');
    if (row.version !== version) throw new StaleError(toEffectDto(row, actor));
    return row;
  }

  private async refuseTakenName(tx: Tx, shopId: string, name: string, exceptId?: string): Promise<void> {
    if (await this.effects.isNameTaken(tx, shopId, name, exceptId)) throw new NameTakenError('effect', name);
  }
}

const valuesOf = ({ name, criteria, notes }: EffectRow): EffectValues => ({ name, criteria, notes });

function checkedCriteria(criteria: readonly EnteredCriterion[]): EffectValues['criteria'] {
  const problems = criteriaProblems(criteria);
  if (problems.length > 0) throw new InvalidError('The criteria need another look.', problems);
  return criteriaAsStored(criteria);
}
