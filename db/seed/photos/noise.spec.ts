import { planeNoise, seededRandom, seedOf, smoothed, whiteNoise } from './noise';

describe('seededRandom', () => {
  it('repeats itself for one seed and differs for another', () => {
    const draw = (seed: number) => Array.from({ length: 5 }, seededRandom(seed));
    expect(draw(7)).toEqual(draw(7));
    expect(draw(7)).not.toEqual(draw(8));
  });

  it('covers the unit interval evenly', () => {
    const random = seededRandom(3);
    const tenths = new Array<number>(10).fill(0);
    for (let draw = 0; draw < 20_000; draw += 1) {
      const tenth = Math.floor(random() * 10);
      tenths[tenth] = (tenths[tenth] ?? 0) + 1;
    }
    // 2000 expected in each, standard deviation 42: five of them.
    expect(Math.min(...tenths)).toBeGreaterThan(1790);
    expect(Math.max(...tenths)).toBeLessThan(2210);
  });

  it('takes a different seed from every coupon code', () => {
    const seeds = Array.from({ length: 200 }, (_, number) => seedOf(`C-${String(number).padStart(4, '0')}`));
    expect(new Set(seeds).size).toBe(200);
  });
});

describe('planeNoise', () => {
  it('is smooth and stays within -1 and 1', () => {
    const noise = planeNoise(seededRandom(5));
    for (let step = 0; step < 500; step += 1) {
      const [x, y] = [step * 0.37 - 40, step * 0.71 - 90];
      expect(Math.abs(noise(x, y))).toBeLessThanOrEqual(1);
      expect(Math.abs(noise(x + 1e-4, y) - noise(x, y))).toBeLessThan(1e-3);
    }
  });
});

describe('smoothed', () => {
  it('keeps the spread of white noise', () => {
    const spread = (values: Float32Array) => Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);
    const white = whiteNoise(8000, seededRandom(11));
    expect(spread(smoothed(white, 6)) / spread(white)).toBeCloseTo(1, 1);
  });
});
