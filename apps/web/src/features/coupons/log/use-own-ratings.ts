import { useEffect, useMemo, useReducer, useRef, useState } from 'react';
import { type CellRating, type Inspection, type OwnRating, saveRatings, useInspectionCache } from './log.api';
import { createRatingQueue, isSameRating, type RatingConflict, type Refusal } from './rating-queue';

export const NO_RATING: OwnRating = { rating: null, outcome: null, tags: [], note: '' };

type Step = ReadonlyMap<string, OwnRating>;

export type OwnRatings = {
  /** What the caller says of a cell, with what is not stored yet. */
  of: (cellId: string) => OwnRating;
  /** The stored row of the caller, with its time; undefined while nothing is stored. */
  stored: (cellId: string) => CellRating | undefined;
  change: (cellId: string, change: Partial<OwnRating>) => void;
  /** Takes the last change back; undefined: there is none. */
  undo: (() => void) | undefined;
  conflicts: readonly RatingConflict[];
  settle: (conflict: RatingConflict, keepsMine: boolean) => void;
  refusal: Refusal | undefined;
  sendAgain: () => void;
};

/** The caller’s own ratings of a coupon: shown at once, sent in order, rolled back when they are refused. */
export function useOwnRatings(couponId: string, inspection: Inspection, memberId: string): OwnRatings {
  const [, redraw] = useReducer((count: number) => count + 1, 0);
  const [history, setHistory] = useState<readonly Step[]>([]);
  const [conflicts, setConflicts] = useState<readonly RatingConflict[]>([]);
  const [refusal, setRefusal] = useState<Refusal>();
  const own = useMemo(
    () => new Map(inspection.ratings.filter((row) => row.memberId === memberId).map((row) => [row.cellId, row])),
    [inspection.ratings, memberId],
  );
  const latest = useRef(own);
  latest.current = own;
  const cache = useInspectionCache(couponId);

  const queue = useMemo(
    () =>
      createRatingQueue({
        send: (ratings) => saveRatings(couponId, ratings),
        readVersion: (cellId) => latest.current.get(cellId)?.version,
        onSaved: cache.takeOver,
        onRefused: setRefusal,
        onConflict: (found) => setConflicts((before) => [...before, ...found]),
        onChange: redraw,
      }),
    [couponId, cache],
  );
  useFreshVerdicts(cache.readAgain, queue.isIdle());

  const of = (cellId: string): OwnRating => queue.pending(cellId) ?? own.get(cellId) ?? NO_RATING;
  const put = (step: Step) => {
    setRefusal(undefined);
    queue.put(step);
  };
  const change = (cellId: string, changed: Partial<OwnRating>) => {
    const before = plain(of(cellId));
    const after = { ...before, ...changed };
    if (isSameRating(before, after)) return;
    setHistory((steps) => [...steps, new Map([[cellId, before]])]);
    put(new Map([[cellId, after]]));
  };
  const last = history.at(-1);
  const undo = () => {
    if (last === undefined) return;
    setHistory((steps) => steps.slice(0, -1));
    put(last);
  };
  return {
    of,
    stored: (cellId) => own.get(cellId),
    change,
    undo: last === undefined ? undefined : undo,
    conflicts,
    settle: (conflict, keepsMine) => {
      setConflicts((open) => open.filter((other) => other !== conflict));
      if (keepsMine) put(new Map([[conflict.cellId, plain(conflict.yours)]]));
    },
    refusal,
    sendAgain: () => refusal !== undefined && put(refusal.dropped),
  };
}

/** Verdicts and counts follow from ratings on the server; they are read again once the typing pauses. */
function useFreshVerdicts(readAgain: () => Promise<void>, isIdle: boolean): void {
  const wasBusy = useRef(false);
  useEffect(() => {
    if (!isIdle) {
      wasBusy.current = true;
      return;
    }
    if (!wasBusy.current) return;
    wasBusy.current = false;
    void readAgain();
  }, [readAgain, isIdle]);
}

const plain = ({ rating, outcome, tags, note }: OwnRating): OwnRating => ({ rating, outcome, tags, note });
