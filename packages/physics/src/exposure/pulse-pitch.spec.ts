import { expectReference } from '../../test/expect-reference';
import { pulsePitch } from './pulse-pitch';

describe('pulsePitch', () => {
  expectReference('scan numbers (pitch, overlaps, line energy, areal dose)', 'pitch_um', ({ v_mm_s, f_kHz }) => pulsePitch(v_mm_s, f_kHz));

  it('is 1 µm for 1 mm/s at 1 kHz', () => {
    expect(pulsePitch(1, 1)).toBe(1);
  });

  it('refuses a beam that stands still', () => {
    expect(() => pulsePitch(0, 20)).toThrow('speedMmPerS must be a finite number above 0, but is 0');
  });
});
