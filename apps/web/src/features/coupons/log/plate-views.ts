import { type MeasurementQuantity, QUANTITIES, RATING_CAPTIONS } from '@proofplate/recipe-model';
import type { PlateCells, PlateFill } from '../../../components/plate/plate-types';
import { type ResponseScale, responseScale } from '../../../components/plate/response-scale';
import { formatNumber } from '../../../lib/format';
import type { CouponCell } from '../coupons.api';
import type { Inspection } from './log.api';

export type PlateView = 'photo' | 'rating' | 'lightness' | 'contrast' | 'evenness';

export const PLATE_VIEWS: readonly { value: PlateView; label: string }[] = [
  { value: 'photo', label: 'Photo' },
  { value: 'rating', label: 'Rating' },
  { value: 'lightness', label: 'L*' },
  { value: 'contrast', label: 'Contrast' },
  { value: 'evenness', label: 'Evenness' },
];

type HeatView = { title: string; lowWord: string; highWord: string; decimals: number };
const HEAT: Readonly<Record<Exclude<PlateView, 'photo'>, HeatView>> = {
  rating: { title: 'Mean rating', lowWord: RATING_CAPTIONS[0], highWord: RATING_CAPTIONS[5], decimals: 1 },
  lightness: { title: 'L* of the mark', lowWord: 'dark', highWord: 'light', decimals: 0 },
  contrast: { title: QUANTITIES.contrast.label, lowWord: '', highWord: '', decimals: 2 },
  evenness: { title: `${QUANTITIES.evenness.label}, ${QUANTITIES.evenness.unit}`, lowWord: '', highWord: '', decimals: 1 },
};

/** A rating is read on its whole scale, whatever ratings there are. */
const RATING_SCALE: ResponseScale = { min: 0, max: 5, isLogarithmic: false };

export type DrawnView = {
  cells: PlateCells;
  scale: ResponseScale | undefined;
  legend: { title: string; lowText: string; highText: string; hasMissing: boolean } | undefined;
};

export type DrawnFrom = {
  cells: readonly CouponCell[];
  inspection: Inspection;
  /** Digit in the corner of a cell; undefined: nobody rated it. */
  ratingOf: (cellId: string) => number | undefined;
  describe: (cell: CouponCell) => string;
  hasPhoto: boolean;
};

/** What stands in each cell in a view, with the scale and the legend that belong to it. */
export function drawView(view: PlateView, from: DrawnFrom): DrawnView {
  const { cells, describe, ratingOf } = from;
  if (view === 'photo') {
    const fill: PlateFill = { kind: from.hasPhoto ? 'photo' : 'blank' };
    const drawn = cells.map((cell) => [
      cell.address,
      { fill: cell.markState === 'skipped' ? MISSING : fill, description: describe(cell), rating: ratingOf(cell.id) },
    ]);
    return { cells: Object.fromEntries(drawn), scale: undefined, legend: undefined };
  }
  const heat = HEAT[view];
  const values = valuesOf(view, from);
  const scale = view === 'rating' ? RATING_SCALE : responseScale([...values.values()]);
  const drawn = cells.map((cell) => {
    const value = values.get(cell.id);
    const text = value === undefined ? '' : numberText(value, heat.decimals);
    const fill: PlateFill = value === undefined ? MISSING : { kind: 'response', value, text };
    const rating = ratingOf(cell.id);
    const spoken = [describe(cell), value === undefined ? '' : `${heat.title} ${text}`, rating === undefined ? '' : `rated ${rating}`];
    // the digit belongs to the photo: on a hatched cell it would look like the number that is missing
    return [cell.address, { fill, description: spoken.filter((part) => part !== '').join(', ') }];
  });
  return {
    cells: Object.fromEntries(drawn),
    scale,
    legend: scale === undefined ? undefined : legendOf(heat, scale, values.size < cells.length),
  };
}

/** Value of each cell in a view, by cell. */
export function valuesOf(view: Exclude<PlateView, 'photo'>, { cells, inspection, ratingOf }: DrawnFrom): ReadonlyMap<string, number> {
  if (view !== 'rating') return countingValues(inspection, view);
  const means = new Map(inspection.verdicts.map(({ cellId, meanRating }) => [cellId, meanRating]));
  // a rating that is not stored yet shows at once where nobody else rated
  return new Map(
    cells.flatMap(({ id }): [string, number][] => {
      const value = means.get(id) ?? ratingOf(id);
      return value === undefined ? [] : [[id, value]];
    }),
  );
}

/** The measured value that counts, by cell. */
export function countingValues({ measurements }: Inspection, quantity: MeasurementQuantity): ReadonlyMap<string, number> {
  return new Map(
    measurements.flatMap((row): [string, number][] =>
      row.counts && row.quantity === quantity && row.value !== null ? [[row.cellId, row.value]] : [],
    ),
  );
}

function legendOf({ title, lowWord, highWord, decimals }: HeatView, { min, max }: ResponseScale, hasMissing: boolean) {
  return {
    title,
    lowText: `${numberText(min, decimals)} ${lowWord}`.trim(),
    highText: `${numberText(max, decimals)} ${highWord}`.trim(),
    hasMissing,
  };
}

/** Whole numbers without decimals, so that the digits stay large. */
function numberText(value: number, decimals: number): string {
  return formatNumber(value, { decimals: Number.isInteger(value) ? 0 : decimals });
}

const MISSING: PlateFill = { kind: 'missing' };
