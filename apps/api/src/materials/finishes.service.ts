import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { StaleError } from '../common/errors/domain-error';
import { NameTakenError } from '../common/errors/name-taken.error';
import type { ArchivedQuery } from '../common/pagination/archived.query';
import { decodeCursor, type Page, pageOf } from '../common/pagination/page';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import type { CreateFinishDto, FinishDto, UpdateFinishDto } from './dto/finish.dto';
import { toFinishDto } from './finishes.mapper';
import { FinishesRepository, type FinishRow, type FinishValues } from './finishes.repository';
import { ArchivedError, NotInCatalogueError } from './materials.errors';

@Injectable()
export class FinishesService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly finishes: FinishesRepository,
    private readonly ledger: LedgerService,
  ) {}

  async list(actor: Actor, query: ArchivedQuery): Promise<Page<FinishDto>> {
    const [name, id] = decodeCursor(query.cursor, ['string', 'id']) ?? [];
    const after = name === undefined ? {} : { after: { name: String(name), id: String(id) } };
    const rows = await this.unitOfWork.read(actor, (tx) =>
      this.finishes.list(tx, actor.shopId, query.archived, { limit: query.limit + 1, ...after }),
    );
    return pageOf(rows, query.limit, { item: (row) => toFinishDto(row, actor), cursor: (row) => [row.name, row.id] });
  }

  async get(actor: Actor, id: string): Promise<FinishDto> {
    return this.unitOfWork.read(actor, async (tx) => toFinishDto(await this.getFinish(tx, actor.shopId, id), actor));
  }

  async create(actor: Actor, dto: CreateFinishDto): Promise<FinishDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      await this.refuseTakenName(tx, actor.shopId, dto.name);
      const values = { name: dto.name, preparation: dto.preparation ?? '', treatment: dto.treatment ?? '' };
      const row = await this.finishes.insert(tx, actor.shopId, actor.memberId, values);
      await this.ledger.record(tx, { actor, action: 'finish.created', subjectType: 'finish', subjectId: row.id, after: values });
      return toFinishDto(row, actor);
    });
  }

  async update(actor: Actor, id: string, version: number, dto: UpdateFinishDto): Promise<FinishDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const before = await this.lockVersion(tx, actor, id, version);
      if (before.archivedAt !== null) throw new ArchivedError('finish');
      if (dto.name != null) await this.refuseTakenName(tx, actor.shopId, dto.name, id);
      const values: FinishValues = {
        name: dto.name ?? before.name,
        preparation: dto.preparation ?? before.preparation,
        treatment: dto.treatment ?? before.treatment,
      };
      const row = await this.finishes.update(tx, actor.shopId, id, values);
      const { name, preparation, treatment } = before;
      const entry = { actor, action: 'finish.changed', subjectType: 'finish', subjectId: id };
      await this.ledger.record(tx, { ...entry, before: { name, preparation, treatment }, after: values });
      return toFinishDto(row, actor);
    });
  }

  /** Takes the finish out of the choices, or back; what was proved on it keeps it. */
  async setArchived(actor: Actor, id: string, version: number, isArchived: boolean): Promise<FinishDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const before = await this.lockVersion(tx, actor, id, version);
      if ((before.archivedAt !== null) === isArchived) return toFinishDto(before, actor);
      const row = await this.finishes.update(tx, actor.shopId, id, { archivedAt: isArchived ? new Date() : null });
      const action = isArchived ? 'finish.archived' : 'finish.restored';
      await this.ledger.record(tx, { actor, action, subjectType: 'finish', subjectId: id });
      return toFinishDto(row, actor);
    });
  }

  /** For other modules' use cases. @throws NotInCatalogueError also for another shop's finish */
  async getFinish(tx: Tx, shopId: string, finishId: string): Promise<FinishRow> {
    const row = await this.finishes.findById(tx, shopId, finishId);
    if (row === undefined) throw new NotInCatalogueError('finish');
    return row;
  }

  private async lockVersion(tx: Tx, actor: Actor, id: string, version: number): Promise<FinishRow> {
    const row = await this.finishes.lockById(tx, actor.shopId, id);
    if (row === undefined) throw new NotInCatalogueError('finish');
    if (row.version !== version) throw new StaleError(toFinishDto(row, actor));
    return row;
  }

  private async refuseTakenName(tx: Tx, shopId: string, name: string, exceptId?: string): Promise<void> {
    if (await this.finishes.isNameTaken(tx, shopId, name, exceptId)) throw new NameTakenError('finish', name);
  }
}
