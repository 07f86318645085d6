import { codesOf, type Labels } from './labelled';

export type MeasurementQuantity =
  | 'lightness'
  | 'a'
  | 'b'
  | 'chroma'
  | 'hue-angle'
  | 'contrast'
  | 'delta-e-2000'
  | 'evenness'
  | 'depth'
  | 'roughness-ra'
  | 'roughness-rz'
  | 'line-width'
  | 'crater-diameter'
  | 'code-grade'
  | 'tape-class'
  | 'wipe-test'
  | 'salt-spray-hours';

export type QuantityMeaning = { label: string; symbol: string; unit: string; betterIs: 'higher' | 'lower' | 'neither' };

/** What can be measured on a cell. The unit is fixed by the quantity; '1' is a pure number. */
export const QUANTITIES: Readonly<Record<MeasurementQuantity, QuantityMeaning>> = {
  lightness: { label: 'Lightness', symbol: 'L*', unit: '1', betterIs: 'neither' },
  a: { label: 'Green to red', symbol: 'a*', unit: '1', betterIs: 'neither' },
  b: { label: 'Blue to yellow', symbol: 'b*', unit: '1', betterIs: 'neither' },
  chroma: { label: 'Chroma', symbol: 'C*', unit: '1', betterIs: 'neither' },
  'hue-angle': { label: 'Hue angle', symbol: 'h', unit: '°', betterIs: 'neither' },
  contrast: { label: 'Contrast to the bare ground', symbol: 'K', unit: '1', betterIs: 'higher' },
  'delta-e-2000': { label: 'Colour difference to the target (CIEDE2000)', symbol: 'ΔE₀₀', unit: '1', betterIs: 'lower' },
  evenness: { label: 'Evenness', symbol: 'U', unit: '%', betterIs: 'higher' },
  depth: { label: 'Depth', symbol: 'd', unit: 'µm', betterIs: 'neither' },
  'roughness-ra': { label: 'Roughness Ra', symbol: 'Ra', unit: 'µm', betterIs: 'neither' },
  'roughness-rz': { label: 'Roughness Rz', symbol: 'Rz', unit: 'µm', betterIs: 'neither' },
  'line-width': { label: 'Line width', symbol: 'w', unit: 'µm', betterIs: 'neither' },
  'crater-diameter': { label: 'Crater diameter', symbol: 'D', unit: 'µm', betterIs: 'neither' },
  'code-grade': { label: 'Code grade', symbol: 'grade', unit: '1', betterIs: 'higher' },
  'tape-class': { label: 'Tape test class', symbol: 'class', unit: '1', betterIs: 'lower' },
  'wipe-test': { label: 'Wipe test, double rubs passed', symbol: 'rubs', unit: '×', betterIs: 'higher' },
  'salt-spray-hours': { label: 'Salt spray passed', symbol: 't', unit: 'h', betterIs: 'higher' },
};

export type MeasurementMethod = 'photo' | 'colorimeter' | 'profilometer' | 'microscope' | 'verifier' | 'calliper' | 'manual';

export const METHOD_LABELS: Labels<MeasurementMethod> = {
  photo: 'Photo (an estimate under that photo’s light)',
  colorimeter: 'Colorimeter',
  profilometer: 'Profilometer',
  microscope: 'Microscope',
  verifier: 'Code verifier',
  calliper: 'Calliper',
  manual: 'By hand',
};

export const MEASUREMENT_METHODS = codesOf(METHOD_LABELS);
export const MEASUREMENT_QUANTITIES: readonly MeasurementQuantity[] = [
  'lightness',
  'a',
  'b',
  'chroma',
  'hue-angle',
  'contrast',
  'delta-e-2000',
  'evenness',
  'depth',
  'roughness-ra',
  'roughness-rz',
  'line-width',
  'crater-diameter',
  'code-grade',
  'tape-class',
  'wipe-test',
  'salt-spray-hours',
];
