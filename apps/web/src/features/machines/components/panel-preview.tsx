import { PANEL_UNITS } from '@proofplate/physics';
import { PARAMETERS, type Panel, type PanelField, roundToPanel, showNumber, showValue } from '@proofplate/recipe-model';
import { SettingCard, type SettingRow } from '../../../components/setting-card';
import { decimalSignOf } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';

/** Invented numbers that people recognise, in the parameter's own unit; the panel's limits have the last word. */
const EXAMPLES: Readonly<Record<PanelField['parameter'], number>> = {
  powerPercent: 40,
  speedMmPerS: 800,
  frequencyKhz: 40,
  pulseWidthNs: 100,
  lineSpacingUm: 40,
  passes: 2,
  focusOffsetMm: 0,
  hatchAngleDeg: 45,
  angleStepDeg: 15,
  wobbleDiameterUm: 50,
  wobbleFrequencyKhz: 1,
};

/** The panel as a setting card would show it, with invented numbers. */
export function PanelPreview({ panel }: { panel: Panel }) {
  const { locale } = useSession().shop;
  const rows = panel.fields.map((field, index) => exampleRow(field, index, decimalSignOf(locale)));
  return (
    <SettingCard code="Example" revision={1} state="draft" caption="In the order of this panel. The numbers are invented." rows={rows} />
  );
}

function exampleRow(field: PanelField, index: number, decimalSign: '.' | ','): SettingRow {
  const { symbol } = PANEL_UNITS[field.unit];
  return {
    key: `${index} ${field.parameter}`,
    label: field.label === '' ? PARAMETERS[field.parameter].label : field.label,
    value: showNumber(exampleValue(field), decimalSign),
    unit: symbol,
  };
}

/** A number that the field can show: the invented one in the panel's unit, moved inside the limits. */
function exampleValue(field: PanelField): number {
  const { minimum, maximum, choices, parameter } = field;
  const physical = EXAMPLES[parameter];
  const example = { entered: { value: physical, unit: PARAMETERS[parameter].unit }, physical };
  const [firstChoice] = choices ?? [];
  const wanted = showValue(field, example, { speedMmPerS: EXAMPLES.speedMmPerS })?.value ?? firstChoice ?? minimum ?? 1;
  const inside = Math.min(Math.max(wanted, minimum ?? wanted), maximum ?? wanted);
  return roundToPanel(field, inside) ?? inside;
}
