import { useRef, useState } from 'react';
import { ProblemError } from '../../../lib/api';
import { newIdempotencyKey } from '../../../lib/idempotency-key';
import { type Coupon, type CouponCell, type MarkBody, type MarkedCell, markCell, undoMark } from '../coupons.api';

type Outcome = Pick<MarkBody, 'outcome' | 'actual' | 'note'>;
export type Marking = {
  /** True once the server has it. */
  mark: (cell: CouponCell, outcome: Outcome) => Promise<boolean>;
  /** As mark, but the refusal goes to whoever asked. */
  markOrThrow: (cell: CouponCell, outcome: Outcome) => Promise<void>;
  undo: (cell: CouponCell) => Promise<void>;
  retry: () => void;
  isBusy: boolean;
  problem: { address: string; error: ProblemError } | undefined;
  /** What was just taken back or overtaken. */
  note: string | undefined;
};

/** The coupon as the page holds it. */
export type CouponOnPage = {
  change: (change: (coupon: Coupon) => Coupon) => void;
  readAgain: () => Promise<unknown>;
};

const STALE = 'stale-version';

/** Acts at the machine. Each is stored before the next cell shows; a repeat after a lost connection cannot do it twice. */
export function useMarking(coupon: Coupon, page: CouponOnPage): Marking {
  const [isBusy, setIsBusy] = useState(false);
  const [problem, setProblem] = useState<Marking['problem']>();
  const again = useRef<() => void>(undefined);
  const isRunning = useRef(false);
  // the usual line at the foot would lie over the act of the next cell
  const [note, setNote] = useState<string>();

  const run = async (cell: CouponCell, act: () => Promise<MarkedCell>): Promise<void> => {
    // a second tap with a thick glove is not a second cell
    if (isRunning.current) return;
    isRunning.current = true;
    setIsBusy(true);
    setProblem(undefined);
    setNote(undefined);
    try {
      const marked = await act();
      page.change((shown) => ({ ...shown, cells: shown.cells.map((own) => (own.id === marked.cell.id ? marked.cell : own)) }));
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      if (error.code === STALE) {
        await page.readAgain();
        setNote(`${cell.address} was marked by somebody else meanwhile. The page shows the present state.`);
        return;
      }
      setProblem({ address: cell.address, error });
      throw error;
    } finally {
      isRunning.current = false;
      setIsBusy(false);
    }
  };
  const quietly = async (act: Promise<void>): Promise<boolean> => {
    try {
      await act;
      return true;
    } catch (error) {
      if (error instanceof ProblemError) return false;
      throw error;
    }
  };
  const markOrThrow = (cell: CouponCell, outcome: Outcome, key = newIdempotencyKey()): Promise<void> => {
    again.current = () => void quietly(markOrThrow(cell, outcome, key));
    return run(cell, () => markCell(coupon, { cellId: cell.id, cellVersion: cell.version, ...outcome }, key));
  };
  const undo = async (cell: CouponCell, key = newIdempotencyKey()): Promise<void> => {
    again.current = () => void undo(cell, key);
    const isUndone = await quietly(run(cell, () => undoMark(coupon, cell, key)));
    if (isUndone) setNote(`${cell.address} is to be marked again.`);
  };
  return {
    mark: (cell, outcome) => quietly(markOrThrow(cell, outcome)),
    markOrThrow: (cell, outcome) => markOrThrow(cell, outcome),
    undo: (cell) => undo(cell),
    retry: () => again.current?.(),
    isBusy,
    problem,
    note,
  };
}
