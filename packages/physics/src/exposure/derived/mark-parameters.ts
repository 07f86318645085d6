import type { Fill } from '../fill';

/** A quantity that is not known, with the reason a person can read: it is never replaced by zero. */
export type Unknown = {
  readonly unknownBecause: string;
  /** True when the mode gives the quantity no meaning, so that nobody goes looking for it. */
  readonly isRuledOutByMode?: boolean;
};

export type Quantity = number | Unknown;

/** The spot in focus: measured (with wavelength and M² when it is to be followed out of focus), or computed from the beam. */
export type MarkSpot =
  | { readonly spotDiameterUm: number; readonly wavelengthNm?: Quantity; readonly m2?: Quantity }
  | {
      readonly wavelengthNm: Quantity;
      readonly focalLengthMm: Quantity;
      readonly beamDiameterMm: Quantity;
      readonly m2: Quantity;
      /** Clear aperture at the lens; absent where nobody stated it. */
      readonly apertureMm?: number;
    }
  | Unknown;

/** Rectangle to be filled and what the scan head needs beside the lines themselves. */
export type MarkArea = {
  readonly widthMm: number;
  readonly heightMm: number;
  readonly jumpSpeedMmPerS: Quantity;
  readonly lineOverheadMs: Quantity;
  readonly jumpSettleMs: Quantity;
  readonly pauseBetweenMs: Quantity;
  /** What a scan takes beside its lines; absent: none. */
  readonly scanOverheadMs?: Quantity;
};

export type MarkParameters = {
  /** Average power at the workpiece, W. */
  readonly powerW: Quantity;
  readonly speedMmPerS: Quantity;
  /** Absent for a continuous beam. */
  readonly frequencyKhz?: Quantity;
  /** Absent when the source does not state it. */
  readonly pulseWidthNs?: Quantity;
  readonly lineSpacingUm: Quantity;
  readonly passes: Quantity;
  readonly fill: Fill;
  /** Circular oscillation of the line; absent for a straight one. */
  readonly wobble?: { readonly diameterUm: Quantity; readonly frequencyKhz: Quantity };
  readonly spot: MarkSpot;
  /** Distance of the surface from the focal plane, mm; positive when the surface lies farther from the lens. */
  readonly focusOffsetMm: Quantity;
  readonly area?: MarkArea;
};
