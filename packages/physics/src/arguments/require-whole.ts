/**
 * Refuses arguments that are not whole numbers of at least one, such as a count of passes.
 *
 * @param named  arguments by name, as `{ passes }`
 * @throws RangeError naming the first bad argument and its value
 */
export function requireWhole(named: Readonly<Record<string, number>>): void {
  for (const [name, value] of Object.entries(named)) {
    if (!Number.isSafeInteger(value) || value < 1) {
      throw new RangeError(`${name} must be a whole number of at least 1, but is ${String(value)}`);
    }
  }
}
