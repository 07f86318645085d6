/** Every kind of work that is left to the worker process, with what its job carries: ids only, the rows hold the rest. */
export type JobPayloads = {
  'mail.send': { readonly outboxId: string };
  'photos.develop': { readonly photoId: string };
  'revisions.take-effect': { readonly revisionId: string };
};

export type TaskName = keyof JobPayloads;

/** What a handler gets: the payload and the shop, which the queue took from the transaction that added the job. */
export type Job<T extends TaskName> = JobPayloads[T] & {
  readonly shopId: string;
  /** 1 at the first try. */
  readonly attempt: number;
};

export type JobHandlers = { readonly [T in TaskName]?: (job: Job<T>) => Promise<void> };

/** Work by the clock, once for all worker processes together. */
export type Sweep = { readonly name: string; readonly everyMinutes: 1 | 5 | 15 | 60; readonly run: () => Promise<void> };
