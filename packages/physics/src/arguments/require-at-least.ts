/**
 * Refuses arguments that are not finite numbers of at least `minimum`.
 *
 * @param minimum  smallest value allowed
 * @param named    arguments by name, as `{ m2 }`
 * @throws RangeError naming the first bad argument and its value
 */
export function requireAtLeast(minimum: number, named: Readonly<Record<string, number>>): void {
  for (const [name, value] of Object.entries(named)) {
    if (!Number.isFinite(value) || value < minimum) {
      throw new RangeError(`${name} must be a finite number of at least ${minimum}, but is ${String(value)}`);
    }
  }
}
