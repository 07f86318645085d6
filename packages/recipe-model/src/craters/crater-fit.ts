import { incubationFit, type LiuFit, liuFit } from '@proofplate/physics';
import type { CraterCell, CraterFit, CraterIncubation, CraterPoint, CraterSeries, SeriesThreshold } from './crater';
import { type CraterGround, type ReadCrater, readCrater } from './read-crater';

const LEAST_POINTS = 5;
const LEAST_ENERGIES = 3;
const LEAST_PULSE_COUNTS = 3;
/** Peak fluence over threshold up to which one threshold and the spot's shape explain a crater. */
const MOST_TIMES_THRESHOLD = 10;
const SAME_DIGITS = 9;

type Usable = ReadCrater & { readonly series: CraterSeries; readonly pulseEnergyUj: number };
type Fitted = { readonly fit: LiuFit } | { readonly refusedBecause: string };

/**
 * Threshold and effective spot from the craters of a coupon.          D² over ln E is a line; see liuFit
 *
 * Craters of one line share pulses per place, pulse width and focus offset, and do not touch. The series with most craters is fitted
 * (of equal ones that with fewest pulses); every other crater is named with the reason. Thresholds of three or more numbers of pulses
 * at the same pulse width and focus give the incubation coefficient.
 *
 * @param cells   craters, µm, with the setting that marked each
 * @param ground  source and lens of the machine; fields of an old plate that nobody knows
 * @returns every point, the fit or why there is none, and what to look at
 * Valid for a Gaussian spot, one threshold, peak fluence up to about 10 thresholds.
 * Source: J. M. Liu, Opt. Lett. 7 (1982) 196; docs/science/ablation.md
 */
export function craterFit(cells: readonly CraterCell[], ground: CraterGround): CraterFit {
  const read = cells.map((cell) => readCrater(cell, ground));
  const all = bySeries(read.filter(isUsable));
  const chosen = largest(all);
  const fitted = fitOf(chosen);
  const fit = 'fit' in fitted ? fitted.fit : null;
  const series = chosen[0]?.series ?? null;
  const points = read.map((crater) => pointOf(crater, series, fit));
  return {
    points,
    series,
    pointCount: chosen.length,
    fit,
    refusedBecause: 'refusedBecause' in fitted ? fitted.refusedBecause : null,
    remarks: fit === null || series === null ? [] : remarksOf(chosen, points, series),
    incubation: series === null ? null : incubationOf(all, series),
  };
}

const isUsable = (crater: ReadCrater): crater is Usable => crater.excludedBecause === null && crater.pulseEnergyUj !== null;

function bySeries(craters: readonly Usable[]): Usable[][] {
  const groups = new Map<string, Usable[]>();
  for (const crater of craters) {
    const key = keyOf(crater.series);
    groups.set(key, [...(groups.get(key) ?? []), crater]);
  }
  return [...groups.values()];
}

/** Numbers that went through a panel's unit differ in their last digits. */
function keyOf({ pulses, pulseWidthNs, focusOffsetMm }: CraterSeries): string {
  return [pulses, pulseWidthNs, focusOffsetMm].map((value) => (value === null ? '' : value.toPrecision(SAME_DIGITS))).join(' ');
}

function largest(groups: readonly Usable[][]): readonly Usable[] {
  return groups.reduce<readonly Usable[]>((best, group) => (outranks(group, best) ? group : best), []);
}

function outranks(group: readonly Usable[], best: readonly Usable[]): boolean {
  if (group.length !== best.length) return group.length > best.length;
  const [one, other] = [group[0], best[0]];
  return one !== undefined && other !== undefined && one.series.pulses < other.series.pulses;
}

function fitOf(craters: readonly Usable[]): Fitted {
  if (craters.length < LEAST_POINTS)
    return {
      refusedBecause: `${craters.length} ${craters.length === 1 ? 'crater' : 'craters'} can be used; the line needs ${LEAST_POINTS}.`,
    };
  const energiesUj = craters.map(({ pulseEnergyUj }) => pulseEnergyUj);
  const different = new Set(energiesUj.map((energyUj) => energyUj.toPrecision(SAME_DIGITS))).size;
  if (different < LEAST_ENERGIES)
    return { refusedBecause: `The craters have ${different} different pulse energies; the line needs ${LEAST_ENERGIES}. Vary the power.` };
  try {
    const diametersUm = craters.map(({ diameterUm }) => diameterUm);
    return { fit: liuFit(energiesUj, diametersUm) };
  } catch (error) {
    // numbers and counts were looked at above, so it is the slope that it refuses
    if (!(error instanceof RangeError)) throw error;
    return {
      refusedBecause: 'The craters do not grow with the pulse energy, so they show no threshold. Look at the widths and powers again.',
    };
  }
}

