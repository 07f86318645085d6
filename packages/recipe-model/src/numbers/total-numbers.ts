import type { Fill } from '@proofplate/physics';
import type { SettingNumber } from './setting-number';

type NumberedStep = { readonly fill: Fill; readonly numbers: readonly SettingNumber[] };
type Described = { readonly key: string; readonly unit: string; readonly formula: string; readonly source: string };

const SOURCE = 'energy balance; docs/science/scanning.md';
const DOSE: Described = {
  key: 'totalArealDose',
  unit: 'J/mm²',
  formula: 'sum of the areal doses of all filled steps; outlines fill no area',
  source: SOURCE,
};
const TIME: Described = {
  key: 'totalTimePer100Mm2',
  unit: 's',
  formula: 'sum over all filled steps, beam-on time without jumps, delays and pauses',
  source: 'definition; docs/science/scanning.md',
};

/**
 * Totals over the mark steps of a setting.            D = D1 + ... + Dn; t = t1 + ... + tn
 *
 * @param steps        fill and numbers of each step
 * @param doseRemarks  what to look at in a total dose, J/mm²
 * @returns total dose and total time for 100 mm²; none for a single step. One step whose number is not known leaves the total unknown
 * Valid where all steps fill the same area.
 * Source: energy balance; docs/science/scanning.md
 */
export function totalNumbers(steps: readonly NumberedStep[], doseRemarks: (doseJPerMm2: number) => readonly string[]): SettingNumber[] {
  if (steps.length < 2) return [];
  const dose = total(steps, 'arealDose', { described: DOSE, inputName: (step) => `step${step}DoseJPerMm2` });
  return [
    dose.missingBecause === undefined ? { ...dose, lookAt: doseRemarks(dose.value) } : dose,
    total(steps, 'timePer100Mm2', { described: TIME, inputName: (step) => `step${step}TimeS` }),
  ];
}

type TotalOf = { readonly described: Described; readonly inputName: (step: number) => string };

function total(steps: readonly NumberedStep[], key: string, { described, inputName }: TotalOf): SettingNumber {
  const inputs: Record<string, number> = {};
  for (const [index, { fill, numbers }] of steps.entries()) {
    const part = numbers.find((number) => number.key === key);
    if (fill === 'outline' || part === undefined) continue;
    if (part.missingBecause !== undefined)
      return {
        ...described,
        missingBecause: `step ${index + 1}: ${part.missingBecause}`,
        isRuledOutByMode: part.isRuledOutByMode,
        lookAt: [],
      };
    inputs[inputName(index + 1)] = part.value;
  }
  const parts = Object.values(inputs);
  if (parts.length === 0)
    return { ...described, missingBecause: 'outline only: no step fills an area', isRuledOutByMode: true, lookAt: [] };
  return { ...described, value: parts.reduce((sum, part) => sum + part, 0), inputs, lookAt: [] };
}
