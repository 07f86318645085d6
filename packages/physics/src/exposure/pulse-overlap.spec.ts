import { expectReference } from '../../test/expect-reference';
import { pulseOverlap } from './pulse-overlap';

describe('pulseOverlap', () => {
  expectReference('scan numbers (pitch, overlaps, line energy, areal dose)', 'pulse_overlap', ({ v_mm_s, f_kHz, d_um }) =>
    pulseOverlap(v_mm_s, f_kHz, d_um),
  );

  it('stays negative for separated dots', () => {
    expect(pulseOverlap(1500, 30, 40)).toBeCloseTo(-0.25, 12);
  });

  it('refuses a frequency of zero', () => {
    expect(() => pulseOverlap(200, 0, 50)).toThrow('frequencyKhz must be a finite number above 0, but is 0');
  });
});
