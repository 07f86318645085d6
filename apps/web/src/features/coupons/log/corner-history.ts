import type { PhotoCorner } from './log.api';

/** Corners while they are set: fewer than four until each was placed. */
export type Corners = readonly PhotoCorner[];
export type CornerHistory = { readonly present: Corners; readonly past: readonly Corners[] };

const CORNER_COUNT = 4;
/** Where the handles stand when they are placed without a pointer. */
const INSET = 0.12;

export const CORNER_NAMES = [
  'at the origin mark',
  'across from it, along the numbers',
  'diagonally opposite',
  'below the origin mark',
] as const;

/** A change that Undo takes back. */
export function withChange({ present, past }: CornerHistory, next: Corners): CornerHistory {
  return { present: next, past: [...past, present] };
}

/** A step of a movement that is one change as a whole. */
export function withoutTrace({ past }: CornerHistory, next: Corners): CornerHistory {
  return { present: next, past };
}

export function undone(history: CornerHistory): CornerHistory {
  const before = history.past.at(-1);
  return before === undefined ? history : { present: before, past: history.past.slice(0, -1) };
}

export function placed(corners: Corners, point: PhotoCorner): Corners {
  return corners.length >= CORNER_COUNT ? corners : [...corners, within(point)];
}

export function moved(corners: Corners, index: number, point: PhotoCorner): Corners {
  return corners.map((corner, own) => (own === index ? within(point) : corner));
}

export const startCorners: Corners = [
  { x: INSET, y: INSET },
  { x: 1 - INSET, y: INSET },
  { x: 1 - INSET, y: 1 - INSET },
  { x: INSET, y: 1 - INSET },
];

export const isComplete = (corners: Corners) => corners.length === CORNER_COUNT;

/** Step of an arrow key in pixels of the picture; undefined: another key. */
export function nudgeOf(key: string, isFast: boolean): { x: number; y: number } | undefined {
  const step = isFast ? 10 : 1;
  switch (key) {
    case 'ArrowLeft':
      return { x: -step, y: 0 };
    case 'ArrowRight':
      return { x: step, y: 0 };
    case 'ArrowUp':
      return { x: 0, y: -step };
    case 'ArrowDown':
      return { x: 0, y: step };
    default:
      return undefined;
  }
}

const within = ({ x, y }: PhotoCorner): PhotoCorner => ({ x: Math.min(1, Math.max(0, x)), y: Math.min(1, Math.max(0, y)) });
