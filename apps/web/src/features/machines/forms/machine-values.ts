import {
  emptyPanelFor,
  PARAMETERS,
  type Panel,
  type PanelField,
  type ParameterKey,
  type PhysicalProfile,
  type SourceKind,
} from '@proofplate/recipe-model';
import { typedNumber } from '../../../lib/read-number';
import type { Machine } from '../machines.api';
import { twoColumnText } from '../two-columns';

/** Numbers of the source, each one field of the form. */
export type SourceNumber =
  | 'wavelengthNm'
  | 'ratedPowerW'
  | 'm2'
  | 'beamDiameterMm'
  | 'topSpeedMmPerS'
  | 'jumpSpeedMmPerS'
  | 'accelerationMmPerS2'
  | 'apertureMm'
  | 'jumpSettleMs'
  | 'laserOnDelayUs'
  | 'laserOffDelayUs';
type Range = { from: string; to: string };

/** A row of the panel as it is typed. */
export type PanelRowValues = {
  parameter: ParameterKey;
  label: string;
  unit: string;
  minimum: string;
  maximum: string;
  step: string;
  choices: string;
  rangeLow: string;
  rangeHigh: string;
};

/** The machine form as it is typed: everything is text, so that nothing typed is ever lost. Names follow the request. */
export type MachineValues = {
  name: string;
  serialNumber: string;
  warmUpMinutes: string;
  mountedLensId: string;
  physical: Record<SourceNumber, string> & {
    sourceKind: SourceKind;
    frequencyRangeKhz: Range;
    pulseWidthRangeNs: Range;
    pulseWidthsNs: string;
    maxPulseEnergyMj: string;
  };
  panel: { fields: PanelRowValues[] };
};

const FIRST_SOURCE: SourceKind = 'fibre-q-switched';
const NEW_PROFILE = { sourceKind: FIRST_SOURCE } as const;

/** Sources whose pulse width can be set, so that the largest pulse energy depends on it. */
export const hasPulseWidths = (sourceKind: SourceKind) => sourceKind === 'fibre-mopa' || sourceKind === 'ultrafast';
/** Sources that run continuously have no pulse numbers of their own. */
export const isPulsed = (sourceKind: SourceKind) => sourceKind !== 'diode';

export function newMachineValues(locale: string): MachineValues {
  return {
    name: '',
    serialNumber: '',
    warmUpMinutes: '',
    mountedLensId: '',
    physical: typedPhysical(NEW_PROFILE, locale),
    panel: typedPanel(emptyPanelFor(FIRST_SOURCE), locale),
  };
}

export function machineValues({ name, serialNumber, warmUpMinutes, mountedLens, profile }: Machine, locale: string): MachineValues {
  return {
    name,
    serialNumber,
    warmUpMinutes: typedNumber(warmUpMinutes, locale),
    mountedLensId: mountedLens?.id ?? '',
    physical: typedPhysical(profile.physical, locale),
    panel: typedPanel(profile.panel, locale),
  };
}

export function typedPanel({ fields }: Panel, locale: string): MachineValues['panel'] {
  return { fields: fields.map((field) => typedRow(field, locale)) };
}

/** A row to begin with; its unit is one that the parameter has. */
export function newPanelRow(parameter: ParameterKey, locale: string): PanelRowValues {
  const [unit = PARAMETERS[parameter].unit] = PARAMETERS[parameter].panelUnits;
  return typedRow({ parameter, label: PARAMETERS[parameter].label, unit }, locale);
}

function typedRow({ parameter, label, unit, ...numbers }: PanelField, locale: string): PanelRowValues {
  return {
    parameter,
    label,
    unit,
    minimum: typedNumber(numbers.minimum, locale),
    maximum: typedNumber(numbers.maximum, locale),
    step: typedNumber(numbers.step, locale),
    choices: (numbers.choices ?? []).map((choice) => typedNumber(choice, locale)).join(' '),
    rangeLow: typedNumber(numbers.rangeLow, locale),
    rangeHigh: typedNumber(numbers.rangeHigh, locale),
  };
}

function typedPhysical(
  physical: Partial<PhysicalProfile> & Pick<PhysicalProfile, 'sourceKind'>,
  locale: string,
): MachineValues['physical'] {
  const number = (key: SourceNumber) => typedNumber(physical[key], locale);
  const range = (ends: { from: number; to: number } | undefined) => ({
    from: typedNumber(ends?.from, locale),
    to: typedNumber(ends?.to, locale),
  });
  return {
    sourceKind: physical.sourceKind,
    wavelengthNm: number('wavelengthNm'),
    ratedPowerW: number('ratedPowerW'),
    m2: number('m2'),
    beamDiameterMm: number('beamDiameterMm'),
    topSpeedMmPerS: number('topSpeedMmPerS'),
    jumpSpeedMmPerS: number('jumpSpeedMmPerS'),
    accelerationMmPerS2: number('accelerationMmPerS2'),
    apertureMm: number('apertureMm'),
    jumpSettleMs: number('jumpSettleMs'),
    laserOnDelayUs: number('laserOnDelayUs'),
    laserOffDelayUs: number('laserOffDelayUs'),
    frequencyRangeKhz: range(physical.frequencyRangeKhz),
    pulseWidthRangeNs: range(physical.pulseWidthRangeNs),
    pulseWidthsNs: (physical.pulseWidthsNs ?? []).map((width) => typedNumber(width, locale)).join(' '),
    maxPulseEnergyMj: typedEnergies(physical.maxPulseEnergyMj, locale),
  };
}

function typedEnergies(limits: PhysicalProfile['maxPulseEnergyMj'] = [], locale: string): string {
  const [first] = limits;
  if (first === undefined) return '';
  if (first.pulseWidthNs === null) return typedNumber(first.energyMj, locale);
  return twoColumnText(
    limits.flatMap(({ pulseWidthNs, energyMj }) => (pulseWidthNs === null ? [] : [[pulseWidthNs, energyMj] as const])),
    locale,
  );
}
