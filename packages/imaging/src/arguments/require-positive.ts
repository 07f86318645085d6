/**
 * Refuses arguments that are not finite numbers above zero.
 *
 * @param named  arguments by name, as `{ wavelengthNm, m2 }`
 * @throws RangeError naming the first bad argument and its value
 */
export function requirePositive(named: Readonly<Record<string, number>>): void {
  for (const [name, value] of Object.entries(named)) {
    if (!Number.isFinite(value) || value <= 0) throw new RangeError(`${name} must be a finite number above 0, but is ${String(value)}`);
  }
}
