import { PANEL_UNITS } from '@proofplate/physics';
import { FILL_LABELS, type MarkStep, PARAMETER_KEYS, PARAMETERS, type Panel, type TransferStep } from '@proofplate/recipe-model';
import { settingRows } from '../../../components/setting-rows';
import { formatNumber, formatPercentChange } from '../../../lib/format';

export type TransferRow = {
  key: string;
  label: string;
  unit: string;
  source: string;
  target: string;
  /** Change as a fraction, for the bar; absent where it says nothing. */
  share?: number;
  change: string;
};
export type TransferGroup = { title: string; rows: TransferRow[] };

type Sides = { step: MarkStep; found: TransferStep; sourcePanel: Panel; targetPanel: Panel; decimalSign: '.' | ',' };

/** What is kept, what is dialled on both panels, and what follows. */
export function transferGroups(sides: Sides): TransferGroup[] {
  return [
    { title: sides.found.outcome === 'equivalent' ? 'Kept' : 'What a transfer would keep', rows: keptRows(sides) },
    { title: 'On the panels', rows: panelRows(sides) },
    { title: 'What follows', rows: followingRows(sides) },
  ].filter(({ rows }) => rows.length > 0);
}

function keptRows({ found: { proposal } }: Sides): TransferRow[] {
  return (proposal?.kept ?? []).map(({ key, label, unit, source, target, deviation }) => ({
    ...{ key, label, unit: unit === '1' ? '' : unit, source: shown(source), target: shown(target) },
    share: deviation,
    change: isNothing(deviation) ? 'kept' : percent(deviation),
  }));
}

function panelRows({ step, found: { proposal, source: numbers }, sourcePanel, targetPanel, decimalSign }: Sides): TransferRow[] {
  if (proposal === null) return [];
  const onSource = settingRows(step, sourcePanel, decimalSign);
  const onTarget = settingRows({ ...step, parameters: proposal.parameters }, targetPanel, decimalSign);
  const rowOf = (rows: typeof onSource, key: string) => rows.find((row) => row.key === key);
  const withUnit = (row: (typeof onSource)[number] | undefined) =>
    row === undefined ? '–' : [row.value, row.unit].filter((part) => part !== undefined && part !== '').join('\u00A0');
  const rows = PARAMETER_KEYS.flatMap((key) => {
    const [source, target] = [rowOf(onSource, key), rowOf(onTarget, key)];
    if (source === undefined && target === undefined) return [];
    const label = target?.label ?? source?.label ?? PARAMETERS[key].label;
    // a source with one pulse width shows none on its panel
    const isFixedWidth = key === 'pulseWidthNs' && source === undefined && numbers?.pulseWidthNs != null;
    const before = isFixedWidth ? `${shown(numbers.pulseWidthNs ?? 0)}\u00A0ns, fixed` : withUnit(source);
    return [{ key, label, unit: '', source: before, target: withUnit(target), change: '' }];
  });
  const fill = FILL_LABELS[step.parameters.fill];
  return [...rows, { key: 'fill', label: 'Fill', unit: '', source: fill, target: fill, change: '' }];
}

function followingRows({ found: { source, proposal } }: Sides): TransferRow[] {
  if (source === null || proposal === null) return [];
  const after = proposal.numbers;
  const energy = ({ powerW, frequencyKhz }: typeof after) => (frequencyKhz === null ? null : powerW / frequencyKhz);
  return [
    row('spot', 'Spot at the work', 'µm', source.spotUm, after.spotUm),
    row('power', 'Power at the work', 'W', source.powerW, after.powerW),
    row('energy', 'Pulse energy', 'mJ', energy(source), energy(after)),
    row('time', 'Marking time, beam on', '', 1, proposal.timeRatio),
  ].flat();
}

function row(key: string, label: string, unit: string, source: number | null, target: number | null): TransferRow[] {
  if (source === null || target === null) return [];
  const share = (target - source) / source;
  return [{ key, label, unit, source: shown(source), target: shown(target), share, change: isNothing(share) ? 'same' : percent(share) }];
}

/** Beyond what the panel's steps could do. */
const isNothing = (share: number) => Math.abs(share) < 5e-4;
const percent = (share: number) => formatPercentChange(share, { decimals: Math.abs(share) < 0.1 ? 1 : 0 });
const shown = (value: number) => formatNumber(Number(value.toPrecision(3)));

/** The smallest step of the target's frequency field in kHz; undefined where it has none or counts otherwise. */
export function frequencyStepKhz({ fields }: Panel): number | undefined {
  const field = fields.find(({ parameter }) => parameter === 'frequencyKhz');
  if (field?.step === undefined) return undefined;
  if (field.unit === PARAMETERS.frequencyKhz.unit) return field.step;
  return PANEL_UNITS[field.unit].symbol === 'Hz' ? field.step / 1000 : undefined;
}
