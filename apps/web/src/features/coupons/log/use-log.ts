import { useRef, useState } from 'react';
import { useStatusLine } from '../../../components/status-line';
import { useSession } from '../../../lib/session';
import { useShortcut } from '../../../lib/shortcuts';
import type { CouponPlateHandle } from './components/coupon-plate';
import type { Inspection } from './log.api';
import { type MoveAfterRating, neighbour, storedMove, storeMove, walk } from './moves';
import { PLATE_VIEWS } from './plate-views';
import type { OwnRatings } from './use-own-ratings';
import type { PlateChoice } from './use-plate-choice';

/** Keys and moves of the page, and what may be done on it. */
export function useLog({ inspection, choice, ratings }: { inspection: Inspection; choice: PlateChoice; ratings: OwnRatings }) {
  const announce = useStatusLine();
  const { member } = useSession();
  const [move, setMoveState] = useState<MoveAfterRating>(storedMove);
  const plate = useRef<CouponPlateHandle>(null);
  const tags = useRef<HTMLDivElement>(null);
  const note = useRef<HTMLInputElement>(null);
  const { cells, cell, view, chooseCell, chooseView } = choice;
  const mayRate = inspection.allowedActions.includes('rate') && inspection.criteria !== null;
  const means = new Map(inspection.verdicts.map(({ cellId, meanRating }) => [cellId, meanRating]));

  const rateAndMove = (address: string, rating: number) => {
    const rated = cells.find((each) => each.address === address);
    if (rated === undefined) return;
    if (!mayRate || rated.markState === 'skipped') {
      announce(whyNot(inspection, rated.markState === 'skipped'));
      return;
    }
    ratings.change(rated.id, { rating });
    if (move === 'stay') return;
    const next = neighbour(walk(cells, move), rated, 1);
    chooseCell(next.address);
    plate.current?.focusCell(next.address);
  };
  const setMove = (next: MoveAfterRating) => {
    storeMove(next);
    setMoveState(next);
  };
  useShortcut('t', 'Tags of the cell', () => tags.current?.querySelector<HTMLElement>('button')?.focus());
  useShortcut('n', 'Note on the cell', () => note.current?.focus());
  useShortcut('h', 'Next view of the plate', () => {
    const place = PLATE_VIEWS.findIndex(({ value }) => value === view);
    const next = PLATE_VIEWS[(place + 1) % PLATE_VIEWS.length];
    if (next !== undefined) chooseView(next.value);
  });
  useShortcut('u', 'Undo the last rating', () => ratings.undo?.());
  return {
    announce,
    memberId: member.id,
    plate,
    tags,
    note,
    move,
    setMove,
    mayRate,
    rateAndMove,
    step: (by: 1 | -1) => chooseCell(neighbour(walk(cells, move), cell, by).address),
    knownTags: [...new Set(inspection.ratings.flatMap((row) => row.tags))],
    /** One’s own rating, else what the others say on average. */
    digitOf: (cellId: string) => ratings.of(cellId).rating ?? rounded(means.get(cellId)),
  };
}

/** Why a cell cannot be rated now; empty: it can. */
export function whyNot({ state, criteria, allowedActions }: Inspection, isSkipped: boolean): string {
  if (state === 'planned') return 'The plate is not marked yet. Mark it, then judge its cells.';
  if (state === 'sealed') return 'The coupon is sealed, so its ratings stay as they are.';
  if (isSkipped) return 'This cell was skipped when the plate was marked, so there is nothing to rate.';
  if (criteria === null) return 'Record the acceptance criteria first.';
  return allowedActions.includes('rate') ? '' : 'Your role does not rate cells.';
}

const rounded = (mean: number | null | undefined) => (mean === null || mean === undefined ? undefined : Math.round(mean));
