import { AsyncLocalStorage } from 'node:async_hooks';

/** What the unit of work needs to make an act happen once. One per request; `claimed` by the request's first write transaction. */
export type IdempotencyContext = {
  readonly route: string;
  readonly key: string;
  readonly requestHash: string;
  claimed: boolean;
  replayed: boolean;
};

export const idempotencyStorage = new AsyncLocalStorage<IdempotencyContext>();
