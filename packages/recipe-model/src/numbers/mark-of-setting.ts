import type { MarkParameters, MarkSpot, Quantity } from '@proofplate/physics';
import { PARAMETERS, type ParameterKey } from '../vocabulary/parameters';
import type { ParameterSet } from '../vocabulary/setting';
import { markAreaOf, type TimedAreaMm } from './mark-area';
import type { Optics } from './optics';

/** A setting, and why some of its values are not known: not recorded on an old plate, typed wrongly, not typed yet. */
export type NumberedSetting = Pick<ParameterSet, 'values' | 'fill' | 'power' | 'delaysUs'> & {
  readonly unknownBecause?: Readonly<Partial<Record<ParameterKey | 'fill', string>>>;
};

/**
 * A setting on its machine and lens as the physics reads it. What is missing stays a reason in words, never a number.
 *
 * @param setting  values as set, fill, watts at the work; reasons for what nobody knows. No frequency and no reason for it: continuous beam
 * @param optics   source, lens and measured spot
 * @param areaMm   filled rectangle in mm with the overheads of the machine, where the marking time is asked for
 * @returns parameters for derivedNumbers()
 * Valid for one mark step; totals over steps are in settingNumbers().
 * Source: own definition; docs/science/scanning.md
 */
export function markOfSetting(setting: NumberedSetting, optics: Optics, areaMm?: TimedAreaMm): MarkParameters {
  const { values, fill, unknownBecause: reasons = {} } = setting;
  const { frequencyKhz, pulseWidthNs } = values;
  const fillReason = reasons.fill === undefined ? undefined : unknown(reasons.fill);
  return {
    powerW: powerOf(setting),
    speedMmPerS: positive(setting, 'speedMmPerS'),
    ...(frequencyKhz === undefined && reasons.frequencyKhz === undefined ? {} : { frequencyKhz: positive(setting, 'frequencyKhz') }),
    ...(pulseWidthNs === undefined && reasons.pulseWidthNs === undefined ? {} : { pulseWidthNs: positive(setting, 'pulseWidthNs') }),
    lineSpacingUm: fillReason ?? positive(setting, 'lineSpacingUm'),
    passes: fillReason ?? passesOf(setting),
    fill,
    ...wobbleOf(setting),
    spot: spotOf(optics),
    focusOffsetMm: reasons.focusOffsetMm === undefined ? (values.focusOffsetMm?.physical ?? 0) : unknown(reasons.focusOffsetMm),
    ...(areaMm === undefined ? {} : { area: markAreaOf(setting, optics.physical, areaMm) }),
  };
}

const unknown = (unknownBecause: string) => ({ unknownBecause });

/** Zero is the low end of a percent scale from the minimum: a value, but none that a formula can divide by. */
function positive({ values, unknownBecause = {} }: NumberedSetting, key: ParameterKey): Quantity {
  const [reason, value, name] = [unknownBecause[key], values[key], PARAMETERS[key].label.toLowerCase()];
  if (reason !== undefined) return unknown(reason);
  if (value === undefined) return unknown(`no ${name} is set`);
  return value.physical > 0 ? value.physical : unknown(`the ${name} is zero`);
}

function powerOf({ power, unknownBecause = {} }: NumberedSetting): Quantity {
  if (unknownBecause.powerPercent !== undefined) return unknown(unknownBecause.powerPercent);
  return power.watts === null ? unknown(power.reason) : power.watts;
}

/** A panel that shows no passes marks once. */
function passesOf({ values, unknownBecause = {} }: NumberedSetting): Quantity {
  if (unknownBecause.passes !== undefined) return unknown(unknownBecause.passes);
  const passes = values.passes?.physical ?? 1;
  return Number.isInteger(passes) && passes > 0 ? passes : unknown('the passes are no whole number');
}

function wobbleOf(setting: NumberedSetting): Pick<MarkParameters, 'wobble'> {
  const { values, unknownBecause = {} } = setting;
  if (values.wobbleDiameterUm === undefined && unknownBecause.wobbleDiameterUm === undefined) return {};
  return { wobble: { diameterUm: positive(setting, 'wobbleDiameterUm'), frequencyKhz: positive(setting, 'wobbleFrequencyKhz') } };
}

/** A measured spot counts before a computed one; out of focus it still needs wavelength and M². */
function spotOf({ physical, focalLengthMm, measuredSpotUm }: Optics): MarkSpot {
  const { wavelengthNm, m2, beamDiameterMm, apertureMm } = physical;
  const beam = { wavelengthNm, m2: m2 ?? unknown('the machine’s page gives no M² of the beam') };
  if (measuredSpotUm !== null) return { spotDiameterUm: measuredSpotUm, ...beam };
  return {
    ...beam,
    focalLengthMm,
    beamDiameterMm: beamDiameterMm ?? unknown('the machine’s page gives no beam diameter at the lens'),
    ...(typeof apertureMm === 'number' ? { apertureMm } : {}),
  };
}
