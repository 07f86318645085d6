import type { Lab } from './colour';
import type { GroundKind } from './grounds';
import type { MarkOutcome } from './mark-outcome';

export const MARK_KINDS = [
  'anodised black bleach',
  'anodised clear dark mark',
  'stainless dark anneal',
  'brass dark engrave',
  'titanium colour anneal',
  'powder coat removal',
  'acrylic frost',
  'slate engrave',
] as const;
export type MarkKind = (typeof MARK_KINDS)[number];

/** Colour at one dose: log10 of the dose in J/mm2, then L*, a*, b*. */
export type DoseColour = readonly [log10Dose: number, lightness: number, a: number, b: number];

/** One material under one effect. Invented numbers, shaped after what each process is known to do. */
export type MarkProcess = {
  readonly ground: GroundKind;
  readonly path: readonly DoseColour[];
  readonly target: Lab;
  /** Colour difference (CIE 1976) that costs one step of rating. */
  readonly toleranceDeltaE: number;
  /** log10 dose from which energy only destroys. */
  readonly overburnFrom: number;
  readonly overburnOutcome: MarkOutcome;
  /** Pulses only; a gas laser's beam is taken as continuous. */
  readonly pulses?: {
    /** Peak power that the path was drawn for, kW. */
    readonly usualPeakKw: number;
    /** Decades of dose that ten times the usual peak power is worth. */
    readonly peakWorth: number;
    /** Peak power above which the surface is torn instead of heated, kW. */
    readonly tearsAboveKw: number;
    /** Pulse pitch above which single dots show, um. */
    readonly dotsAboveUm: number;
  };
  /** How far the heat reaches beyond the cell at the best dose, 0 to 1. */
  readonly halo: number;
};

