import { createHash } from 'node:crypto';
import { schema, type Tx } from '@proofplate/db';
import { type ChainHead, GENESIS_HASH, type LedgerBody, linkEvent } from '@proofplate/recipe-model';
import { eq } from 'drizzle-orm';

const { ledgerEvent, ledgerHead } = schema;

export const sha256 = (content: string | Buffer) => createHash('sha256').update(content).digest('hex');

/** What happened, as the api records it. */
export type Told = Pick<LedgerBody, 'action' | 'subjectType' | 'subjectId'> & {
  readonly subjectCode?: string;
  readonly before?: unknown;
  readonly after?: unknown;
};
/** Who did it; without a member it was the server itself. */
export type Teller = { readonly memberId: string | null; readonly name: string };

/** Writes the chain of the demo shop. Sessions are not part of the story, so no event names one. */
export class LedgerWriter {
  private present: ChainHead = { seq: 0, hash: GENESIS_HASH };
  private lastAt = 0;

  constructor(private readonly shopId: string) {}

  get head(): ChainHead {
    return this.present;
  }

  async open(tx: Tx): Promise<void> {
    await tx.insert(ledgerHead).values({ shopId: this.shopId, seq: 0, hash: GENESIS_HASH });
  }

  /** @throws RangeError for an event before the last one: the story must be told in order */
  async append(tx: Tx, { at, teller, told }: { at: Date; teller: Teller; told: Told }): Promise<void> {
    if (at.getTime() < this.lastAt) throw new RangeError(`${told.action} at ${at.toISOString()} comes before the event before it`);
    const { action, subjectType, subjectId, subjectCode = null } = told;
    const body: LedgerBody = {
      shopId: this.shopId,
      at: at.toISOString(),
      actorMemberId: teller.memberId,
      actorName: teller.name,
      sessionId: null,
      ...{ action, subjectType, subjectId, subjectCode },
      before: asJson(told.before),
      after: asJson(told.after),
    };
    const event = linkEvent(body, this.present, sha256);
    await tx.insert(ledgerEvent).values({ ...event, at });
    await tx.update(ledgerHead).set({ seq: event.seq, hash: event.hash }).where(eq(ledgerHead.shopId, this.shopId));
    this.present = { seq: event.seq, hash: event.hash };
    this.lastAt = at.getTime();
  }
}

/** The value as the database will give it back: dates as text, absent members left out. */
function asJson(value: unknown): unknown {
  return value === undefined ? null : JSON.parse(JSON.stringify(value));
}
