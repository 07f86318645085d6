import {
  averageFluence,
  averageFluenceAtIncidence,
  averageIrradiance,
  dutyCycle,
  gaussianPeakPower,
  peakFluence,
  peakIrradiance,
  pulseEnergy,
  rectangularPeakPower,
  smallestDiameterForIrradiance,
  sourceLimitFrequency,
  sourceLimitPower,
} from '@proofplate/physics';
import type { FormulaEntry } from '../formula-entry';

const W_PER_MW = 1e-3;
const W_PER_KW = 1e3;
const MJ_PER_J = 1e3;

export const PULSES: readonly FormulaEntry[] = [
  {
    formula:
      'E=P/f; Ppeak_rect=E/tau; Ppeak_gauss=2*sqrt(ln2/pi)*E/tau_FWHM=0.939437*E/tau; Favg=4E/(pi*d^2); Fpeak=2*Favg=8E/(pi*d^2); I_peak=2*Ppeak_gauss/(pi*(d/2)^2)',
    evaluate: (inputs) => {
      const d_um = inputs.number('d_um');
      const tau_ns = inputs.number('tau_ns');
      const pulse_energy_mJ = pulseEnergy(inputs.number('P_W'), inputs.number('f_kHz'));
      const peak_power_gauss_kW = gaussianPeakPower(pulse_energy_mJ, tau_ns);
      return {
        pulse_energy_mJ,
        peak_power_rect_kW: rectangularPeakPower(pulse_energy_mJ, tau_ns),
        peak_power_gauss_kW,
        duty: dutyCycle(tau_ns, inputs.number('f_kHz')),
        fluence_avg_J_cm2: averageFluence(pulse_energy_mJ, d_um),
        fluence_peak_J_cm2: peakFluence(pulse_energy_mJ, d_um),
        irradiance_peak_GW_cm2: peakIrradiance(peak_power_gauss_kW, d_um),
      };
    },
  },
  {
    formula: 'I=P/(pi*d^2/4)',
    evaluate: (inputs) => ({ I_W_mm2: averageIrradiance(inputs.number('P_W'), inputs.number('d_um')) }),
  },
  {
    formula: 'H=(P/f)*cos(theta)/(pi*d^2/4)',
    evaluate: (inputs) => {
      const energyMj = pulseEnergy(inputs.number('P_mW') * W_PER_MW, inputs.number('f_kHz'));
      return { H_mJ_cm2: averageFluenceAtIncidence(energyMj, inputs.number('d_um'), inputs.number('theta_deg')) * MJ_PER_J };
    },
  },
  {
    formula: 'w=sqrt(2*Ppk/(pi*I_lim)), Ppk=0.939437*E/tau',
    evaluate: (inputs) => {
      const peakKw = gaussianPeakPower(inputs.number('E_J') * MJ_PER_J, inputs.number('tau_FWHM_ns'));
      return { P_peak_W: peakKw * W_PER_KW, diameter_mm: smallestDiameterForIrradiance(peakKw, inputs.number('I_limit_W_cm2')) };
    },
  },
  {
    formula: 'f0=P_rated/E_max; below f0: E=E_max, P=E_max*f; above f0: P=P_rated, E=P_rated/f',
    evaluate: (inputs) => {
      const ratedW = inputs.number('P_rated_W');
      const maxEnergyMj = inputs.number('E_max_mJ');
      const frequencies = inputs.numbers('f_kHz');
      const P_W = frequencies.map((frequencyKhz) => sourceLimitPower(ratedW, maxEnergyMj, frequencyKhz));
      return {
        f0_kHz: sourceLimitFrequency(ratedW, maxEnergyMj),
        P_W,
        E_mJ: frequencies.map((frequencyKhz) => pulseEnergy(sourceLimitPower(ratedW, maxEnergyMj, frequencyKhz), frequencyKhz)),
      };
    },
  },
];
