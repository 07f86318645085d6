/**
 * Refuses arguments that are not finite numbers.
 *
 * @param named  arguments by name, as `{ focusOffsetMm }`
 * @throws RangeError naming the first bad argument and its value
 */
export function requireFinite(named: Readonly<Record<string, number>>): void {
  for (const [name, value] of Object.entries(named)) {
    if (!Number.isFinite(value)) throw new RangeError(`${name} must be a finite number, but is ${String(value)}`);
  }
}
