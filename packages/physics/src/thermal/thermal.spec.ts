import { expectReferences } from '../../test/expect-reference';
import { diffusionLength } from './diffusion-length';
import { heatAccumulation } from './heat-accumulation';
import { thermalDiffusivity } from './thermal-diffusivity';

type Numbers = Readonly<Record<string, number>>;

const MATERIALS = ['316 stainless steel', 'copper', 'aluminium', '304 stainless steel, between pulses at 20 kHz'];
const train = {
  pulseEnergyMj: 0.2,
  residualHeatShare: 0.38,
  spotDiameterUm: 40,
  pitchUm: 5,
  frequencyKhz: 20,
  pulses: 50,
  densityKgPerM3: 7900,
  heatCapacityJPerKgK: 500,
  diffusivityMm2PerS: 4,
};

describe('thermalDiffusivity and diffusionLength', () => {
  for (const material of MATERIALS) {
    expectReferences<Numbers>(`thermal diffusivity and diffusion length, ${material}`, ({ k_W_mK, rho_kg_m3, cp_J_kgK, t_s }) => {
      const D_mm2_s = thermalDiffusivity(k_W_mK, rho_kg_m3, cp_J_kgK);
      const L_um = diffusionLength(D_mm2_s, t_s);
      return { D_mm2_s, L_um, L2_um: 2 * L_um };
    });
  }

  it('refuse a density and a time of zero', () => {
    expect(() => thermalDiffusivity(15, 0, 500)).toThrow('densityKgPerM3 must be a finite number above 0, but is 0');
    expect(() => diffusionLength(4, 0)).toThrow('timeS must be a finite number above 0, but is 0');
  });
});

describe('heatAccumulation', () => {
  expectReferences<Numbers>('heat accumulation before the next pulse (stationary or moving spot)', (inputs) => {
    const rise = heatAccumulation({
      pulseEnergyMj: inputs.E_J * 1e3,
      residualHeatShare: inputs.eta_residual,
      spotDiameterUm: 2 * inputs.w_m * 1e6,
      pitchUm: inputs.pitch_m * 1e6,
      frequencyKhz: inputs.f_Hz / 1e3,
      pulses: inputs.N,
      densityKgPerM3: inputs.rho_kg_m3,
      heatCapacityJPerKgK: inputs.cp_J_kgK,
      diffusivityMm2PerS: inputs.kappa_m2_s * 1e6,
    });
    return { dT_K: rise.temperatureRiseK, dT_point_source_stationary_K: rise.pointSourceRiseK };
  });

  it('is less for a moving spot than for a resting one, and less than for a point', () => {
    const resting = heatAccumulation({ ...train, pitchUm: 0 });
    expect(heatAccumulation(train).temperatureRiseK).toBeLessThan(resting.temperatureRiseK);
    expect(resting.temperatureRiseK).toBeLessThan(resting.pointSourceRiseK);
  });

  it('refuses more heat than the pulse brings and half a pulse', () => {
    expect(() => heatAccumulation({ ...train, residualHeatShare: 1.1 })).toThrow('residualHeatShare must be at most 1, but is 1.1');
    expect(() => heatAccumulation({ ...train, pulses: 0.5 })).toThrow('pulses must be a whole number of at least 1, but is 0.5');
  });
});
