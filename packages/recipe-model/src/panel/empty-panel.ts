import type { SourceKind } from '../vocabulary/lists';
import type { Panel, PanelField } from './panel';

const POWER: PanelField = { parameter: 'powerPercent', label: 'Power', unit: 'percentFromZero', minimum: 0, maximum: 100, step: 0.1 };
const SPEED: PanelField = { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s', minimum: 1, maximum: 10_000, step: 1 };
const FREQUENCY: PanelField = { parameter: 'frequencyKhz', label: 'Frequency', unit: 'kHz', minimum: 1, maximum: 1000, step: 0.1 };
const PULSE_WIDTH: PanelField = { parameter: 'pulseWidthNs', label: 'Pulse width', unit: 'ns', minimum: 1, maximum: 500, step: 1 };
const SPACING: PanelField = { parameter: 'lineSpacingUm', label: 'Line spacing', unit: 'mm', minimum: 0.001, maximum: 5, step: 0.0005 };
const PASSES: PanelField = { parameter: 'passes', label: 'Passes', unit: 'count', minimum: 1, maximum: 999, step: 1 };
const FOCUS: PanelField = { parameter: 'focusOffsetMm', label: 'Focus offset', unit: 'mm', minimum: -50, maximum: 50, step: 0.05 };
const ANGLE: PanelField = { parameter: 'hatchAngleDeg', label: 'Fill angle', unit: 'deg', minimum: -180, maximum: 180, step: 1 };
const ANGLE_STEP: PanelField = { parameter: 'angleStepDeg', label: 'Angle step', unit: 'deg', minimum: -180, maximum: 180, step: 1 };

const WITH_FREQUENCY = [POWER, SPEED, FREQUENCY, SPACING, PASSES, FOCUS, ANGLE, ANGLE_STEP];

/** What people find first when they describe a new machine: usual fields of its kind of source, to be corrected to the machine in front of them. */
const PANEL_OF: Readonly<Record<SourceKind, readonly PanelField[]>> = {
  'fibre-q-switched': WITH_FREQUENCY,
  'fibre-mopa': [POWER, SPEED, FREQUENCY, PULSE_WIDTH, SPACING, PASSES, FOCUS, ANGLE, ANGLE_STEP],
  co2: WITH_FREQUENCY,
  uv: WITH_FREQUENCY,
  green: WITH_FREQUENCY,
  diode: [POWER, SPEED, SPACING, PASSES, FOCUS, ANGLE],
  ultrafast: WITH_FREQUENCY,
};

/** A panel to start from for a kind of source; each call gives fresh fields. */
export function emptyPanelFor(sourceKind: SourceKind): Panel {
  return { fields: PANEL_OF[sourceKind].map((field) => ({ ...field })) };
}
