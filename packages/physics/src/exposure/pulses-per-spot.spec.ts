import { expectReference } from '../../test/expect-reference';
import { pulseOverlap } from './pulse-overlap';
import { pulsesPerSpot } from './pulses-per-spot';

describe('pulsesPerSpot', () => {
  expectReference('scan numbers (pitch, overlaps, line energy, areal dose)', 'pulses_per_spot', ({ v_mm_s, f_kHz, d_um }) =>
    pulsesPerSpot(v_mm_s, f_kHz, d_um),
  );

  it('is one over what the overlap leaves', () => {
    expect(pulsesPerSpot(200, 20, 50)).toBeCloseTo(1 / (1 - pulseOverlap(200, 20, 50)), 12);
  });

  it('refuses a negative spot', () => {
    expect(() => pulsesPerSpot(200, 20, -1)).toThrow('spotDiameterUm must be a finite number above 0, but is -1');
  });
});
