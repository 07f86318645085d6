import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { InvalidError, NotFoundError } from '../common/errors/domain-error';
import { decodeCursor, type Page, pageOf } from '../common/pagination/page';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { CitedRevisionsService } from './cited-revisions.service';
import { type DeviationRow, DeviationsRepository } from './deviations.repository';
import type { DeviationDto, GrantDeviationDto, ListDeviationsQuery } from './dto/deviation.dto';
import { DeviationOverError, RevisionNotUsableError } from './runs.errors';

const MOST_LIVE = 20;

/** Permitted departures from an approved revision; each ends by itself. */
@Injectable()
export class DeviationsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly deviations: DeviationsRepository,
    private readonly cited: CitedRevisionsService,
    private readonly ledger: LedgerService,
  ) {}

  async list(actor: Actor, query: ListDeviationsQuery): Promise<Page<DeviationDto>> {
    const [beforeId] = decodeCursor(query.cursor, ['id']) ?? [];
    const wanted = {
      ...(query.revisionId === undefined ? {} : { revisionId: query.revisionId }),
      ...(beforeId === undefined ? {} : { beforeId: String(beforeId) }),
    };
    const rows = await this.unitOfWork.read(actor, (tx) => this.deviations.list(tx, actor.shopId, { ...wanted, limit: query.limit + 1 }));
    return pageOf(rows, query.limit, { item: toDeviationDto, cursor: ({ id }) => [id] });
  }

  async grant(actor: Actor, dto: GrantDeviationDto): Promise<DeviationDto> {
    const { revisionId, description, reason, endsAt, maximumQuantity = null } = dto;
    refuseUnlimited(dto);
    return this.unitOfWork.run(actor, async (tx) => {
      const { state } = await this.cited.lock(tx, actor, { revisionId, kind: 'production' });
      if (state !== 'approved') throw new RevisionNotUsableError('A deviation departs from an approved revision; this one is not.');
      const ends = endsAt === undefined ? null : new Date(endsAt);
      const values = { revisionId, description, reason, endsAt: ends, maximumQuantity, grantedByName: actor.printedName };
      const id = await this.deviations.insert(tx, actor.shopId, actor.memberId, values);
      await this.ledger.record(tx, { actor, action: 'deviation.granted', subjectType: 'deviation', subjectId: id, after: values });
      return toDeviationDto(await this.get(tx, actor.shopId, id));
    });
  }

  /** Those that a run of the revision may cite now. */
  async liveOf(tx: Tx, shopId: string, revisionId: string): Promise<DeviationDto[]> {
    return (await this.deviations.list(tx, shopId, { revisionId, isLiveOnly: true, limit: MOST_LIVE })).map(toDeviationDto);
  }

  /** @throws InvalidError for one of another revision, DeviationOverError for one that has ended */
  async assertLive(tx: Tx, shopId: string, { id, revisionId }: { id: string; revisionId: string }): Promise<void> {
    const row = await this.deviations.find(tx, shopId, id);
    if (row === undefined || row.revisionId !== revisionId)
      throw new InvalidError('One field needs another look.', [
        { pointer: '#/deviationId', detail: 'This deviation is not for this setting. Choose another one, or none.' },
      ]);
    if (!row.isLive) throw new DeviationOverError('The deviation has ended. Ask a lead for a new one, or mark as the setting says.');
  }

  /** @throws DeviationOverError when fewer parts are left than were marked */
  async assertQuantityLeft(tx: Tx, shopId: string, { id, quantity }: { id: string; quantity: number }): Promise<void> {
    await this.deviations.takeTurn(tx, id);
    const { maximumQuantity, usedQuantity } = await this.get(tx, shopId, id);
    if (maximumQuantity === null || usedQuantity + quantity <= maximumQuantity) return;
    const left = Math.max(0, maximumQuantity - usedQuantity);
    throw new DeviationOverError(
      `The deviation covers ${left} more parts, and ${quantity} were marked. Ask a lead for one that covers them.`,
    );
  }

  private async get(tx: Tx, shopId: string, id: string): Promise<DeviationRow> {
    const row = await this.deviations.find(tx, shopId, id);
    if (row === undefined) throw new NotFoundError();
    return row;
  }
}

function refuseUnlimited({ endsAt, maximumQuantity }: GrantDeviationDto): void {
  if (endsAt === undefined && maximumQuantity === undefined)
    throw new InvalidError('A deviation ends by itself.', [{ pointer: '#/endsAt', detail: 'Give an end, a number of parts, or both.' }]);
  if (endsAt !== undefined && new Date(endsAt).getTime() <= Date.now())
    throw new InvalidError('One field needs another look.', [{ pointer: '#/endsAt', detail: 'The end must lie in the future.' }]);
}

function toDeviationDto(row: DeviationRow): DeviationDto {
  const { id, revisionId, description, reason, endsAt, maximumQuantity, usedQuantity, isLive, grantedByName, createdAt } = row;
  return {
    ...{ id, revisionId, description, reason, maximumQuantity, usedQuantity, isLive },
    endsAt: endsAt?.toISOString() ?? null,
    grantedBy: grantedByName,
    grantedAt: createdAt.toISOString(),
  };
}
