import type { MarkSpot, Quantity } from '../../exposure/derived/mark-parameters';

/** A straight body by its outer diameter and wall, or a tapered one by the diameters of the marked surface at its two ends. */
export type RoundBody =
  | { readonly outerDiameterMm: number; readonly wallMm: number }
  | { readonly smallDiameterMm: number; readonly largeDiameterMm: number };

/** Round part, the artwork on it, and how much may be lost towards the edge of a strip. */
export type RoundPart = {
  readonly side: 'outside' | 'inside';
  readonly body: RoundBody;
  /** Length of the part along its axis. */
  readonly lengthMm: number;
  /** Height of the artwork along the surface, from end to end of the part. It lies in the middle of the length. */
  readonly artworkHeightMm: number;
  /** Width of the artwork round the part; or a whole turn with its seam, positive for an overlap, negative for a gap. */
  readonly artwork: { readonly widthMm: number } | { readonly seamMm: number };
  readonly allowance: { readonly kind: 'spot growth' | 'fluence loss'; readonly share: number };
  /** `mid`: focus half way between the strip's middle and its edges. `crown`: focus on its middle. */
  readonly focusAt: 'mid' | 'crown';
  /** Largest angle between the beam and the surface's normal that is wanted at a strip's edge, deg, below 90. */
  readonly steepestEdgeDeg?: number;
  /** Number of index steps that the person asked for. */
  readonly indexSteps?: number;
  readonly stepsPerTurn?: number;
};

/** What the machine with its lens brings, and the focus offsets of the setting's mark steps. */
export type PartOptics = {
  readonly spot: MarkSpot;
  readonly focusOffsetsMm: readonly number[];
  readonly fieldSizeMm: Quantity;
};

export const PART_SOURCE = 'plane geometry; docs/science/round-parts.md';

export const isTaper = (body: RoundBody): body is Extract<RoundBody, { smallDiameterMm: number }> => 'smallDiameterMm' in body;
