import { expectReference } from '../../test/expect-reference';
import { runIn } from './run-in';

const NAME = 'run-in length and time for a line at speed v with acceleration a';

describe('runIn', () => {
  expectReference(NAME, 'run_in_mm', ({ v_mm_s, a_mm_s2 }) => runIn(v_mm_s, a_mm_s2).lengthMm);
  expectReference(NAME, 't_each_end_ms', ({ v_mm_s, a_mm_s2 }) => runIn(v_mm_s, a_mm_s2).timeMs);

  it('covers half of what full speed would in the same time', () => {
    const { lengthMm, timeMs } = runIn(1500, 2e6);
    expect(lengthMm).toBeCloseTo((1500 * timeMs) / 2000, 12);
  });

  it('refuses no acceleration', () => {
    expect(() => runIn(1500, 0)).toThrow('accelerationMmPerS2 must be a finite number above 0, but is 0');
  });
});
