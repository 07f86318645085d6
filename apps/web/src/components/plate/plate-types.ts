import type { CouponLayout } from '@proofplate/imaging';

/** The part of a coupon's layout that is drawn; `couponLayout(…)` of the imaging package gives it. */
export type PlateLayout = Pick<
  CouponLayout,
  'plate' | 'rows' | 'columns' | 'cells' | 'fiducials' | 'rowLetters' | 'columnNumbers' | 'codePlace' | 'dataMatrixPlace'
>;

export type PlateFill =
  /** Not marked yet. */
  | { kind: 'blank' }
  /** The photo behind shows through. */
  | { kind: 'photo' }
  /** Measured colour, `#rrggbb`. */
  | { kind: 'colour'; colour: string }
  /** A response: its place on the colour scale and its number. */
  | { kind: 'response'; value: number; text: string }
  /** Marked, but there is no number: hatched. */
  | { kind: 'missing' };

export type PlateCellView = {
  fill: PlateFill;
  /** Spoken after the address: "power 60 percent, speed 800 millimetres per second". */
  description?: string;
  /** 0 to 5, a digit in the lower right corner. */
  rating?: number | undefined;
  /** Above a limit: edge and corner flag. */
  isFlagged?: boolean;
};

/** What is drawn in each cell, by address; a cell without a view is blank. */
export type PlateCells = Readonly<Record<string, PlateCellView | undefined>>;

export const BLANK: PlateCellView = { fill: { kind: 'blank' } };
