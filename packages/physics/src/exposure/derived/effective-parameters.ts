import { scansPerPass } from '../fill';
import type { MarkParameters, Quantity, Unknown } from './mark-parameters';

/** The parameters as the mode lets them count: what the mode has no meaning for carries the reason. */
export type EffectiveParameters = {
  readonly powerW: Quantity;
  /** Power of a continuous beam only: with pulses the irradiance within the pulse is what counts. */
  readonly continuousPowerW: Quantity;
  readonly frequencyKhz: Quantity;
  readonly pulseWidthNs: Quantity;
  /** Speed at which the scan head draws the line. */
  readonly scanSpeedMmPerS: Quantity;
  /** Speed of the spot over the work, which is the scan speed only for a straight line. */
  readonly spotSpeedMmPerS: Quantity;
  /** Line spacing of a filled area. */
  readonly fillSpacingUm: Quantity;
  /** Line spacing of a fill by straight lines: the one that overlap, ripple and dose are defined for. */
  readonly straightSpacingUm: Quantity;
  /** Scans over the area in all: a crossed pass counts two. */
  readonly scans: Quantity;
};

const CONTINUOUS: Quantity = { unknownBecause: 'continuous beam: there are no pulses', isRuledOutByMode: true };
const PULSED: Quantity = { unknownBecause: 'pulsed beam: the peak irradiance of the pulse counts', isRuledOutByMode: true };
export const OUTLINE: Unknown = { unknownBecause: 'outline only: no area is filled', isRuledOutByMode: true };
const WOBBLE: Quantity = { unknownBecause: 'wobble: the spot travels farther than the scan speed says', isRuledOutByMode: true };
const NO_PULSE_WIDTH: Quantity = { unknownBecause: 'the pulse width is not given' };

export function effectiveParameters(mark: MarkParameters): EffectiveParameters {
  const isContinuous = mark.frequencyKhz === undefined;
  const hasWobble = mark.wobble !== undefined;
  const fillSpacingUm = mark.fill === 'outline' ? OUTLINE : mark.lineSpacingUm;
  return {
    powerW: mark.powerW,
    continuousPowerW: isContinuous ? mark.powerW : PULSED,
    frequencyKhz: mark.frequencyKhz ?? CONTINUOUS,
    pulseWidthNs: isContinuous ? CONTINUOUS : (mark.pulseWidthNs ?? NO_PULSE_WIDTH),
    scanSpeedMmPerS: mark.speedMmPerS,
    spotSpeedMmPerS: hasWobble ? WOBBLE : mark.speedMmPerS,
    fillSpacingUm,
    straightSpacingUm: hasWobble && mark.fill !== 'outline' ? WOBBLE : fillSpacingUm,
    scans: typeof mark.passes === 'number' ? mark.passes * scansPerPass(mark.fill) : mark.passes,
  };
}
