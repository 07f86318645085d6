import { PANEL_UNITS, type PanelUnit } from '@proofplate/physics';
import { PARAMETERS, type ParameterKey } from '@proofplate/recipe-model';
import type { NumberRule } from '../../../lib/read-number';
import type { SourceNumber } from './machine-values';

export type SourceNumberRule = NumberRule & { name: SourceNumber; label: string; help?: string; isNeeded?: boolean };

/** The same limits as the server's; it has the last word. */
export const SOURCE_NUMBERS: readonly SourceNumberRule[] = [
  { name: 'wavelengthNm', label: 'Wavelength', what: 'The wavelength', unit: 'nm', least: 100, most: 20_000, isNeeded: true },
  { name: 'ratedPowerW', label: 'Rated average power', what: 'The rated power', unit: 'W', least: 0.01, most: 20_000, isNeeded: true },
  { name: 'm2', label: 'Beam quality M²', what: 'M²', unit: '', least: 1, most: 100, help: '1 is a perfect beam; the data sheet says.' },
  {
    name: 'beamDiameterMm',
    label: 'Beam diameter at the lens',
    what: 'The beam diameter at the lens',
    unit: 'mm',
    least: 0.1,
    most: 200,
    help: 'Where the intensity is 1/e² of the middle. With it the spot can be worked out.',
  },
];

export const HEAD_NUMBERS: readonly SourceNumberRule[] = [
  { name: 'topSpeedMmPerS', label: 'Top marking speed', what: 'The top speed', unit: 'mm/s', least: 0.01, most: 100_000 },
  { name: 'jumpSpeedMmPerS', label: 'Jump speed', what: 'The jump speed', unit: 'mm/s', least: 0.01, most: 100_000 },
  { name: 'accelerationMmPerS2', label: 'Acceleration', what: 'The acceleration', unit: 'mm/s²', least: 0.01, most: 1e9 },
  { name: 'jumpSettleMs', label: 'Settling after a jump', what: 'The settling time', unit: 'ms', least: 0, most: 1000 },
  { name: 'laserOnDelayUs', label: 'Laser-on delay', what: 'The laser-on delay', unit: 'µs', least: -100_000, most: 100_000 },
  { name: 'laserOffDelayUs', label: 'Laser-off delay', what: 'The laser-off delay', unit: 'µs', least: -100_000, most: 100_000 },
  { name: 'apertureMm', label: 'Clear aperture', what: 'The aperture', unit: 'mm', least: 0.1, most: 200 },
];

export const FREQUENCY_RULE: NumberRule = { what: 'The frequency', unit: 'kHz', least: 0.001, most: 1e6 };
export const PULSE_WIDTH_RULE: NumberRule = { what: 'The pulse width', unit: 'ns', least: 1e-4, most: 1e9 };
export const PULSE_ENERGY_RULE: NumberRule = { what: 'The largest pulse energy', unit: 'mJ', least: 1e-6, most: 1e5 };
export const WARM_UP_RULE: NumberRule = { what: 'The warm-up', unit: 'min', least: 0, most: 480, isWhole: true };

const LARGEST = 1e9;

/** Limits and step of a panel row are in the row's own unit. */
export function panelNumberRule(what: string, unit: string): NumberRule {
  return { what, unit: panelSymbol(unit), least: -LARGEST, most: LARGEST };
}

/** The ends of a percentage are physical values; of a field in watts, the watts at 100 %. */
export function rangeNumberRule(what: string, parameter: ParameterKey, unit: string): NumberRule {
  return { what, unit: rangeSymbol(parameter, unit), least: -LARGEST, most: LARGEST };
}

export const rangeSymbol = (parameter: ParameterKey, unit: string) => (unit === 'W' ? 'W' : PARAMETERS[parameter].symbol);

export const panelSymbol = (unit: string) => (isKnown(unit) ? PANEL_UNITS[unit].symbol : '');

/** True for a unit that says nothing without the ends of its range. */
export function needsRange(parameter: ParameterKey, unit: string): boolean {
  if (unit === 'percentFromZero') return parameter !== 'powerPercent';
  return unit === 'percentFromMinimum' || unit === 'W';
}

const isKnown = (unit: string): unit is PanelUnit => Object.hasOwn(PANEL_UNITS, unit);