function pointOf(
  { address, diameterUm, pulseEnergyUj, series, excludedBecause }: ReadCrater,
  fitted: CraterSeries | null,
  fit: LiuFit | null,
): CraterPoint {
  const reason = excludedBecause ?? otherSeries(series, fitted);
  const isFarAbove =
    reason === null && fit !== null && pulseEnergyUj !== null && pulseEnergyUj > MOST_TIMES_THRESHOLD * fit.thresholdEnergyUj;
  return { address, diameterUm, pulseEnergyUj, series, excludedBecause: reason, isFarAbove };
}

function otherSeries(series: CraterSeries | null, fitted: CraterSeries | null): string | null {
  if (series === null || fitted === null || keyOf(series) === keyOf(fitted)) return null;
  if (series.pulses !== fitted.pulses) return `${series.pulses} ${pulsesWord(series.pulses)} per place; the line is of ${fitted.pulses}`;
  if (series.pulseWidthNs !== fitted.pulseWidthNs)
    return `pulse width ${widthWords(series.pulseWidthNs)}; the line is of ${widthWords(fitted.pulseWidthNs)}`;
  return `focus offset ${series.focusOffsetMm} mm; the line is of ${fitted.focusOffsetMm} mm`;
}

function remarksOf(craters: readonly Usable[], points: readonly CraterPoint[], { pulses, focusOffsetMm }: CraterSeries): string[] {
  const far = points.filter(({ isFarAbove }) => isFarAbove).map(({ address }) => address);
  const isUncalibrated = craters.some(({ parameters }) => parameters.power.watts !== null && parameters.power.basis !== 'calibration');
  return [
    ...(far.length === 0
      ? []
      : [`More than ${MOST_TIMES_THRESHOLD} thresholds: ${far.join(', ')}. Heat and plasma may widen these craters beyond the line.`]),
    ...(pulses === 1 ? [] : [`${pulses} passes count as ${pulses} pulses on one place only if every pass hits the same places.`]),
    ...(isUncalibrated
      ? ['Some watts rest on no power calibration: the threshold is wrong by the same share as they are, the spot is not.']
      : []),
    ...(focusOffsetMm === 0 ? [] : [`Marked ${focusOffsetMm} mm out of focus: this is the spot there, not the spot in focus.`]),
  ];
}

function incubationOf(groups: readonly Usable[][], { pulseWidthNs, focusOffsetMm }: CraterSeries): CraterIncubation | null {
  const thresholds = groups
    .filter(([first]) => first !== undefined && keyOf({ ...first.series, pulses: 1 }) === keyOf({ pulses: 1, pulseWidthNs, focusOffsetMm }))
    .flatMap((group): SeriesThreshold[] => {
      const fitted = fitOf(group);
      if (!('fit' in fitted)) return [];
      const { thresholdPeakFluenceJPerCm2, thresholdPeakFluenceStandardErrorJPerCm2: standardErrorJPerCm2 } = fitted.fit;
      return [{ pulses: group[0].series.pulses, points: group.length, thresholdPeakFluenceJPerCm2, standardErrorJPerCm2 }];
    })
    .sort((one, other) => one.pulses - other.pulses);
  if (thresholds.length < LEAST_PULSE_COUNTS) return null;
  const fit = incubationFit(
    thresholds.map(({ pulses }) => pulses),
    thresholds.map(({ thresholdPeakFluenceJPerCm2 }) => thresholdPeakFluenceJPerCm2),
  );
  return { ...fit, thresholds };
}

const pulsesWord = (count: number): string => (count === 1 ? 'pulse' : 'pulses');
const widthWords = (widthNs: number | null): string => (widthNs === null ? 'the source’s own' : `${widthNs} ns`);
