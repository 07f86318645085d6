import { isPanelUnit, PANEL_UNITS, type PanelUnit } from '@proofplate/physics';
import { PARAMETER_KEYS, PARAMETERS, type Panel, type ParameterKey } from '@proofplate/recipe-model';

export type Heading =
  | { readonly kind: 'address' }
  | { readonly kind: 'note' }
  | { readonly kind: 'value'; readonly parameter: ParameterKey; readonly unit: string | null }
  | { readonly kind: 'ignored'; readonly text: string };

const ADDRESS_WORDS = ['cell', 'address', 'square', 'field'];
const NOTE_WORDS = ['note', 'notes', 'remark', 'remarks'];
/** Trade words beside the panel's own labels. */
const TRADE_WORDS: Readonly<Record<ParameterKey, readonly string[]>> = {
  powerPercent: ['power', 'average power'],
  speedMmPerS: ['speed', 'scan speed'],
  frequencyKhz: ['frequency', 'pulse frequency', 'repetition rate'],
  pulseWidthNs: ['pulse width', 'pulse duration'],
  lineSpacingUm: ['line spacing', 'hatch', 'spacing'],
  passes: ['passes', 'repeats'],
  focusOffsetMm: ['focus offset', 'focus', 'defocus'],
  hatchAngleDeg: ['fill angle', 'hatch angle', 'angle'],
  angleStepDeg: ['angle step'],
  wobbleDiameterUm: ['wobble diameter', 'wobble'],
  wobbleFrequencyKhz: ['wobble frequency'],
};

/** What a column holds, by its heading: "Speed (mm/s)", "speed, mm/s", the panel's own label, or a cell's address. */
export function headingOf(text: string, panel: Panel): Heading {
  const [, words = text, bracketed, listed] = /^(.*?)(?:\s*[([]([^)\]]*)[)\]]|\s*,\s*(.*))?$/u.exec(text.trim()) ?? [];
  const name = plain(words);
  if (ADDRESS_WORDS.includes(name)) return { kind: 'address' };
  if (NOTE_WORDS.includes(name)) return { kind: 'note' };
  const own = panel.fields.find(({ label }) => plain(label) === name)?.parameter;
  const parameter =
    own ?? PARAMETER_KEYS.find((key) => key === words || plain(PARAMETERS[key].label) === name || TRADE_WORDS[key].includes(name));
  if (parameter === undefined) return { kind: 'ignored', text: text.trim() };
  return { kind: 'value', parameter, unit: unitOf(bracketed ?? listed) };
}

function unitOf(text: string | undefined): string | null {
  if (text === undefined || text.trim() === '') return null;
  const unit = text.trim();
  const bySymbol = Object.keys(PANEL_UNITS).find((code) => isPanelUnit(code) && symbolOf(code) === unit);
  return bySymbol === undefined || bySymbol.startsWith('percent') ? unit : bySymbol;
}

const symbolOf = (unit: PanelUnit) => PANEL_UNITS[unit].symbol;
const plain = (text: string) => text.trim().toLowerCase().replaceAll(/\s+/gu, ' ');
