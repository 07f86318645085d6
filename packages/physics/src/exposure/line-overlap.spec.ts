import { expectReference } from '../../test/expect-reference';
import { lineOverlap } from './line-overlap';

describe('lineOverlap', () => {
  expectReference('scan numbers (pitch, overlaps, line energy, areal dose)', 'line_overlap', ({ h_um, d_um }) => lineOverlap(h_um, d_um));

  it('stays negative for separated lines', () => {
    expect(lineOverlap(50, 40)).toBeCloseTo(-0.25, 12);
  });

  it('refuses a spacing of zero', () => {
    expect(() => lineOverlap(0, 40)).toThrow('lineSpacingUm must be a finite number above 0, but is 0');
  });
});
