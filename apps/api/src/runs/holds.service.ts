import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { InvalidError, NotFoundError } from '../common/errors/domain-error';
import { decodeCursor, type Page, pageOf } from '../common/pagination/page';
import { PasswordCheck } from '../common/password-check';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { OutboxService } from '../mail/outbox.service';
import { MembersService } from '../members/members.service';
import type { HoldDto, ListHoldsQuery, PlaceHoldDto, ReleaseHoldDto } from './dto/hold.dto';
import { type HoldRow, type HoldSubject, HoldsRepository } from './holds.repository';
import { HoldStateError } from './runs.errors';
import { holdActions } from './runs.policy';

/** "Stop use" on a recipe or a machine: signed in the ledger, told to everybody by mail, until a lead releases it. */
@Injectable()
export class HoldsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly holds: HoldsRepository,
    private readonly members: MembersService,
    private readonly passwordCheck: PasswordCheck,
    private readonly ledger: LedgerService,
    private readonly outbox: OutboxService,
  ) {}

  async list(actor: Actor, query: ListHoldsQuery): Promise<Page<HoldDto>> {
    const [beforeId] = decodeCursor(query.cursor, ['id']) ?? [];
    const page = { state: query.state, limit: query.limit + 1, ...(beforeId === undefined ? {} : { beforeId: String(beforeId) }) };
    const rows = await this.unitOfWork.read(actor, (tx) => this.holds.list(tx, actor.shopId, page));
    return pageOf(rows, query.limit, { item: (row) => toHoldDto(row, actor), cursor: ({ id }) => [id] });
  }

  async place(actor: Actor, dto: PlaceHoldDto): Promise<HoldDto> {
    const subject = subjectOf(dto);
    const method = await this.confirmed(actor, dto.password);
    return this.unitOfWork.run(actor, async (tx) => {
      const name = await this.holds.lockSubject(tx, actor.shopId, subject);
      if (name === undefined) throw new NotFoundError(`This ${subject.kind} is not in the shop. Choose it again.`);
      if (await this.holds.isHeld(tx, actor.shopId, subject)) throw new HoldStateError(`A hold is on ${name} already. Release it first.`);
      const values = { subject, reason: dto.reason, placedByName: actor.printedName };
      const id = await this.holds.insert(tx, actor.shopId, actor.memberId, values);
      const after = { meaning: 'hold placed', ...subject, reason: dto.reason, method };
      await this.ledger.record(tx, {
        actor,
        action: 'hold.placed',
        subjectType: subject.kind,
        subjectId: subject.id,
        ...codeOf(subject, name),
        after,
      });
      await this.tellEverybody(tx, actor, { subject: name, reason: dto.reason });
      return toHoldDto(await this.get(tx, actor.shopId, id), actor);
    });
  }

  async release(actor: Actor, id: string, { reason, password }: ReleaseHoldDto): Promise<HoldDto> {
    const method = await this.confirmed(actor, password);
    return this.unitOfWork.run(actor, async (tx) => {
      const before = await this.holds.lock(tx, actor.shopId, id);
      if (before === undefined) throw new NotFoundError();
      if (before.releasedAt !== null) throw new HoldStateError(`${before.releasedByName ?? 'Somebody'} released it already.`);
      await this.holds.release(tx, actor.shopId, id, { memberId: actor.memberId, name: actor.printedName, reason });
      const row = await this.get(tx, actor.shopId, id);
      const subject = heldBy(row);
      await this.ledger.record(tx, {
        actor,
        action: 'hold.released',
        subjectType: subject.kind,
        subjectId: subject.id,
        ...codeOf(subject, row.recipeCode ?? ''),
        before: { reason: before.reason, placedBy: before.placedByName },
        after: { meaning: 'hold released', reason, method },
      });
      return toHoldDto(row, actor);
    });
  }

  private async confirmed(actor: Actor, password: string | undefined): Promise<'password' | 'session'> {
    if (password === undefined) return 'session';
    await this.passwordCheck.confirm(actor, password);
    return 'password';
  }

  private async tellEverybody(tx: Tx, actor: Actor, { subject, reason }: { subject: string; reason: string }): Promise<void> {
    const shopName = await this.holds.shopName(tx, actor.shopId);
    const others = (await this.members.addressees(tx, actor.shopId)).filter(({ memberId }) => memberId !== actor.memberId);
    for (const { name, address } of others) {
      const payload = { to: { name, address }, shopName, subject, reason, by: actor.printedName };
      await this.outbox.add(tx, { shopId: actor.shopId, kind: 'hold-placed', payload });
    }
  }

  private async get(tx: Tx, shopId: string, id: string): Promise<HoldRow> {
    const row = await this.holds.find(tx, shopId, id);
    if (row === undefined) throw new NotFoundError();
    return row;
  }
}

function subjectOf({ recipeId, machineId }: PlaceHoldDto): HoldSubject {
  if (recipeId !== undefined && machineId === undefined) return { kind: 'recipe', id: recipeId };
  if (machineId !== undefined && recipeId === undefined) return { kind: 'machine', id: machineId };
  throw new InvalidError('A hold is on one thing.', [{ pointer: '#/recipeId', detail: 'Give a recipe or a machine, one of the two.' }]);
}

function heldBy({ recipeId, machineId }: HoldRow): HoldSubject {
  if (recipeId !== null) return { kind: 'recipe', id: recipeId };
  if (machineId !== null) return { kind: 'machine', id: machineId };
  throw new Error('a hold without a subject');
}

/** Recipes have a code before their title; machines have a name only. */
const codeOf = ({ kind }: HoldSubject, name: string) => (kind === 'recipe' ? { subjectCode: name.split(' ')[0] ?? name } : {});

function toHoldDto(row: HoldRow, actor: Pick<Actor, 'role'>): HoldDto {
  const subject = heldBy(row);
  return {
    id: row.id,
    subject: subject.kind,
    subjectId: subject.id,
    subjectName: row.machineName ?? `${row.recipeCode} ${row.recipeTitle}`,
    reason: row.reason,
    placedBy: row.placedByName,
    placedAt: row.createdAt.toISOString(),
    releasedBy: row.releasedByName,
    releasedAt: row.releasedAt?.toISOString() ?? null,
    releaseReason: row.releaseReason,
    version: row.version,
    allowedActions: holdActions(actor, row),
  };
}
