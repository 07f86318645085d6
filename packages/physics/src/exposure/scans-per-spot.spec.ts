import { expectReference } from '../../test/expect-reference';
import { scansPerSpot } from './scans-per-spot';

describe('scansPerSpot', () => {
  expectReference('scan numbers (pitch, overlaps, line energy, areal dose)', 'scans_per_spot', ({ h_um, d_um }) =>
    scansPerSpot(h_um, d_um),
  );

  it('is 1 when the lines just touch', () => {
    expect(scansPerSpot(40, 40)).toBe(1);
  });

  it('refuses a spot of zero', () => {
    expect(() => scansPerSpot(40, 0)).toThrow('spotDiameterUm must be a finite number above 0, but is 0');
  });
});
