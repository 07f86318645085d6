import { scansPerPass } from './fill';

describe('scansPerPass', () => {
  it('counts two scans for a crossed pass and one otherwise', () => {
    expect(scansPerPass('crossed')).toBe(2);
    expect((['one direction', 'both directions', 'outline'] as const).map(scansPerPass)).toEqual([1, 1, 1]);
  });
});
