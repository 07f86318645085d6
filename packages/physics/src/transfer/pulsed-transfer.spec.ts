import { expectReferences } from '../../test/expect-reference';
import { peakFluence } from '../exposure/peak-fluence';
import { pulseEnergy } from '../exposure/pulse-energy';
import { pulseOverlap } from '../exposure/pulse-overlap';
import { pulsedTransfer } from './pulsed-transfer';

type Numbers = Readonly<Record<string, number>>;

const source = { powerW: 20, frequencyKhz: 40, speedMmPerS: 400, spotDiameterUm: 40, lineSpacingUm: 20 };
const target = {
  spotDiameterUm: 60,
  maxPowerW: 60,
  maxPulseEnergyMj: 1.5,
  minFrequencyKhz: 20,
  maxFrequencyKhz: 400,
  maxSpeedMmPerS: 8000,
};

describe('pulsedTransfer', () => {
  expectReferences<{ readonly source: Numbers; readonly target: Numbers }>(
    'transfer of a pulsed recipe to another spot size within limits',
    (inputs) => {
      const from = inputs.source;
      const to = inputs.target;
      const found = pulsedTransfer(
        { powerW: from.P_W, frequencyKhz: from.f_kHz, speedMmPerS: from.v_mm_s, spotDiameterUm: from.d_um, lineSpacingUm: from.h_um },
        {
          spotDiameterUm: to.d_um,
          maxPowerW: to.P_max_W,
          maxPulseEnergyMj: to.E_max_mJ,
          minFrequencyKhz: to.f_min_kHz,
          maxFrequencyKhz: to.f_max_kHz,
          maxSpeedMmPerS: to.v_max_mm_s,
        },
      );
      return {
        ratio: found.spotRatio,
        pulse_energy_mJ: found.pulseEnergyMj,
        pitch_um: found.pitchUm,
        h_um: found.lineSpacingUm,
        peak_fluence_J_cm2: found.peakFluenceJPerCm2,
        areal_dose_J_mm2: found.arealDoseJPerMm2,
        f_low_kHz: found.lowestFrequencyKhz,
        f_high_kHz: found.highestFrequencyKhz,
        solvable: found.solvable,
        ...(found.solvable
          ? {
              reason: '',
              f_kHz: found.frequencyKhz,
              P_W: found.powerW,
              v_mm_s: found.speedMmPerS,
              area_rate_mm2_s: found.areaRateMm2PerS,
              time_ratio: found.timeRatio,
            }
          : { reason: found.reason }),
      };
    },
  );

  it('keeps peak fluence and pulse overlap', () => {
    const found = pulsedTransfer(source, target);
    if (!found.solvable) throw new Error(found.reason);
    expect(peakFluence(pulseEnergy(found.powerW, found.frequencyKhz), 60)).toBeCloseTo(peakFluence(pulseEnergy(20, 40), 40), 9);
    expect(pulseOverlap(found.speedMmPerS, found.frequencyKhz, 60)).toBeCloseTo(pulseOverlap(400, 40, 40), 12);
  });

  it('accepts a limit that is met exactly', () => {
    expect(pulsedTransfer(source, { ...target, maxPulseEnergyMj: 1.125 }).solvable).toBe(true);
    expect(pulsedTransfer(source, { ...target, maxPowerW: 22.5 })).toMatchObject({ solvable: true, frequencyKhz: 20 });
  });

  it('refuses a target without a spot', () => {
    expect(() => pulsedTransfer(source, { ...target, spotDiameterUm: 0 })).toThrow(
      'spotDiameterUm must be a finite number above 0, but is 0',
    );
  });
});
