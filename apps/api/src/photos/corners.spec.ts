import { cornersFault } from './corners';

const PLATE = [
  { x: 0.1, y: 0.2 },
  { x: 0.9, y: 0.15 },
  { x: 0.95, y: 0.9 },
  { x: 0.05, y: 0.85 },
];

describe('cornersFault', () => {
  it('finds nothing wrong with a plate seen at a slant, from any of its corners', () => {
    for (let start = 0; start < 4; start += 1) expect(cornersFault([...PLATE.slice(start), ...PLATE.slice(0, start)])).toBeUndefined();
  });

  it('names the wrong way around', () => {
    expect(cornersFault([...PLATE].reverse())).toContain('anticlockwise');
  });

  it('refuses lines that cross, corners that dent and corners that coincide', () => {
    const [a, b, c, d] = PLATE as [(typeof PLATE)[0], (typeof PLATE)[0], (typeof PLATE)[0], (typeof PLATE)[0]];
    expect(cornersFault([a, c, b, d])).toContain('cross');
    expect(cornersFault([a, b, { x: 0.3, y: 0.35 }, d])).toContain('cross or dent');
    expect(cornersFault([a, a, c, d])).toContain('cross or dent');
  });

  it('refuses a speck and a missing corner', () => {
    expect(cornersFault(PLATE.map(({ x, y }) => ({ x: x / 20, y: y / 20 })))).toContain('too small');
    expect(cornersFault(PLATE.slice(0, 3))).toContain('four corners');
  });
});
