import { schema, type Tx } from '@proofplate/db';
import { and, eq, sql } from 'drizzle-orm';

const { idempotencyKey } = schema;

type Claim = { readonly shopId: string; readonly memberId: string; readonly route: string; readonly key: string };
export type StoredAnswer = { readonly requestHash: string; readonly answer: unknown };

/** How long a repeat waits for the first request to finish before it is told that this one is still in flight. */
const WAIT_FOR_FIRST_MS = 500;

/** Answers are kept for two days; a retry comes within minutes. */
const KEPT_HOURS = 48;
const SWEPT_AT_ONCE = 50;

/**
 * Stores the key, or finds the answer that an earlier transaction stored under it. A concurrent first request holds the row's place
 * until it ends; past the short lock timeout PostgreSQL raises 55P03.
 */
export async function claimKey(tx: Tx, claim: Claim & { readonly requestHash: string }): Promise<StoredAnswer | undefined> {
  const { lockTimeout } = await setLockTimeout(tx, `${WAIT_FOR_FIRST_MS}ms`);
  const inserted = await tx.insert(idempotencyKey).values(claim).onConflictDoNothing().returning({ key: idempotencyKey.key });
  await setLockTimeout(tx, lockTimeout);
  if (inserted.length > 0) {
    await forgetOld(tx, claim);
    return undefined;
  }
  const [stored] = await tx
    .select({ requestHash: idempotencyKey.requestHash, responseBody: idempotencyKey.responseBody })
    .from(idempotencyKey)
    .where(isClaim(claim));
  return stored === undefined ? undefined : { requestHash: stored.requestHash, answer: parsed(stored.responseBody) };
}

/** Each new key takes some old ones of its member along, so that the table needs no caretaker. Never waits for another transaction. */
async function forgetOld(tx: Tx, { shopId, memberId }: Claim): Promise<void> {
  const isOld = sql`${idempotencyKey.createdAt} < now() - make_interval(hours => ${KEPT_HOURS}::int)`;
  const old = tx
    .select({ key: sql`ctid` })
    .from(idempotencyKey)
    .where(and(eq(idempotencyKey.shopId, shopId), eq(idempotencyKey.memberId, memberId), isOld))
    .limit(SWEPT_AT_ONCE)
    .for('update', { skipLocked: true });
  await tx.delete(idempotencyKey).where(and(eq(idempotencyKey.shopId, shopId), sql`ctid in (${old})`));
}

/** Keeps the answer beside the effect, in the same transaction: as one JSON text, because jsonb would reorder its members. */
export async function keepAnswer(tx: Tx, claim: Claim, answer: unknown): Promise<void> {
  await tx
    .update(idempotencyKey)
    .set({ responseBody: { json: JSON.stringify(answer) }, responseStatus: 201 })
    .where(isClaim(claim));
}

const isClaim = (claim: Claim) =>
  and(
    eq(idempotencyKey.shopId, claim.shopId),
    eq(idempotencyKey.memberId, claim.memberId),
    eq(idempotencyKey.route, claim.route),
    eq(idempotencyKey.key, claim.key),
  );

async function setLockTimeout(tx: Tx, value: string): Promise<{ lockTimeout: string }> {
  const [row] = await tx.execute<{ before: string }>(
    sql`select current_setting('lock_timeout') as before, set_config('lock_timeout', ${value}, true)`,
  );
  return { lockTimeout: row?.before ?? '0' };
}

function parsed(kept: unknown): unknown {
  if (typeof kept === 'object' && kept !== null && 'json' in kept && typeof kept.json === 'string') return JSON.parse(kept.json);
  return null;
}
