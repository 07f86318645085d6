/** Above this ratio of greatest to least value, steps of the map are equal ratios. */
const LOGARITHMIC_ABOVE = 10;
const TICK_MANTISSAS = [1, 2, 5];

export type ResponseScale = {
  isLogarithmic: boolean;
  min: number;
  max: number;
};

/** The scale that the values span; undefined without any value. */
export function responseScale(values: readonly number[]): ResponseScale | undefined {
  const finite = values.filter(Number.isFinite);
  if (finite.length === 0) return undefined;
  const min = Math.min(...finite);
  const max = Math.max(...finite);
  return { min, max, isLogarithmic: min > 0 && max / min > LOGARITHMIC_ABOVE };
}

/** Place of a value on its scale, 0 (least) to 1 (greatest); a scale of one value puts it in the middle. */
export function scalePosition({ min, max, isLogarithmic }: ResponseScale, value: number): number {
  if (max === min) return 0.5;
  return isLogarithmic ? Math.log(value / min) / Math.log(max / min) : (value - min) / (max - min);
}

/** Round values strictly inside the scale for a legend, from least to greatest. */
export function scaleTicks({ min, max, isLogarithmic }: ResponseScale): readonly number[] {
  if (max === min) return [];
  return isLogarithmic ? roundRatios(min, max) : roundSteps(min, max);
}

function roundRatios(min: number, max: number): number[] {
  const first = Math.floor(Math.log10(min));
  const decades = Array.from({ length: Math.ceil(Math.log10(max)) - first + 1 }, (_, index) => first + index);
  // Beyond two decades 2 and 5 would crowd the legend.
  const mantissas = max / min > 100 ? [1] : TICK_MANTISSAS;
  return decades.flatMap((decade) => mantissas.map((mantissa) => exact(mantissa, decade))).filter((tick) => tick > min && tick < max);
}

function roundSteps(min: number, max: number): number[] {
  const rough = (max - min) / 4;
  const decade = Math.floor(Math.log10(rough));
  const mantissa = TICK_MANTISSAS.find((candidate) => exact(candidate, decade) >= rough) ?? 10;
  const step = exact(mantissa, decade);
  const first = Math.ceil(min / step);
  const count = Math.floor(max / step) - first + 1;
  return Array.from({ length: Math.max(0, count) }, (_, index) => Number(((first + index) * step).toPrecision(12))).filter(
    (tick) => tick > min && tick < max,
  );
}

/** 2 and −1 give exactly 0.2, where 2 * 10 ** -1 may miss by a rounding. */
function exact(mantissa: number, decade: number): number {
  return Number(`${mantissa}e${decade}`);
}