export const MARK_PROCESSES: Readonly<Record<MarkKind, MarkProcess>> = {
  // The dye goes, the oxide stays: lighter with dose until the oxide itself breaks up and yellows.
  'anodised black bleach': {
    ground: 'anodised black',
    path: [
      [-1.5, 21, 0, -1.2],
      [-1.1, 27, 0.3, -1],
      [-0.8, 40, 0.5, 0],
      [-0.55, 58, 0.5, 1],
      [-0.3, 73, 0, 1.8],
      [-0.1, 80, -0.2, 2],
      [0.1, 77, 0.2, 3.4],
      [0.35, 66, 0.8, 5],
      [0.65, 52, 1.4, 7],
    ],
    target: [80, 0, 2],
    toleranceDeltaE: 6,
    overburnFrom: 0.15,
    overburnOutcome: 'overburnt',
    pulses: { usualPeakKw: 8, peakWorth: 0.35, tearsAboveKw: 30, dotsAboveUm: 40 },
    halo: 0.15,
  },
  // Short pulses darken below the oxide; too much blisters it and it turns milky.
  'anodised clear dark mark': {
    ground: 'anodised clear',
    path: [
      [-1.4, 78, -0.3, 0.8],
      [-0.9, 70, 0, 2],
      [-0.5, 56, 0.6, 3],
      [-0.1, 41, 0.6, 2],
      [0.25, 29, 0.4, 0.6],
      [0.5, 27, 0.4, 0.6],
      [0.75, 38, 0.5, 2.5],
      [1, 52, 0.8, 4],
    ],
    target: [27, 0.4, 0.6],
    toleranceDeltaE: 6,
    overburnFrom: 0.62,
    overburnOutcome: 'peeled',
    pulses: { usualPeakKw: 6, peakWorth: -0.2, tearsAboveKw: 14, dotsAboveUm: 12 },
    halo: 0.2,
  },
  // Oxide grows with heat: straw, brown, violet, blue, then black; beyond that the surface melts and greys.
  'stainless dark anneal': {
    ground: 'stainless brushed',
    path: [
      [-0.8, 75, 0.2, 3],
      [-0.45, 71, 1.5, 10],
      [-0.18, 61, 5, 18],
      [0.05, 50, 8, 13],
      [0.24, 41, 6, 2],
      [0.4, 34, 1.5, -7],
      [0.56, 29, 0.4, -2],
      [0.68, 25.5, 0.5, 0.3],
      [0.8, 26.8, 1, 2],
      [0.95, 34, 2, 6],
      [1.15, 47, 1.2, 5],
    ],
    target: [25.5, 0.5, 0.3],
    toleranceDeltaE: 5,
    overburnFrom: 0.8,
    overburnOutcome: 'overburnt',
    pulses: { usualPeakKw: 1.5, peakWorth: 0.15, tearsAboveKw: 7, dotsAboveUm: 8 },
    halo: 0.5,
  },
  'brass dark engrave': {
    ground: 'brass turned',
    path: [
      [-0.7, 73, 4, 30],
      [-0.2, 66, 5, 28],
      [0.2, 53, 8, 22],
      [0.5, 39, 7, 14],
      [0.75, 29, 4, 7],
      [1, 31, 5, 10],
      [1.25, 40, 7, 16],
    ],
    target: [29, 4, 7],
    toleranceDeltaE: 7,
    overburnFrom: 0.95,
    overburnOutcome: 'burr',
    pulses: { usualPeakKw: 10, peakWorth: 0.3, tearsAboveKw: 40, dotsAboveUm: 30 },
    halo: 0.4,
  },
  // Interference colours of a growing oxide, first order then second, each paler than the one before.
  'titanium colour anneal': {
    ground: 'titanium satin',
    path: [
      [-1, 66, 0.5, 3],
      [-0.7, 65, 4, 24],
      [-0.5, 57, 9, 36],
      [-0.32, 45, 22, 12],
      [-0.18, 37, 20, -24],
      [-0.04, 43, -1, -38],
      [0.12, 54, -13, -24],
      [0.28, 64, -9, 10],
      [0.45, 57, 3, 22],
      [0.62, 49, 9, 8],
      [0.8, 42, 2, 4],
      [1, 34, 1, 2],
    ],
    target: [43, -1, -38],
    toleranceDeltaE: 9,
    overburnFrom: 0.75,
    overburnOutcome: 'overburnt',
    pulses: { usualPeakKw: 1.2, peakWorth: 0.1, tearsAboveKw: 6, dotsAboveUm: 8 },
    halo: 0.35,
  },
  // The coat scorches first, then lifts in spots, then bare metal shows; at last the metal itself discolours.
  'powder coat removal': {
    ground: 'powder coat blue',
    path: [
      [-1.3, 30, 3, -26],
      [-0.8, 27, 3, -20],
      [-0.4, 34, 3, -12],
      [-0.05, 53, 1, -4],
      [0.2, 70, 0, 1],
      [0.45, 76, 0, 3],
      [0.7, 71, 1, 5],
      [1, 58, 2.5, 8],
    ],
    target: [76, 0, 3],
    toleranceDeltaE: 7,
    overburnFrom: 0.75,
    overburnOutcome: 'overburnt',
    pulses: { usualPeakKw: 10, peakWorth: 0.3, tearsAboveKw: 60, dotsAboveUm: 45 },
    halo: 0.45,
  },
  // Cast sheet frosts white in the beam's track; too slow, and it runs and turns clear again.
  'acrylic frost': {
    ground: 'acrylic smoke',
    path: [
      [-1.6, 42, -2, -2.5],
      [-1.2, 52, -1.6, -1.6],
      [-0.8, 68, -1, -0.4],
      [-0.4, 82, -0.6, 0.4],
      [-0.1, 89, -0.5, 0.8],
      [0.2, 86, -0.6, 1],
      [0.55, 74, -1, 1.5],
    ],
    target: [89, -0.5, 0.8],
    toleranceDeltaE: 6,
    overburnFrom: 0.3,
    overburnOutcome: 'melted',
    halo: 0.1,
  },
  'slate engrave': {
    ground: 'slate natural',
    path: [
      [-1.4, 29, -0.8, -3],
      [-1, 34, -0.4, -2],
      [-0.6, 48, 0, -0.6],
      [-0.2, 63, 0, 0.6],
      [0.15, 70, 0.2, 1.4],
      [0.5, 66, 0.6, 2.2],
      [0.85, 55, 1.2, 4],
    ],
    target: [70, 0.2, 1.4],
    toleranceDeltaE: 6,
    overburnFrom: 0.45,
    overburnOutcome: 'melted',
    halo: 0.15,
  },
};
