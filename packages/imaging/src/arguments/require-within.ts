/**
 * Refuses arguments that are not finite numbers from `minimum` to `maximum`.
 *
 * @param minimum  smallest value allowed; -Infinity for no limit
 * @param maximum  largest value allowed; Infinity for no limit
 * @param named    arguments by name, as `{ groundReflectance }`
 * @throws RangeError naming the first bad argument and its value
 */
export function requireWithin(minimum: number, maximum: number, named: Readonly<Record<string, number>>): void {
  for (const [name, value] of Object.entries(named)) {
    if (!Number.isFinite(value) || value < minimum || value > maximum) {
      throw new RangeError(`${name} must be ${wanted(minimum, maximum)}, but is ${String(value)}`);
    }
  }
}

function wanted(minimum: number, maximum: number): string {
  if (Number.isFinite(minimum) && Number.isFinite(maximum)) return `a number from ${minimum} to ${maximum}`;
  if (Number.isFinite(minimum)) return `a finite number of at least ${minimum}`;
  if (Number.isFinite(maximum)) return `a finite number of at most ${maximum}`;
  return 'a finite number';
}
