import { requirePositive } from '../arguments/require-positive';
import { requireWhole } from '../arguments/require-whole';
import { arealDose, type FilledExposure } from '../exposure/areal-dose';

const UM_PER_MM = 1000;

/**
 * Speed that keeps the areal dose with another power, spacing or number of scans.          v2 = n2 P2 / (dose h2)
 *
 * @param source  power W, > 0, speed mm/s, > 0, line spacing um, > 0, scans, whole, >= 1
 * @param target  power W, line spacing um, finite, > 0, and scans, whole, >= 1, of the other setting
 * @returns areal dose, J/mm^2, and the speed that gives it, mm/s
 * @throws RangeError naming the argument and its value, if out of range
 * Valid as an energy balance only: fluence and overlaps change, so the mark is not equivalent and needs a coupon.
 * Source: energy balance; docs/science/transfer.md
 */
export function doseTransfer(
  source: FilledExposure,
  target: Omit<FilledExposure, 'speedMmPerS'>,
): { readonly arealDoseJPerMm2: number; readonly speedMmPerS: number } {
  const { powerW, lineSpacingUm, scans } = target;
  requirePositive({ 'source.powerW': source.powerW, powerW, lineSpacingUm });
  requireWhole({ scans });
  const arealDoseJPerMm2 = arealDose(source);
  return { arealDoseJPerMm2, speedMmPerS: (scans * powerW * UM_PER_MM) / (arealDoseJPerMm2 * lineSpacingUm) };
}
