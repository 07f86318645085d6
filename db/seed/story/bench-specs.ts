import type { Panel, PhysicalProfile } from '@proofplate/recipe-model';
import type { BenchKey, LensKey, Mounting } from './cast';

export type CalibrationSpec = {
  readonly at: string;
  readonly meter: string;
  readonly meterDueOn: string;
  readonly frequencyKhz: number | null;
  readonly pulseWidthNs: number | null;
  readonly points: readonly (readonly [percent: number, watts: number])[];
};
export type MountingSpec = Mounting & { readonly spot?: { readonly um: number; readonly method: string; readonly on: string } };
export type BenchSpec = {
  readonly name: string;
  readonly serialNumber: string;
  readonly warmUpMinutes: number;
  readonly physical: PhysicalProfile;
  readonly panel: Panel;
  readonly mounted: LensKey;
  readonly mountings: Readonly<Partial<Record<LensKey, MountingSpec>>>;
  readonly calibrations: readonly CalibrationSpec[];
};

const METER = { meter: 'Thermal head, no. 2 (invented)', meterDueOn: '2027-02-01' };
const SHARE = { unit: 'percentFromZero', minimum: 0, maximum: 100 } as const;

/** Machines as three different makers might describe them: no two panels name or measure alike. All numbers are invented. */
export const BENCH_SPECS: Readonly<Record<BenchKey, BenchSpec>> = {
  'bench 1': {
    name: 'Bench 1, fibre',
    serialNumber: 'invented-0114',
    warmUpMinutes: 10,
    physical: {
      ...{ sourceKind: 'fibre-q-switched', wavelengthNm: 1064, ratedPowerW: 20, m2: 1.6, beamDiameterMm: 7 },
      maxPulseEnergyMj: [{ pulseWidthNs: null, energyMj: 0.8 }],
      pulseWidthsNs: [120],
      frequencyRangeKhz: { from: 20, to: 80 },
      ...{
        topSpeedMmPerS: 5000,
        jumpSpeedMmPerS: 5000,
        accelerationMmPerS2: 2_500_000,
        jumpSettleMs: 0.5,
        laserOnDelayUs: 150,
        laserOffDelayUs: 180,
      },
    },
    panel: {
      fields: [
        { parameter: 'powerPercent', label: 'Power', ...SHARE, step: 1 },
        { parameter: 'speedMmPerS', label: 'Mark speed', unit: 'mm/s', minimum: 1, maximum: 5000, step: 1 },
        { parameter: 'frequencyKhz', label: 'Rate', unit: 'kHz', minimum: 20, maximum: 80, step: 1 },
        { parameter: 'lineSpacingUm', label: 'Line distance', unit: 'mm', minimum: 0.005, maximum: 1, step: 0.001 },
        { parameter: 'passes', label: 'Repeats', unit: 'count', minimum: 1, maximum: 200, step: 1 },
        { parameter: 'focusOffsetMm', label: 'Height', unit: 'mm', minimum: -10, maximum: 10, step: 0.1 },
        { parameter: 'hatchAngleDeg', label: 'Line angle', unit: 'deg', minimum: -180, maximum: 180, step: 1 },
      ],
    },
    mounted: 'F160',
    mountings: {
      F160: { workingDistanceMm: 176, focusMethod: 'by the 176 mm gauge' },
      F254: { workingDistanceMm: 294, focusMethod: 'by the two pointers' },
    },
    calibrations: [
      {
        at: '2026-02-02T09:10:00Z',
        ...METER,
        frequencyKhz: 40,
        pulseWidthNs: null,
        points: [
          [10, 1.6],
          [30, 5.7],
          [50, 9.7],
          [70, 13.6],
          [90, 17.3],
          [100, 19.1],
        ],
      },
      {
        at: '2026-08-17T09:05:00Z',
        ...METER,
        frequencyKhz: 40,
        pulseWidthNs: null,
        points: [
          [10, 1.5],
          [30, 5.5],
          [50, 9.4],
          [70, 13.2],
          [90, 16.8],
          [100, 18.5],
        ],
      },
    ],
  },
  'bench 2': {
    name: 'Bench 2, fibre MOPA',
    serialNumber: 'invented-0207',
    warmUpMinutes: 15,
    physical: {
      ...{ sourceKind: 'fibre-mopa', wavelengthNm: 1064, ratedPowerW: 30, m2: 1.4, beamDiameterMm: 7.5 },
      maxPulseEnergyMj: [
        { pulseWidthNs: 8, energyMj: 0.35 },
        { pulseWidthNs: 30, energyMj: 0.5 },
        { pulseWidthNs: 60, energyMj: 0.6 },
        { pulseWidthNs: 100, energyMj: 0.75 },
        { pulseWidthNs: 120, energyMj: 0.8 },
        { pulseWidthNs: 200, energyMj: 1 },
      ],
      pulseWidthsNs: [8, 30, 60, 100, 120, 200],
      frequencyRangeKhz: { from: 1, to: 1000 },
      ...{
        topSpeedMmPerS: 7000,
        jumpSpeedMmPerS: 7000,
        accelerationMmPerS2: 4_000_000,
        jumpSettleMs: 0.4,
        laserOnDelayUs: 120,
        laserOffDelayUs: 140,
      },
    },
    panel: {
      fields: [
        { parameter: 'powerPercent', label: 'Power', ...SHARE, step: 0.5 },
        { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s', minimum: 1, maximum: 7000, step: 1 },
        { parameter: 'frequencyKhz', label: 'Frequency', unit: 'kHz', minimum: 1, maximum: 1000, step: 1 },
        { parameter: 'pulseWidthNs', label: 'Pulse width', unit: 'ns', choices: [8, 30, 60, 100, 120, 200] },
        { parameter: 'lineSpacingUm', label: 'Line spacing', unit: 'mm', minimum: 0.001, maximum: 2, step: 0.001 },
        { parameter: 'passes', label: 'Passes', unit: 'count', minimum: 1, maximum: 999, step: 1 },
        { parameter: 'focusOffsetMm', label: 'Focus offset', unit: 'mm', minimum: -20, maximum: 20, step: 0.1 },
        { parameter: 'hatchAngleDeg', label: 'Fill angle', unit: 'deg', minimum: -180, maximum: 180, step: 1 },
      ],
    },
    mounted: 'F160',
    mountings: {
      F160: {
        workingDistanceMm: 177.5,
        focusMethod: 'by the 177.5 mm gauge',
        spot: { um: 36, method: 'Single pulses on anodised foil, microscope', on: '2026-01-13' },
      },
      F254: { workingDistanceMm: 296, focusMethod: 'by the two pointers' },
    },
    calibrations: [
      {
        at: '2026-02-03T09:00:00Z',
        ...METER,
        frequencyKhz: 60,
        pulseWidthNs: 8,
        points: [
          [10, 1.8],
          [20, 3.9],
          [30, 6.1],
          [50, 10.3],
          [70, 14.6],
          [100, 20.6],
        ],
      },
      {
        at: '2026-02-03T09:40:00Z',
        ...METER,
        frequencyKhz: 400,
        pulseWidthNs: 60,
        points: [
          [10, 1.7],
          [20, 3.8],
          [30, 5.8],
          [50, 9.9],
          [70, 14.1],
          [100, 20.2],
        ],
      },
      // taken at the pulse width of Bench 1, so that its settings can be carried over
      {
        at: '2026-08-18T08:20:00Z',
        ...METER,
        frequencyKhz: 40,
        pulseWidthNs: 120,
        points: [
          [10, 2.3],
          [20, 5.1],
          [30, 7.9],
          [50, 13.6],
          [70, 19.3],
          [100, 27.8],
        ],
      },
      {
        at: '2026-08-18T09:00:00Z',
        ...METER,
        frequencyKhz: 60,
        pulseWidthNs: 8,
        points: [
          [10, 1.7],
          [20, 3.8],
          [30, 5.9],
          [50, 10],
          [70, 14.2],
          [100, 20.1],
        ],
      },
      {
        at: '2026-08-18T09:40:00Z',
        ...METER,
        frequencyKhz: 400,
        pulseWidthNs: 60,
        points: [
          [10, 1.6],
          [20, 3.5],
          [30, 5.4],
          [50, 9.3],
          [70, 13.2],
          [100, 18.9],
        ],
      },
    ],
  },
  'bench 3': {
    name: 'Bench 3, CO₂',
    serialNumber: 'invented-0302',
    warmUpMinutes: 5,
    physical: {
      ...{ sourceKind: 'co2', wavelengthNm: 10_600, ratedPowerW: 30, m2: 1.2, beamDiameterMm: 12 },
      ...{ topSpeedMmPerS: 3000, jumpSpeedMmPerS: 4000, accelerationMmPerS2: 1_000_000, jumpSettleMs: 0.8 },
    },
    panel: {
      fields: [
        { parameter: 'speedMmPerS', label: 'Feed', unit: 'in/s', minimum: 0.1, maximum: 118, step: 0.1 },
        { parameter: 'powerPercent', label: 'Duty', ...SHARE, step: 1 },
        { parameter: 'lineSpacingUm', label: 'Resolution', unit: 'lpi', choices: [100, 125, 200, 250, 500] },
        { parameter: 'passes', label: 'Runs over', unit: 'count', minimum: 1, maximum: 20, step: 1 },
        { parameter: 'focusOffsetMm', label: 'Table', unit: 'in', minimum: -1, maximum: 1, step: 0.01 },
      ],
    },
    mounted: 'F200',
    mountings: { F200: { workingDistanceMm: 222, focusMethod: 'by the plunger on the head' } },
    calibrations: [
      {
        at: '2026-02-04T09:00:00Z',
        ...METER,
        frequencyKhz: null,
        pulseWidthNs: null,
        points: [
          [10, 2.4],
          [30, 8.6],
          [50, 14.9],
          [70, 21],
          [100, 29.4],
        ],
      },
    ],
  },
};

export const LENS_SPECS: Readonly<Record<LensKey, { focalLengthMm: number; fieldSizeMm: number; notes: string }>> = {
  F160: { focalLengthMm: 160, fieldSizeMm: 110, notes: 'f-theta, 1064 nm' },
  F254: { focalLengthMm: 254, fieldSizeMm: 175, notes: 'f-theta, 1064 nm' },
  F200: { focalLengthMm: 200, fieldSizeMm: 140, notes: 'f-theta, 10.6 µm' },
};

/** The lenses of a bench in a fixed order. */
export function mountingsOf({ mountings }: BenchSpec): (readonly [LensKey, MountingSpec])[] {
  const keys: readonly LensKey[] = ['F160', 'F200', 'F254'];
  return keys.flatMap((key) => {
    const mounting = mountings[key];
    return mounting === undefined ? [] : [[key, mounting] as const];
  });
}
