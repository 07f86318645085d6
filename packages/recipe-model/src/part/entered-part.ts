import type { MarkSpot, Quantity } from '@proofplate/physics';
import { codesOf, type Labels } from '../vocabulary/labelled';

export type PartShape = 'cylinder' | 'ring' | 'tube' | 'cone';
export const PART_SHAPE_LABELS: Labels<PartShape> = {
  cylinder: 'Solid cylinder',
  ring: 'Ring',
  tube: 'Tube',
  cone: 'Cone',
};
export const PART_SHAPES = codesOf(PART_SHAPE_LABELS);

export type PartSide = 'outside' | 'inside';
export const PART_SIDE_LABELS: Labels<PartSide> = { outside: 'Outside', inside: 'Inside' };
export const PART_SIDES = codesOf(PART_SIDE_LABELS);

export type FocusAllowance = 'fluence loss' | 'spot growth';
export const FOCUS_ALLOWANCE_LABELS: Labels<FocusAllowance> = { 'fluence loss': 'Loss of fluence', 'spot growth': 'Growth of the spot' };
export const FOCUS_ALLOWANCES = codesOf(FOCUS_ALLOWANCE_LABELS);

export type FocusPlace = 'mid' | 'crown';
export const FOCUS_PLACE_LABELS: Labels<FocusPlace> = { mid: 'Half way down the fall', crown: 'On the middle of the strip' };
export const FOCUS_PLACES = codesOf(FOCUS_PLACE_LABELS);

export type LengthUnit = 'mm' | 'in';
export const LENGTH_UNITS: readonly LengthUnit[] = ['mm', 'in'];

/** A length as typed; it stays as it is, and its millimetres are worked out beside it. */
export type EnteredLength = { value: number; unit: LengthUnit };

/** A round part as a person describes it. Which lengths it needs follows from its shape. */
export type EnteredPart = {
  shape: PartShape;
  side: PartSide;
  /** Outside diameter of a cylinder, ring or tube. */
  diameter?: EnteredLength;
  wall?: EnteredLength;
  /** Diameters of the marked surface at the ends of a cone. */
  smallDiameter?: EnteredLength;
  largeDiameter?: EnteredLength;
  /** Along the axis. */
  length?: EnteredLength;
  artworkHeight?: EnteredLength;
  /** Round the part; absent: a whole turn. */
  artworkWidth?: EnteredLength;
  /** Of a whole turn: overlap above zero, gap below; absent: edge to edge. */
  seam?: EnteredLength;
  allowance: FocusAllowance;
  allowancePercent: number;
  focusAt: FocusPlace;
  steepestEdgeDeg?: number;
  indexSteps?: number;
  stepsPerTurn?: number;
  /** Unit of the machine's control, in which results are read off. */
  shownIn: LengthUnit;
};

export type PartLength = 'diameter' | 'wall' | 'smallDiameter' | 'largeDiameter' | 'length' | 'artworkHeight' | 'artworkWidth' | 'seam';
export type PartField = keyof EnteredPart;

/** Lengths that a shape has to have. */
export const LENGTHS_OF_SHAPE: Readonly<Record<PartShape, readonly PartLength[]>> = {
  cylinder: ['diameter', 'length'],
  ring: ['diameter', 'wall', 'length'],
  tube: ['diameter', 'wall', 'length'],
  cone: ['smallDiameter', 'largeDiameter', 'length'],
};

/** The beam and the lens of a machine, as far as they are known, and where the setting's steps put the focus. */
export type PartGround = {
  spot: MarkSpot;
  fieldSizeMm: Quantity;
  focusOffsetsMm: readonly number[];
};

export type PartProblem = { readonly field: PartField; readonly detail: string };
