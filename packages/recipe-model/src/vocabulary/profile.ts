import type { SourceKind } from './lists';

/** Largest pulse energy at a pulse width; null: the source has one fixed width. */
export type PulseEnergyLimit = { pulseWidthNs: number | null; energyMj: number };

/** The physical half of a machine's profile: it counts for evidence, the panel does not. */
export type PhysicalProfile = {
  sourceKind: SourceKind;
  wavelengthNm: number;
  ratedPowerW: number;
  maxPulseEnergyMj?: PulseEnergyLimit[];
  m2?: number;
  /** 1/e² diameter at the lens. */
  beamDiameterMm?: number;
  frequencyRangeKhz?: { from: number; to: number };
  pulseWidthRangeNs?: { from: number; to: number };
  pulseWidthsNs?: number[];
  topSpeedMmPerS?: number;
  jumpSpeedMmPerS?: number;
  accelerationMmPerS2?: number;
  apertureMm?: number;
  jumpSettleMs?: number;
  laserOnDelayUs?: number;
  laserOffDelayUs?: number;
};
