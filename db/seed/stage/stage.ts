import { type Db, schema, type Tx } from '@proofplate/db';
import { sql } from 'drizzle-orm';
import { storyIds } from './ids';
import { LedgerWriter, type Teller, type Told } from './ledger-writer';
import type { ObjectStore } from './object-store';

const { codeCounter } = schema;

const STORY_SEED = 20260105;
const LETTERS = { coupon: 'C', recipe: 'R', run: 'J' } as const;
const MIN_DIGITS = 4;

/** One act of the story: a transaction at a moment, by somebody. */
export type Turn = {
  readonly tx: Tx;
  readonly shopId: string;
  readonly at: Date;
  readonly by: Teller;
  /** Id of a new row. */
  readonly newId: () => string;
  readonly nextCode: (kind: keyof typeof LETTERS) => Promise<string>;
  /** End of the ledger's chain as it is now. */
  readonly ledgerHash: () => string;
  /** Adds to the ledger, by the same person at the same moment unless said otherwise. */
  readonly tell: (told: Told, other?: { readonly at?: Date; readonly by?: Teller }) => Promise<void>;
};

export type PictureSize = { readonly widthPx: number; readonly heightPx: number };

/**
 * Where the story is played: each act is a transaction as the owner of the tables with the shop set, so that row-level security and
 * all triggers hold for it as for everybody.
 */
export class Stage {
  readonly shopId: string;
  readonly ledger: LedgerWriter;
  readonly newId: (at: Date) => string;

  constructor(
    private readonly db: Db,
    begin: Date,
    readonly store: ObjectStore,
    readonly pictureSize: PictureSize,
  ) {
    this.newId = storyIds(STORY_SEED);
    this.shopId = this.newId(begin);
    this.ledger = new LedgerWriter(this.shopId);
  }

  async act(at: Date, by: Teller, work: (turn: Turn) => Promise<void>): Promise<void> {
    await this.db.transaction(async (tx) => {
      await tx.execute(sql`set local role proofplate_owner`);
      await tx.execute(sql`select set_config('app.shop_id', ${this.shopId}, true)`);
      await work({
        ...{ tx, at, by, shopId: this.shopId },
        newId: () => this.newId(at),
        nextCode: (kind) => this.nextCode(tx, kind),
        ledgerHash: () => this.ledger.head.hash,
        tell: (told, other = {}) => this.ledger.append(tx, { at: other.at ?? at, teller: other.by ?? by, told }),
      });
    });
  }

  private async nextCode(tx: Tx, kind: keyof typeof LETTERS): Promise<string> {
    const [counter] = await tx
      .insert(codeCounter)
      .values({ shopId: this.shopId, kind, lastNumber: 1 })
      .onConflictDoUpdate({ target: [codeCounter.shopId, codeCounter.kind], set: { lastNumber: sql`${codeCounter.lastNumber} + 1` } })
      .returning({ number: codeCounter.lastNumber });
    if (counter === undefined) throw new Error('the code counter gave no number');
    return `${LETTERS[kind]}-${String(counter.number).padStart(MIN_DIGITS, '0')}`;
  }
}

/** An act that has a result. */
export async function inTurn<Result>(
  stage: Stage,
  { at, by }: { readonly at: Date; readonly by: Teller },
  work: (turn: Turn) => Promise<Result>,
): Promise<Result> {
  const results: Result[] = [];
  await stage.act(at, by, async (turn) => {
    results.push(await work(turn));
  });
  const [result] = results;
  if (result === undefined) throw new Error('the act gave nothing');
  return result;
}

/** The columns that say whose row it is, who made it and when. */
export function authored({ shopId, at, by }: Turn): { shopId: string; createdAt: Date; createdBy: string } {
  if (by.memberId === null) throw new Error('only members make rows');
  return { shopId, createdAt: at, createdBy: by.memberId };
}

const MS_PER_MINUTE = 60_000;
export const minutesAfter = (at: Date, minutes: number) => new Date(at.getTime() + minutes * MS_PER_MINUTE);
