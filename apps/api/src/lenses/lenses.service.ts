import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { ConflictError, NotFoundError, StaleError } from '../common/errors/domain-error';
import { NameTakenError } from '../common/errors/name-taken.error';
import type { ArchivedQuery } from '../common/pagination/archived.query';
import { decodeCursor, type Page, pageOf } from '../common/pagination/page';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import type { CreateLensDto } from './dto/create-lens.dto';
import type { LensDto } from './dto/lens.dto';
import type { UpdateLensDto } from './dto/update-lens.dto';
import { toLensDto } from './lenses.mapper';
import { LensesRepository, type LensRow, type LensValues } from './lenses.repository';

@Injectable()
export class LensesService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly lenses: LensesRepository,
    private readonly ledger: LedgerService,
  ) {}

  async list(actor: Actor, query: ArchivedQuery): Promise<Page<LensDto>> {
    const [name, id] = decodeCursor(query.cursor, ['string', 'id']) ?? [];
    const after = name === undefined ? undefined : { name: String(name), id: String(id) };
    const rows = await this.unitOfWork.read(actor, (tx) =>
      this.lenses.list(tx, actor.shopId, { archived: query.archived, limit: query.limit + 1, ...(after === undefined ? {} : { after }) }),
    );
    return pageOf(rows, query.limit, { item: (row) => toLensDto(row, actor), cursor: (row) => [row.name, row.id] });
  }

  async get(actor: Actor, id: string): Promise<LensDto> {
    return this.unitOfWork.read(actor, async (tx) => toLensDto(await this.getRow(tx, actor.shopId, id), actor));
  }

  async create(actor: Actor, dto: CreateLensDto): Promise<LensDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      await this.refuseTakenName(tx, actor.shopId, dto.name);
      const values = { name: dto.name, focalLengthMm: dto.focalLengthMm, fieldSizeMm: dto.fieldSizeMm, notes: dto.notes ?? '' };
      const row = await this.lenses.insert(tx, actor.shopId, actor.memberId, values);
      await this.ledger.record(tx, { actor, action: 'lens.created', subjectType: 'lens', subjectId: row.id, after: valuesOf(row) });
      return toLensDto(row, actor);
    });
  }

  async update(actor: Actor, id: string, version: number, dto: UpdateLensDto): Promise<LensDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const before = await this.lockVersion(tx, actor, id, version);
      if (before.archivedAt !== null) throw new ConflictError('The lens is archived. Restore it first.');
      if (dto.name !== undefined) await this.refuseTakenName(tx, actor.shopId, dto.name, id);
      const row = await this.lenses.update(tx, actor.shopId, id, { ...valuesOf(before), ...givenOnly(dto) });
      await this.ledger.record(tx, {
        actor,
        action: 'lens.changed',
        subjectType: 'lens',
        subjectId: id,
        before: valuesOf(before),
        after: valuesOf(row),
      });
      return toLensDto(row, actor);
    });
  }

  /** Takes the lens out of the choices, or back; what was proved with it keeps it. */
  async setArchived(actor: Actor, id: string, version: number, isArchived: boolean): Promise<LensDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const before = await this.lockVersion(tx, actor, id, version);
      if ((before.archivedAt !== null) === isArchived) return toLensDto(before, actor);
      const row = await this.lenses.update(tx, actor.shopId, id, { archivedAt: isArchived ? new Date() : null });
      const action = isArchived ? 'lens.archived' : 'lens.restored';
      await this.ledger.record(tx, { actor, action, subjectType: 'lens', subjectId: id });
      return toLensDto(row, actor);
    });
  }

  /** For other modules' use cases. @throws NotFoundError also for another shop's lens */
  async getLens(tx: Tx, shopId: string, lensId: string): Promise<LensRow> {
    return this.getRow(tx, shopId, lensId);
  }

  private async getRow(tx: Tx, shopId: string, id: string): Promise<LensRow> {
    const row = await this.lenses.findById(tx, shopId, id);
    if (row === undefined) throw new NotFoundError('This lens is not in the shop, or no longer. Go back to Equipment.');
    return row;
  }

  private async lockVersion(tx: Tx, actor: Actor, id: string, version: number): Promise<LensRow> {
    const row = await this.lenses.lockById(tx, actor.shopId, id);
    if (row === undefined) throw new NotFoundError('This lens is not in the shop, or no longer. Go back to Equipment.');
    if (row.version !== version) throw new StaleError(toLensDto(row, actor));
    return row;
  }

  private async refuseTakenName(tx: Tx, shopId: string, name: string, exceptId?: string): Promise<void> {
    if (await this.lenses.isNameTaken(tx, shopId, name, exceptId)) throw new NameTakenError('lens', name);
  }
}

const valuesOf = ({ name, focalLengthMm, fieldSizeMm, notes }: LensRow): LensValues => ({ name, focalLengthMm, fieldSizeMm, notes });

/** Fields that the request names; the others stay. */
function givenOnly(dto: UpdateLensDto): Partial<LensValues> {
  return {
    ...(dto.name == null ? {} : { name: dto.name }),
    ...(dto.focalLengthMm == null ? {} : { focalLengthMm: dto.focalLengthMm }),
    ...(dto.fieldSizeMm == null ? {} : { fieldSizeMm: dto.fieldSizeMm }),
    ...(dto.notes == null ? {} : { notes: dto.notes }),
  };
}
