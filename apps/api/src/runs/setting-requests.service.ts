import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { InvalidError, NotFoundError } from '../common/errors/domain-error';
import { decodeCursor, type Page, pageOf } from '../common/pagination/page';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { CautionsService } from '../materials/cautions.service';
import { ShopsService } from '../shops/shops.service';
import type { AnswerRequestDto, AskForSettingDto, ListRequestsQuery, RequestState, SettingRequestDto } from './dto/setting-request.dto';
import { RequestAnsweredError } from './runs.errors';
import { readsAllRuns, requestActions } from './runs.policy';
import { type RequestView, SettingRequestsRepository } from './setting-requests.repository';

/** "Ask for this setting": needs that no approved recipe answers yet, and what became of them. */
@Injectable()
export class SettingRequestsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly requests: SettingRequestsRepository,
    private readonly cautions: CautionsService,
    private readonly shops: ShopsService,
    private readonly ledger: LedgerService,
  ) {}

  /** Trainees see their own, operators and leads everybody's. */
  async list(actor: Actor, query: ListRequestsQuery): Promise<Page<SettingRequestDto>> {
    const [beforeId] = decodeCursor(query.cursor, ['id']) ?? [];
    const page = {
      limit: query.limit + 1,
      ...(query.state === undefined ? {} : { state: query.state }),
      ...(beforeId === undefined ? {} : { beforeId: String(beforeId) }),
      ...(readsAllRuns(actor) ? {} : { askedBy: actor.memberId }),
    };
    const views = await this.unitOfWork.read(actor, (tx) => this.requests.list(tx, actor.shopId, page));
    return pageOf(views, query.limit, { item: (view) => toRequestDto(view, actor), cursor: ({ row }) => [row.id] });
  }

  /** Nobody is asked to find a setting for what must never be marked. */
  async ask(actor: Actor, dto: AskForSettingDto): Promise<SettingRequestDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      if (dto.neededOn !== undefined && dto.neededOn < (await this.shops.today(tx, actor.shopId)))
        throw new InvalidError('One field needs another look.', [{ pointer: '#/neededOn', detail: 'Enter today or a later day.' }]);
      const unknown = await this.requests.unknownSlots(tx, actor.shopId, dto);
      if (unknown.length > 0)
        throw new InvalidError(
          'Some of it is not in the shop, or no longer.',
          unknown.map((slot) => ({ pointer: `#/${slot}`, detail: 'This is not in the shop. Choose it again.' })),
        );
      const { materialId, finishId, effectId } = dto;
      await this.cautions.assertMayBeMarked(tx, actor.shopId, { materialId, finishId, effectId });
      const id = await this.requests.insert(tx, actor.shopId, actor.memberId, { ...dto });
      await this.ledger.record(tx, {
        actor,
        action: 'setting-request.asked',
        subjectType: 'setting-request',
        subjectId: id,
        after: { ...dto },
      });
      return this.toDto(tx, actor, id);
    });
  }

  async answer(actor: Actor, id: string, { answer, state }: AnswerRequestDto): Promise<SettingRequestDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const row = await this.requests.lock(tx, actor.shopId, id);
      if (row === undefined) throw new NotFoundError();
      if (row.state !== 'open') throw new RequestAnsweredError();
      await this.requests.answer(tx, actor.shopId, id, { answer, state, answeredBy: actor.memberId });
      const entry = { actor, action: `setting-request.${state}`, subjectType: 'setting-request', subjectId: id };
      await this.ledger.record(tx, { ...entry, before: { state: row.state }, after: { state, answer } });
      return this.toDto(tx, actor, id);
    });
  }

  private async toDto(tx: Tx, actor: Actor, id: string): Promise<SettingRequestDto> {
    const view = await this.requests.find(tx, actor.shopId, id);
    if (view === undefined) throw new NotFoundError();
    return toRequestDto(view, actor);
  }
}

function toRequestDto({ row, ...named }: RequestView, actor: Actor): SettingRequestDto {
  const { id, jobReference, neededOn, note, answer, answeredAt, createdAt, version } = row;
  return {
    ...{ id, jobReference, neededOn, note, answer, version },
    ...named,
    // a constraint holds the column to the list
    state: row.state as RequestState,
    askedAt: createdAt.toISOString(),
    answeredAt: answeredAt?.toISOString() ?? null,
    allowedActions: requestActions(actor, row),
  };
}
