import { ProblemError } from '../../../lib/api';
import type { CellRating, OwnRating, SentRating } from './log.api';

export type RatingConflict = { cellId: string; yours: OwnRating; current: CellRating | null };
export type Refusal = { problem: ProblemError; dropped: ReadonlyMap<string, OwnRating> };

export type RatingQueueOptions = {
  send: (ratings: readonly SentRating[]) => Promise<readonly CellRating[]>;
  /** Version of the caller’s own rating as it was read; undefined: none. */
  readVersion: (cellId: string) => number | undefined;
  onSaved: (saved: readonly CellRating[]) => Promise<void>;
  onRefused: (refusal: Refusal) => void;
  onConflict: (conflicts: readonly RatingConflict[]) => void;
  onChange: () => void;
};

/**
 * Sends ratings one request after the other, so that a cell rated twice in a row never overtakes itself; what was typed meanwhile goes out
 * together. Until the answer the waiting value is shown; after a refusal it is gone again.
 */
export function createRatingQueue(options: RatingQueueOptions) {
  let waiting = new Map<string, OwnRating>();
  let underWay = new Map<string, OwnRating>();
  const savedVersions = new Map<string, number>();
  let isBusy = false;

  const versionOf = (cellId: string) => Math.max(savedVersions.get(cellId) ?? 0, options.readVersion(cellId) ?? 0);

  async function run(): Promise<void> {
    if (isBusy) return;
    isBusy = true;
    try {
      while (waiting.size > 0) {
        underWay = waiting;
        waiting = new Map();
        await sendBatch(underWay);
      }
    } finally {
      underWay = new Map();
      isBusy = false;
      options.onChange();
    }
  }

  async function sendBatch(batch: ReadonlyMap<string, OwnRating>): Promise<void> {
    try {
      const saved = await options.send([...batch].map(([cellId, own]) => ({ ...own, cellId, seenVersion: versionOf(cellId) || null })));
      await takeOver(saved);
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      const conflicts = conflictsOf(error);
      if (conflicts === undefined) options.onRefused({ problem: error, dropped: batch });
      else await settle(batch, conflicts);
    }
  }

  async function takeOver(saved: readonly CellRating[]): Promise<void> {
    for (const { cellId, version } of saved) savedVersions.set(cellId, version);
    await options.onSaved(saved);
  }

  /** An answer that was lost comes back as a conflict with one’s own value: that is no conflict. */
  async function settle(batch: ReadonlyMap<string, OwnRating>, conflicts: readonly RatingConflict[]): Promise<void> {
    const stored = conflicts.flatMap(({ current }) => (current === null ? [] : [current]));
    await takeOver(stored);
    const open = conflicts.filter(({ yours, current }) => current === null || !isSameRating(yours, current));
    const named = new Set(conflicts.map(({ cellId }) => cellId));
    // the whole batch was refused, so what is not in question goes out again
    for (const [cellId, own] of batch) if (!named.has(cellId) && !waiting.has(cellId)) waiting.set(cellId, own);
    if (open.length > 0) options.onConflict(open);
  }

  return {
    put(changes: ReadonlyMap<string, OwnRating>): void {
      for (const [cellId, own] of changes) waiting.set(cellId, own);
      options.onChange();
      void run();
    },
    /** The value that is not stored yet. */
    pending: (cellId: string): OwnRating | undefined => waiting.get(cellId) ?? underWay.get(cellId),
    isIdle: () => !isBusy,
  };
}

export type RatingQueue = ReturnType<typeof createRatingQueue>;

export function isSameRating(one: OwnRating, other: OwnRating): boolean {
  return (
    one.rating === other.rating &&
    one.outcome === other.outcome &&
    one.note === other.note &&
    one.tags.length === other.tags.length &&
    one.tags.every((tag) => other.tags.includes(tag))
  );
}

function conflictsOf({ status, body }: ProblemError): readonly RatingConflict[] | undefined {
  if (status !== 412 || typeof body.current !== 'object' || body.current === null || !('conflicts' in body.current)) return undefined;
  // the api’s documented answer to a rating that moved on
  return body.current.conflicts as readonly RatingConflict[];
}
