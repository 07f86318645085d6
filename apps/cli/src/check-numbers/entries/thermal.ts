import { diffusionLength, heatAccumulation, thermalDiffusivity } from '@proofplate/physics';
import type { FormulaEntry } from '../formula-entry';

const MJ_PER_J = 1e3;
const UM_PER_M = 1e6;
const MM2_PER_M2 = 1e6;
const HZ_PER_KHZ = 1e3;

export const THERMAL: readonly FormulaEntry[] = [
  {
    formula: 'D=k/(rho*cp); L=sqrt(D*t); L2=2*sqrt(D*t)',
    evaluate: (inputs) => {
      const D_mm2_s = thermalDiffusivity(inputs.number('k_W_mK'), inputs.number('rho_kg_m3'), inputs.number('cp_J_kgK'));
      const L_um = diffusionLength(D_mm2_s, inputs.number('t_s'));
      return { D_mm2_s, L_um, L2_um: 2 * L_um };
    },
  },
  {
    formula:
      'dT just before pulse N+1 = sum_{n=1..N} eta*E/(rho*cp) * exp(-(n*p)^2/s_n)/(pi*s_n*sqrt(pi*kappa*t_n)), t_n=n/f, s_n=w^2/2+4*kappa*t_n (w=1/e^2 radius, half space, no loss, residual share eta); point-source limit w->0, p=0: 2*eta*E/(rho*cp*(4*pi*kappa/f)^1.5)*sum n^-1.5',
    evaluate: (inputs) => {
      const rise = heatAccumulation({
        pulseEnergyMj: inputs.number('E_J') * MJ_PER_J,
        residualHeatShare: inputs.number('eta_residual'),
        spotDiameterUm: 2 * inputs.number('w_m') * UM_PER_M,
        pitchUm: inputs.number('pitch_m') * UM_PER_M,
        frequencyKhz: inputs.number('f_Hz') / HZ_PER_KHZ,
        pulses: inputs.number('N'),
        densityKgPerM3: inputs.number('rho_kg_m3'),
        heatCapacityJPerKgK: inputs.number('cp_J_kgK'),
        diffusivityMm2PerS: inputs.number('kappa_m2_s') * MM2_PER_M2,
      });
      return { dT_K: rise.temperatureRiseK, dT_point_source_stationary_K: rise.pointSourceRiseK };
    },
  },
];
