import { arealDose, scansPerPass } from '@proofplate/physics';
import type { ParameterSet } from '@proofplate/recipe-model';

export type Dose = { readonly value: number; readonly missingBecause: null } | { readonly value: null; readonly missingBecause: string };

/**
 * Areal dose of a cell, J/mm², or the reason why there is none.
 *
 * @param unknownFields fields of a plate burnt earlier that nobody knows any more
 */
export function cellDose(
  { values, fill, power }: Pick<ParameterSet, 'values' | 'fill' | 'power'>,
  unknownFields: readonly string[] = [],
): Dose {
  if (unknownFields.includes('fill')) return absent('It is not known how the cells were filled.');
  if (fill === 'outline') return absent('Outline only: no area is filled.');
  if (values.wobbleDiameterUm !== undefined) return absent('Wobble: the spot travels farther than the scan speed says.');
  if (power.watts === null) return absent(power.reason);
  const speedMmPerS = values.speedMmPerS?.physical;
  const lineSpacingUm = values.lineSpacingUm?.physical;
  if (speedMmPerS === undefined) return absent('The scan speed is not known.');
  if (lineSpacingUm === undefined) return absent('The line spacing is not known.');
  if (unknownFields.includes('passes')) return absent('The number of passes is not known.');
  // a panel that shows no passes marks once
  const passes = values.passes?.physical ?? 1;
  return {
    value: arealDose({ powerW: power.watts, speedMmPerS, lineSpacingUm, scans: passes * scansPerPass(fill) }),
    missingBecause: null,
  };
}

const absent = (missingBecause: string): Dose => ({ value: null, missingBecause });
