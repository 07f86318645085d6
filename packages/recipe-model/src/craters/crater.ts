import type { LiuFit } from '@proofplate/physics';
import type { ParameterSet } from '../vocabulary/setting';

/** A cell whose crater somebody measured, with the setting that really marked it. */
export type CraterCell = {
  readonly address: string;
  readonly diameterUm: number;
  readonly parameters: ParameterSet;
};

/** What all craters of one line must share; a null pulse width is the one width that the source has. */
export type CraterSeries = { readonly pulses: number; readonly pulseWidthNs: number | null; readonly focusOffsetMm: number };

export type CraterPoint = {
  readonly address: string;
  readonly diameterUm: number;
  /** Null where it cannot be worked out; excludedBecause says why. */
  readonly pulseEnergyUj: number | null;
  readonly series: CraterSeries | null;
  /** Null: the fit takes the point. */
  readonly excludedBecause: string | null;
  /** True for a point of the fit so far above the threshold that more than the spot's shape widens it. */
  readonly isFarAbove: boolean;
};

export type SeriesThreshold = {
  readonly pulses: number;
  readonly points: number;
  readonly thresholdPeakFluenceJPerCm2: number;
  readonly standardErrorJPerCm2: number;
};

export type CraterIncubation = {
  readonly incubationCoefficient: number;
  readonly singlePulseThresholdJPerCm2: number;
  readonly thresholds: readonly SeriesThreshold[];
};

export type CraterFit = {
  readonly points: readonly CraterPoint[];
  /** The series with most craters; null where no crater can be used. */
  readonly series: CraterSeries | null;
  readonly pointCount: number;
  readonly fit: LiuFit | null;
  readonly refusedBecause: string | null;
  /** What to look at before the numbers are trusted. */
  readonly remarks: readonly string[];
  /** From three numbers of pulses per place on; null before. */
  readonly incubation: CraterIncubation | null;
};
