import { expectReference } from '../../test/expect-reference';
import { interactionTime } from './interaction-time';
import { pulsesPerSpot } from './pulses-per-spot';

describe('interactionTime', () => {
  expectReference('scan numbers (pitch, overlaps, line energy, areal dose)', 'interaction_time_us', ({ d_um, v_mm_s }) =>
    interactionTime(d_um, v_mm_s),
  );

  it('holds the pulses per spot', () => {
    expect(interactionTime(50, 200) * 0.02).toBeCloseTo(pulsesPerSpot(200, 20, 50), 12);
  });

  it('refuses a speed that is not a number', () => {
    expect(() => interactionTime(50, Number.NaN)).toThrow('speedMmPerS must be a finite number above 0, but is NaN');
  });
});
