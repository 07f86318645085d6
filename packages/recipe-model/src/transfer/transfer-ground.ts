import type { Panel } from '../panel/panel';
import type { MeasuredCalibration } from '../power/work-power';
import type { PhysicalProfile } from '../vocabulary/profile';
import type { MarkStep, ParameterSet } from '../vocabulary/setting';

export type TransferCalibration = MeasuredCalibration & { readonly id: string; readonly measuredOn: string };

/** A machine with one of its lenses, as far as a transfer needs to know it. */
export type TransferPlace = {
  readonly machineName: string;
  readonly lensName: string;
  readonly profile: PhysicalProfile;
  readonly panel: Panel;
  readonly focalLengthMm: number;
  /** 1/e² diameter in focus; null: nobody measured it, so it is computed from the beam. */
  readonly measuredSpotUm: number | null;
  /** Power tables in the order in which they are to be taken, the newest first. */
  readonly calibrations: readonly TransferCalibration[];
};

export type TransferSide = 'source' | 'target';

export type TransferReasonCode =
  | 'wavelength'
  | 'pulse width'
  | 'beam mode'
  | 'wobble'
  | 'pulse energy above limit'
  | 'frequency interval empty'
  | 'power above limit'
  | 'speed above limit'
  | 'panel steps'
  | 'frequency outside interval'
  | 'not set'
  | 'spot unknown'
  | 'calibration missing'
  | 'limit unknown'
  | 'panel field missing'
  | 'several calibrations';

/** Why there is no equivalent setting, or no number at all. `side` says whose machine page brings what is missing. */
export type TransferReason = { readonly code: TransferReasonCode; readonly text: string; readonly side?: TransferSide };

/** A value, or every reason why there is none. */
export type Found<Value> =
  | { readonly value: Value; readonly reasons?: undefined }
  | { readonly value?: undefined; readonly reasons: readonly TransferReason[] };

/** How the beam is set; null: continuous, or the source has no such setting. */
export type PulsedOrNot = { readonly frequencyKhz: number | null; readonly pulseWidthNs: number | null };

/** What a person may choose for one step; what is absent is chosen by rule. */
export type TransferChoice = { readonly frequencyKhz?: number; readonly focusOffsetMm?: number };

/** equivalent: every kept number agrees; not equivalent: some cannot; not known: something is missing on either side. */
export type TransferOutcome = 'equivalent' | 'not equivalent' | 'not known';

/** A number that a transfer is judged by, before and after. */
export type KeptNumber = {
  readonly key: 'peakFluence' | 'pitchPerSpot' | 'spacingPerSpot' | 'arealDose' | 'averageIrradiance' | 'interactionTime';
  readonly label: string;
  readonly unit: string;
  readonly source: number;
  /** With the values as the panel shows them. */
  readonly target: number;
  /** (target − source) / source */
  readonly deviation: number;
};

export type FrequencyBand = {
  readonly fromKhz: number;
  readonly toKhz: number;
  readonly calibrationId: string;
  readonly measuredOn: string;
};

/** Frequencies at which the target keeps the numbers; `isEmpty`: there is none. */
export type FrequencyInterval = {
  readonly lowestKhz: number;
  readonly highestKhz: number;
  readonly isEmpty: boolean;
  /** What ends the interval at the top. */
  readonly endsBy: 'frequency range' | 'rated power' | 'scan speed';
  /** The target's own range, for drawing. */
  readonly rangeFromKhz: number;
  readonly rangeToKhz: number;
  readonly sourceKhz: number;
  /** Parts of the interval in which a power table says what percent gives the watts. */
  readonly calibrated: readonly FrequencyBand[];
};

/** One side of a step in numbers. */
export type TransferNumbers = {
  readonly spotUm: number;
  readonly powerW: number;
  readonly speedMmPerS: number;
  readonly frequencyKhz: number | null;
  readonly pulseWidthNs: number | null;
  readonly lineSpacingUm: number | null;
  readonly scans: number;
};

export type TransferProposal = {
  readonly parameters: ParameterSet;
  readonly numbers: TransferNumbers;
  readonly kept: readonly KeptNumber[];
  /** Beam-on time of the target over that of the source. */
  readonly timeRatio: number;
  readonly calibrationId: string;
  /** What the panel of the target has no field for. */
  readonly leftOut: readonly string[];
};

export type TransferStep = {
  readonly step: number;
  readonly outcome: TransferOutcome;
  readonly reasons: readonly TransferReason[];
  readonly source: TransferNumbers | null;
  readonly interval: FrequencyInterval | null;
  /** What keeps the numbers; where the outcome is not equivalent, what comes nearest: the dose alone. */
  readonly proposal: TransferProposal | null;
};

export type TransferResult = {
  readonly outcome: TransferOutcome;
  /** What holds for all steps. */
  readonly reasons: readonly TransferReason[];
  readonly steps: readonly TransferStep[];
  /** The power table that the draft would cite. */
  readonly calibrationId: string | null;
};

export type TransferInput = {
  readonly steps: readonly MarkStep[];
  readonly source: TransferPlace;
  readonly target: TransferPlace;
  /** By step, in their order. */
  readonly choices?: readonly TransferChoice[];
};
