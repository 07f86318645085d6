import { timeZones } from './time-zones';

export const UNIT_SYSTEM_OPTIONS = [
  { value: 'metric', label: 'metric: mm, mm/s' },
  { value: 'inch', label: 'inch: in, in/s' },
];

/** The locale decides the decimal sign of typed and shown numbers, nothing else. */
export const NUMBER_STYLE_OPTIONS = [
  { value: 'en-GB', label: '1.5 with a point' },
  { value: 'de-DE', label: '1,5 with a comma' },
];

/** Choices for a field that may hold a value of its own, set elsewhere. */
export function withOwnValue(
  options: readonly { value: string; label: string }[],
  own: string,
): readonly { value: string; label: string }[] {
  return options.some(({ value }) => value === own) ? options : [...options, { value: own, label: own }];
}

export function zoneOptions(): readonly { value: string; label: string }[] {
  return timeZones().map((zone) => ({ value: zone, label: zone.replaceAll('_', ' ') }));
}
