import { type MeasurementMethod, type MeasurementQuantity, QUANTITIES } from './measurements';

const COLOUR: readonly MeasurementMethod[] = ['photo', 'colorimeter', 'manual'];

/** Which method can give which quantity. A code grade comes from a verifier only: a photo never verifies. */
export const METHODS_OF_QUANTITY: Readonly<Record<MeasurementQuantity, readonly MeasurementMethod[]>> = {
  lightness: COLOUR,
  a: ['photo', 'colorimeter'],
  b: ['photo', 'colorimeter'],
  chroma: ['photo', 'colorimeter'],
  'hue-angle': ['photo', 'colorimeter'],
  contrast: [...COLOUR, 'verifier'],
  'delta-e-2000': ['photo', 'colorimeter'],
  evenness: [...COLOUR, 'microscope'],
  depth: ['profilometer', 'microscope', 'calliper', 'manual'],
  'roughness-ra': ['profilometer', 'microscope'],
  'roughness-rz': ['profilometer', 'microscope'],
  'line-width': ['microscope', 'profilometer', 'calliper', 'photo'],
  'crater-diameter': ['microscope', 'calliper'],
  'code-grade': ['verifier'],
  'tape-class': ['manual'],
  'wipe-test': ['manual'],
  'salt-spray-hours': ['manual'],
};

export type QuantityLimits = { readonly least: number; readonly most: number; readonly isWhole?: true };

/** What the quantity can be at all; depth is negative where the mark stands up, a crater is 0 where the pulse left none. */
export const LIMITS_OF_QUANTITY: Readonly<Record<MeasurementQuantity, QuantityLimits>> = {
  lightness: { least: 0, most: 100 },
  a: { least: -128, most: 128 },
  b: { least: -128, most: 128 },
  chroma: { least: 0, most: 182 },
  'hue-angle': { least: 0, most: 360 },
  contrast: { least: -1, most: 1 },
  'delta-e-2000': { least: 0, most: 200 },
  evenness: { least: 0, most: 100 },
  depth: { least: -5000, most: 20_000 },
  'roughness-ra': { least: 0, most: 1000 },
  'roughness-rz': { least: 0, most: 5000 },
  'line-width': { least: 0, most: 10_000 },
  'crater-diameter': { least: 0, most: 10_000 },
  'code-grade': { least: 0, most: 4 },
  'tape-class': { least: 0, most: 5, isWhole: true },
  'wipe-test': { least: 0, most: 1_000_000, isWhole: true },
  'salt-spray-hours': { least: 0, most: 50_000 },
};

/**
 * Why a number cannot be a value of the quantity.
 *
 * @param quantity what is measured or demanded
 * @param value    in the quantity's own unit
 * @returns the limits in words; undefined where the number is possible
 */
export function quantityProblem(quantity: MeasurementQuantity, value: number): string | undefined {
  const { label, unit } = QUANTITIES[quantity];
  const { least, most, isWhole = false } = LIMITS_OF_QUANTITY[quantity];
  if (value >= least && value <= most && (!isWhole || Number.isInteger(value))) return undefined;
  return `${label} must be ${isWhole ? 'a whole number ' : ''}from ${least} to ${most}${unit === '1' ? '' : ` ${unit}`}.`;
}
