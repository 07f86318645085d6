/**
 * A shuffled order of n cells that the same seed always gives again.          Fisher-Yates over a 32-bit counter generator
 *
 * @param count number of cells, whole, >= 0
 * @param seed  whole number; kept with the grid, so that the order can be proved later
 * @returns each of 0 … n − 1 once, in the order of marking
 * @throws RangeError naming the argument and its value
 * Source: D. E. Knuth, The Art of Computer Programming 2, algorithm P; generator mulberry32 (public domain)
 */
export function runOrder(count: number, seed: number): number[] {
  if (!Number.isSafeInteger(count) || count < 0) throw new RangeError(`count must be a whole number from 0, got ${count}`);
  if (!Number.isSafeInteger(seed)) throw new RangeError(`seed must be a whole number, got ${seed}`);
  const next = mulberry32(seed);
  const order = Array.from({ length: count }, (_, index) => index);
  for (let last = count - 1; last > 0; last -= 1) {
    const chosen = below(last + 1, next);
    [order[last], order[chosen]] = [order[chosen], order[last]];
  }
  return order;
}

const RANGE = 2 ** 32;

/** Rejects the incomplete last block, so that no place is more likely than another. */
function below(limit: number, next: () => number): number {
  const complete = RANGE - (RANGE % limit);
  let drawn = next();
  while (drawn >= complete) drawn = next();
  return drawn % limit;
}

function mulberry32(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return (mixed ^ (mixed >>> 14)) >>> 0;
  };
}
