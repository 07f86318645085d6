// Taken out of Math once: the look-up of a global costs more than the call where a test runner wraps it.
const { floor, imul, sqrt } = Math;

export type Random = () => number;

const LATTICE = 64;

/**
 * Uniform numbers in [0, 1) from a seed: the same seed gives the same picture.
 * Method: Weyl sequence with an xor-multiply mix, 32 bit.
 */
export function seededRandom(seed: number): Random {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = imul(state ^ (state >>> 15), 1 | state);
    mixed ^= mixed + imul(mixed ^ (mixed >>> 7), 61 | mixed);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
}

/** Whole number from a text, so that every coupon code has its own seed. */
export function seedOf(text: string): number {
  let hash = 0x811c9dc5;
  for (const character of text) {
    hash = imul(hash ^ (character.codePointAt(0) ?? 0), 0x01000193);
  }
  return hash >>> 0;
}

/** White noise in [-1, 1]. */
export function whiteNoise(length: number, random: Random): Float32Array {
  return Float32Array.from({ length }, () => random() * 2 - 1);
}

/** Running mean over 2 radius + 1 values, scaled back to the spread of the input. */
export function smoothed(values: Float32Array, radius: number): Float32Array {
  const width = 2 * radius + 1;
  const gain = sqrt(width);
  const result = new Float32Array(values.length);
  let sum = 0;
  for (let index = -radius; index < values.length + radius; index += 1) {
    sum += values[index + radius] ?? 0;
    sum -= values[index - radius - 1] ?? 0;
    if (index >= 0 && index < values.length) {
      result[index] = (sum / width) * gain;
    }
  }
  return result;
}

/** Smooth noise over the plane, in [-1, 1], one feature per unit; repeats after 64 units. */
export type PlaneNoise = (x: number, y: number) => number;

export function planeNoise(random: Random): PlaneNoise {
  const lattice = whiteNoise(LATTICE * LATTICE, random);
  const at = (column: number, row: number) => lattice[((row & (LATTICE - 1)) * LATTICE + (column & (LATTICE - 1))) | 0] ?? 0;
  return (x, y) => {
    const column = floor(x);
    const row = floor(y);
    const across = ease(x - column);
    const down = ease(y - row);
    const top = at(column, row) * (1 - across) + at(column + 1, row) * across;
    const bottom = at(column, row + 1) * (1 - across) + at(column + 1, row + 1) * across;
    return top * (1 - down) + bottom * down;
  };
}

/** Sum of octaves, each half as strong and twice as fine as the one before, about in [-1, 1]. */
export function fractalNoise(noise: PlaneNoise, x: number, y: number, octaves: number): number {
  let sum = 0;
  let strength = 0.5;
  let fineness = 1;
  for (let octave = 0; octave < octaves; octave += 1) {
    sum += strength * noise(x * fineness + octave * 17.3, y * fineness + octave * 9.1);
    strength /= 2;
    fineness *= 2;
  }
  return sum;
}

function ease(t: number): number {
  return t * t * (3 - 2 * t);
}
