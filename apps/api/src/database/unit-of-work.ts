import { Inject, Injectable } from '@nestjs/common';
import type { DbHandle, Tx } from '@proofplate/db';
import { sql } from 'drizzle-orm';
import { UnavailableError } from '../common/errors/domain-error';
import { IdempotencyKeyReusedError, RequestInFlightError } from '../common/errors/request.errors';
import { isConnectionLoss, sqlStateOf } from '../common/filters/framework-problem';
import { remainingMs } from '../common/http/deadline';
import { type IdempotencyContext, idempotencyStorage } from '../common/idempotency/idempotency-context';
import { Env } from '../config/env.validation';
import { expectLastActs, runLastActs } from './before-commit';
import { claimKey, keepAnswer } from './idempotency.repository';
import { withoutValues } from './without-values';

export type { Actor } from '../common/actor';
export type { Tx };

/** What can run one statement: a transaction, or the pool outside of one. */
export type Executor = Pick<Tx, 'execute'>;

/** Injection token of the pool. */
export const DATABASE = Symbol('database');

/** Whose transaction it is. Without a member (sign-up, acceptance, worker) only the shop is set. */
export type Tenant = { readonly shopId: string; readonly memberId?: string };
export type RunOptions = {
  /** Refuses writes and lets the unit of work repeat the work once when its connection was killed. */
  readonly readOnly?: boolean;
  /** Longest single statement; the request's own deadline always cuts it shorter. */
  readonly statementTimeoutMs?: number;
};

const LOCK_NOT_AVAILABLE = '55P03';

/** Opens transactions. One use case, one transaction, bound to one shop by row-level security. */
@Injectable()
export class UnitOfWork {
  constructor(
    @Inject(DATABASE) private readonly handle: DbHandle,
    private readonly env: Env,
  ) {}

  /** Runs the use case in one transaction of the actor's shop; its last acts and the kept answer of an idempotent call belong to it. */
  async run<T>(actor: Tenant, work: (tx: Tx) => Promise<T>, options: RunOptions = {}): Promise<T> {
    const context = idempotencyStorage.getStore();
    const isIdempotent = context !== undefined && !context.claimed && actor.memberId !== undefined && options.readOnly !== true;
    if (!isIdempotent) return this.transact(actor, work, options);
    context.claimed = true;
    return this.transact(actor, (tx) => once(tx, { shopId: actor.shopId, memberId: actor.memberId ?? '' }, context, work), options);
  }

  /** A use case that only reads. */
  async read<T>(actor: Tenant, work: (tx: Tx) => Promise<T>, options: Omit<RunOptions, 'readOnly'> = {}): Promise<T> {
    return this.run(actor, work, { ...options, readOnly: true });
  }

  /**
   * For what is known before any shop is: each statement stands for itself and tables of shops fail closed. The functions of accounts
   * are whole acts, so none of them needs a transaction around it.
   */
  async outsideShop<T>(work: (db: Executor) => Promise<T>): Promise<T> {
    try {
      return await work(this.handle.db);
    } catch (error) {
      throw withoutValues(error);
    }
  }

  private async transact<T>(actor: Tenant, work: (tx: Tx) => Promise<T>, options: RunOptions): Promise<T> {
    try {
      return await this.attempt(actor, work, options);
    } catch (error) {
      const mayRepeat = options.readOnly === true && isConnectionLoss(error);
      if (!mayRepeat) throw withoutValues(error);
    }
    return this.attempt(actor, work, options).catch((error: unknown) => {
      throw withoutValues(error);
    });
  }

  private attempt<T>(actor: Tenant, work: (tx: Tx) => Promise<T>, options: RunOptions): Promise<T> {
    return this.handle.db.transaction(
      async (tx) => {
        await bind(tx, actor, options.statementTimeoutMs ?? this.env.DATABASE_STATEMENT_TIMEOUT_MS);
        expectLastActs(tx);
        const result = await work(tx);
        await runLastActs(tx);
        if (isPastDeadline()) throw new UnavailableError('It took too long, so nothing was changed. Try again in a moment.');
        return result;
      },
      { accessMode: options.readOnly === true ? 'read only' : 'read write' },
    );
  }
}

async function bind(tx: Tx, actor: Tenant, statementTimeoutMs: number): Promise<void> {
  const leftMs = remainingMs();
  if (leftMs !== undefined && leftMs <= 0) throw new UnavailableError('It took too long, so nothing was changed. Try again in a moment.');
  const timeoutMs = Math.max(1, Math.floor(Math.min(statementTimeoutMs, leftMs ?? statementTimeoutMs)));
  await tx.execute(sql`select set_config('app.shop_id', ${actor.shopId}, true), set_config('app.member_id', ${actor.memberId ?? ''}, true),
    set_config('statement_timeout', ${`${timeoutMs}ms`}, true)`);
}

const isPastDeadline = () => (remainingMs() ?? 1) <= 0;

/** The effect happens with the first transaction that stores the key; later ones answer what that one answered. */
async function once<T>(
  tx: Tx,
  scope: { readonly shopId: string; readonly memberId: string },
  context: IdempotencyContext,
  work: (tx: Tx) => Promise<T>,
): Promise<T> {
  const claim = { ...scope, route: context.route, key: context.key };
  const stored = await claimKey(tx, { ...claim, requestHash: context.requestHash }).catch((error: unknown) => {
    throw sqlStateOf(error) === LOCK_NOT_AVAILABLE ? new RequestInFlightError() : error;
  });
  if (stored === undefined) {
    const result = await work(tx);
    await keepAnswer(tx, claim, result ?? null);
    return result;
  }
  if (stored.requestHash !== context.requestHash) throw new IdempotencyKeyReusedError();
  context.replayed = true;
  // the stored body is the JSON of what this same route answered, so it has the shape of T as the client sees it
  return stored.answer as T;
}
