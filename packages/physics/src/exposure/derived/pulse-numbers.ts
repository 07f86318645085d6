import { averageFluence } from '../average-fluence';
import { averageIrradiance } from '../average-irradiance';
import { dutyCycle } from '../duty-cycle';
import { gaussianPeakPower } from '../gaussian-peak-power';
import { peakFluence } from '../peak-fluence';
import { peakIrradiance } from '../peak-irradiance';
import { pulseEnergy } from '../pulse-energy';
import { rectangularPeakPower } from '../rectangular-peak-power';
import { type DerivedNumber, derive, quantityOf } from './derived-number';
import type { EffectiveParameters } from './effective-parameters';
import type { Quantity } from './mark-parameters';

const PAGE = 'docs/science/pulses.md';
const ISO = `ISO 11145; ${PAGE}`;
const PULSES_MERGE = 'pulse width times frequency is 1 or more: the pulses run into each other';

/** Numbers of one pulse, or the irradiance of a continuous beam. */
export function pulseNumbers(parameters: EffectiveParameters, spotDiameterUm: Quantity): readonly DerivedNumber[] {
  const { powerW, frequencyKhz, pulseWidthNs, continuousPowerW } = parameters;
  const energy = derive(
    { key: 'pulseEnergy', unit: 'mJ', formula: 'E = P / f', source: ISO },
    { powerW, frequencyKhz },
    { compute: (known) => pulseEnergy(known.powerW, known.frequencyKhz) },
  );
  const pulseEnergyMj = quantityOf(energy);
  const averageF = derive(
    { key: 'averageFluence', unit: 'J/cm²', formula: 'F = 4 E / (π d²)', source: ISO },
    { pulseEnergyMj, spotDiameterUm },
    { compute: (known) => averageFluence(known.pulseEnergyMj, known.spotDiameterUm) },
  );
  const peakF = derive(
    {
      key: 'peakFluence',
      unit: 'J/cm²',
      formula: 'F0 = 8 E / (π d²), Gaussian spot',
      source: `RP Photonics Encyclopedia, fluence; ${PAGE}`,
    },
    { pulseEnergyMj, spotDiameterUm },
    { compute: (known) => peakFluence(known.pulseEnergyMj, known.spotDiameterUm) },
  );
  const irradiance = derive(
    { key: 'averageIrradiance', unit: 'W/mm²', formula: 'I = 4 P / (π d²), continuous beam', source: ISO },
    { powerW: continuousPowerW, spotDiameterUm },
    { compute: (known) => averageIrradiance(known.powerW, known.spotDiameterUm) },
  );
  return [energy, ...powersInPulse({ pulseEnergyMj, pulseWidthNs, frequencyKhz, spotDiameterUm }), averageF, peakF, irradiance];
}

type InPulse = {
  readonly pulseEnergyMj: Quantity;
  readonly pulseWidthNs: Quantity;
  readonly frequencyKhz: Quantity;
  readonly spotDiameterUm: Quantity;
};

function powersInPulse({ pulseEnergyMj, pulseWidthNs, frequencyKhz, spotDiameterUm }: InPulse): readonly DerivedNumber[] {
  const inputs = { pulseEnergyMj, pulseWidthNs, frequencyKhz };
  const outOfRange = (known: { readonly pulseWidthNs: number; readonly frequencyKhz: number }) =>
    dutyCycle(known.pulseWidthNs, known.frequencyKhz) >= 1 ? PULSES_MERGE : undefined;
  const rectangular = derive({ key: 'rectangularPeakPower', unit: 'kW', formula: 'P = E / τ, rectangular pulse', source: ISO }, inputs, {
    compute: (known) => rectangularPeakPower(known.pulseEnergyMj, known.pulseWidthNs),
    outOfRange,
  });
  const gaussian = derive(
    {
      key: 'gaussianPeakPower',
      unit: 'kW',
      formula: 'P = 0.9394 E / τ, Gaussian pulse',
      source: `RP Photonics Encyclopedia, peak power; ${PAGE}`,
    },
    inputs,
    { compute: (known) => gaussianPeakPower(known.pulseEnergyMj, known.pulseWidthNs), outOfRange },
  );
  const irradiance = derive(
    {
      key: 'peakIrradiance',
      unit: 'GW/cm²',
      formula: 'I0 = 8 P / (π d²), Gaussian pulse and spot',
      source: `Siegman, Lasers (1986); ${PAGE}`,
    },
    { ...inputs, spotDiameterUm },
    { compute: (known) => peakIrradiance(gaussianPeakPower(known.pulseEnergyMj, known.pulseWidthNs), known.spotDiameterUm), outOfRange },
  );
  return [rectangular, gaussian, irradiance];
}
