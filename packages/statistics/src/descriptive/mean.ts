/**
 * Arithmetic mean.          sum(x) / n
 *
 * @param values  numbers of one unit, finite, at least one
 * @returns mean, unit of the values
 * @throws RangeError naming the first bad value, or that there is none
 * Source: NIST/SEMATECH e-Handbook of Statistical Methods, 1.3.5.1
 */
export function mean(values: readonly number[]): number {
  if (values.length === 0) throw new RangeError('values must hold at least one number, but is empty');
  let sum = 0;
  for (const [index, value] of values.entries()) {
    if (!Number.isFinite(value)) throw new RangeError(`values[${index}] must be a finite number, but is ${value}`);
    sum += value;
  }
  return sum / values.length;
}
