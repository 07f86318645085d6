import { arealDose, pulsePitch, scansPerPass } from '@proofplate/physics';
import type { ParameterSet, PhysicalProfile } from '@proofplate/recipe-model';
import type { Exposure } from '../photos/mark-model';

/** 1 W / (1 kHz x 1 ns) is 1000 kW. */
const KW_PER_W_KHZ_NS = 1000;

/** What a setting does to the plate, as the invented process model takes it. */
export function exposureOf({ values, fill, power }: ParameterSet, physical: PhysicalProfile): Exposure {
  const speedMmPerS = values.speedMmPerS?.physical;
  const lineSpacingUm = values.lineSpacingUm?.physical;
  if (power.watts === null || speedMmPerS === undefined || lineSpacingUm === undefined) throw new RangeError('the setting has no dose');
  const scans = (values.passes?.physical ?? 1) * scansPerPass(fill);
  const doseJPerMm2 = arealDose({ powerW: power.watts, speedMmPerS, lineSpacingUm, scans });
  const frequencyKhz = values.frequencyKhz?.physical;
  const pulseWidthNs = values.pulseWidthNs?.physical ?? physical.pulseWidthsNs?.[0];
  if (frequencyKhz === undefined || pulseWidthNs === undefined) return { doseJPerMm2 };
  const peakPowerKw = (KW_PER_W_KHZ_NS * power.watts) / (frequencyKhz * pulseWidthNs);
  return { doseJPerMm2, peakPowerKw, pulsePitchUm: pulsePitch(speedMmPerS, frequencyKhz) };
}
