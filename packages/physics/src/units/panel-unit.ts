/** What a unit measures: two units convert into each other only inside one kind, and only those that a parameter allows. */
export type UnitKind =
  | 'share of range'
  | 'speed'
  | 'frequency'
  | 'length'
  | 'line density'
  | 'pulse density'
  | 'power'
  | 'time'
  | 'count'
  | 'angle';

/** Units that a machine's own control can show; the code is what is stored, the symbol is what people read. */
export const PANEL_UNITS = {
  percentFromZero: { kind: 'share of range', symbol: '%', label: 'percent of range, from zero', spoken: 'percent' },
  percentFromMinimum: { kind: 'share of range', symbol: '%', label: 'percent of range, from the minimum', spoken: 'percent' },
  'mm/s': { kind: 'speed', symbol: 'mm/s', label: 'millimetres per second', spoken: 'millimetres per second' },
  'm/s': { kind: 'speed', symbol: 'm/s', label: 'metres per second', spoken: 'metres per second' },
  'in/s': { kind: 'speed', symbol: 'in/s', label: 'inches per second', spoken: 'inches per second' },
  'm/min': { kind: 'speed', symbol: 'm/min', label: 'metres per minute', spoken: 'metres per minute' },
  'mm/min': { kind: 'speed', symbol: 'mm/min', label: 'millimetres per minute', spoken: 'millimetres per minute' },
  kHz: { kind: 'frequency', symbol: 'kHz', label: 'kilohertz', spoken: 'kilohertz' },
  Hz: { kind: 'frequency', symbol: 'Hz', label: 'hertz', spoken: 'hertz' },
  um: { kind: 'length', symbol: 'µm', label: 'micrometres', spoken: 'micrometres' },
  mm: { kind: 'length', symbol: 'mm', label: 'millimetres', spoken: 'millimetres' },
  in: { kind: 'length', symbol: 'in', label: 'inches', spoken: 'inches' },
  lpi: { kind: 'line density', symbol: 'lines/in', label: 'lines per inch', spoken: 'lines per inch' },
  lpcm: { kind: 'line density', symbol: 'lines/cm', label: 'lines per centimetre', spoken: 'lines per centimetre' },
  ppi: { kind: 'pulse density', symbol: 'pulses/in', label: 'pulses per inch', spoken: 'pulses per inch' },
  W: { kind: 'power', symbol: 'W', label: 'watts', spoken: 'watts' },
  ns: { kind: 'time', symbol: 'ns', label: 'nanoseconds', spoken: 'nanoseconds' },
  us: { kind: 'time', symbol: 'µs', label: 'microseconds', spoken: 'microseconds' },
  count: { kind: 'count', symbol: '×', label: 'count', spoken: 'times' },
  deg: { kind: 'angle', symbol: '°', label: 'degrees', spoken: 'degrees' },
} as const satisfies Record<string, { kind: UnitKind; symbol: string; label: string; spoken: string }>;

export type PanelUnit = keyof typeof PANEL_UNITS;

/**
 * True for the code of a panel unit, for input that comes from outside.
 *
 * @param code  anything
 * @returns whether it is a key of PANEL_UNITS
 * Valid for any input; nothing is thrown.
 * Source: own table; docs/science/units.md
 */
export function isPanelUnit(code: unknown): code is PanelUnit {
  return typeof code === 'string' && Object.hasOwn(PANEL_UNITS, code);
}
