import { Injectable } from '@nestjs/common';
import { decodeCursor, type Page, pageOf } from '../common/pagination/page';
import { beforeCommit } from '../database/before-commit';
import { type Actor, type Tx, UnitOfWork } from '../database/unit-of-work';
import { type LedgerActorDto, type LedgerEventDto, type LedgerVerificationDto } from './dto/ledger-event.dto';
import { ListLedgerQuery } from './dto/list-ledger.query.dto';
import { toLedgerEventDto } from './ledger.mapper';
import { type ChainHead, LedgerRepository } from './ledger.repository';
import { type ChainFault, firstFault, GENESIS_HASH, linkEvent } from './ledger-chain';
import { filterFor } from './ledger-filter';

/** Who acts; without a member and a session it is the server itself. */
export type LedgerActor = Pick<Actor, 'shopId' | 'printedName'> & Partial<Pick<Actor, 'memberId' | 'sessionId'>>;

export type LedgerEntry = {
  readonly actor: LedgerActor;
  /** Past tense in dots: `recipe.submitted`, `member.role-changed`. */
  readonly action: string;
  readonly subjectType: string;
  readonly subjectId: string;
  /** The code that people read, where there is one. */
  readonly subjectCode?: string;
  readonly before?: unknown;
  readonly after?: unknown;
};

const VERIFY_STRETCH = 1_000;
const VERIFY_STATEMENT_TIMEOUT_MS = 10_000;

@Injectable()
export class LedgerService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly repository: LedgerRepository,
  ) {}

  /** Begins the chain of a new shop. */
  async open(tx: Tx, shopId: string): Promise<void> {
    await this.repository.insertHead(tx, shopId);
  }

  /**
   * Adds an event to the shop's chain in the caller's transaction. It is written as the transaction's last act, in the order of the
   * calls, because the end of the chain is the one row that all writers of a shop share.
   */
  async record(tx: Tx, entry: LedgerEntry): Promise<void> {
    const { actor, action, subjectType, subjectId, subjectCode = null } = entry;
    const [before, after] = [asJson(entry.before), asJson(entry.after)];
    beforeCommit(tx, async () => {
      const { at, ...head } = await this.repository.lockHead(tx, actor.shopId);
      const who = {
        shopId: actor.shopId,
        actorMemberId: actor.memberId ?? null,
        actorName: actor.printedName,
        sessionId: actor.sessionId ?? null,
      };
      const body = { ...who, at: at.toISOString(), action, subjectType, subjectId, subjectCode, before, after };
      await this.repository.append(tx, linkEvent(body, head));
    });
  }

  /** Locks the chain's end early, for a signature that cites the hash before it. Call it after every other lock. */
  async lockHead(tx: Tx, shopId: string): Promise<ChainHead> {
    const { seq, hash } = await this.repository.lockHead(tx, shopId);
    return { seq, hash };
  }

  async list(actor: Actor, query: ListLedgerQuery): Promise<Page<LedgerEventDto>> {
    const [beforeSeq] = decodeCursor(query.cursor, ['number']) ?? [];
    const range = typeof beforeSeq === 'number' ? { beforeSeq } : {};
    const search = { filter: filterFor(actor, query), range };
    const rows = await this.unitOfWork.read(actor, (tx) => this.repository.list(tx, actor.shopId, search, query.limit + 1));
    return pageOf(rows, query.limit, { item: toLedgerEventDto, cursor: (row) => [row.seq] });
  }

  /** Names to search by. */
  async actors(actor: Actor): Promise<LedgerActorDto[]> {
    return this.unitOfWork.read(actor, (tx) => this.repository.actors(tx, actor.shopId));
  }

  /** Recomputes the whole chain of the shop and names the first event that does not fit. */
  async verify(actor: Actor): Promise<LedgerVerificationDto> {
    const options = { statementTimeoutMs: VERIFY_STATEMENT_TIMEOUT_MS };
    return this.unitOfWork.read(actor, async (tx) => this.verifyIn(tx, actor.shopId), options);
  }

  private async verifyIn(tx: Tx, shopId: string): Promise<LedgerVerificationDto> {
    const head = await this.repository.head(tx, shopId);
    let reached: ChainHead = { seq: 0, hash: GENESIS_HASH };
    while (reached.seq < head.seq) {
      const range = { afterSeq: reached.seq, upToSeq: head.seq };
      const events = await this.repository.stretch(tx, shopId, range, VERIFY_STRETCH);
      const last = events.at(-1);
      const fault = last === undefined ? missing(reached.seq + 1) : firstFault(events, reached);
      if (fault !== undefined || last === undefined) return broken(head, fault ?? missing(reached.seq + 1));
      reached = { seq: last.seq, hash: last.hash };
    }
    if (reached.hash !== head.hash) return broken(head, { seq: head.seq, reason: 'link broken' });
    return { isIntact: true, eventCount: head.seq, headHash: head.hash, firstBrokenSeq: null, reason: null };
  }
}

const missing = (seq: number): ChainFault => ({ seq, reason: 'number missing' });

const broken = (head: ChainHead, fault: ChainFault): LedgerVerificationDto => ({
  isIntact: false,
  eventCount: head.seq,
  headHash: head.hash,
  firstBrokenSeq: fault.seq,
  reason: fault.reason,
});

/** The value as the database will give it back: dates as text, absent members left out. */
function asJson(value: unknown): unknown {
  return value === undefined ? null : JSON.parse(JSON.stringify(value));
}
