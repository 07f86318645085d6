import { expectReference } from '../../test/expect-reference';
import { pulsesPerSpotArea } from './pulses-per-spot-area';

const mark = { spotDiameterUm: 50, frequencyKhz: 20, speedMmPerS: 200, lineSpacingUm: 25, scans: 1 };

describe('pulsesPerSpotArea', () => {
  expectReference(
    'scan numbers (pitch, overlaps, line energy, areal dose)',
    'pulses_per_spot_area',
    ({ d_um, f_kHz, v_mm_s, h_um, passes }) =>
      pulsesPerSpotArea({ spotDiameterUm: d_um, frequencyKhz: f_kHz, speedMmPerS: v_mm_s, lineSpacingUm: h_um, scans: passes }),
  );

  it('counts every scan', () => {
    expect(pulsesPerSpotArea({ ...mark, scans: 4 })).toBeCloseTo(4 * pulsesPerSpotArea(mark), 12);
  });

  it('refuses half a scan', () => {
    expect(() => pulsesPerSpotArea({ ...mark, scans: 0.5 })).toThrow('scans must be a whole number of at least 1, but is 0.5');
  });
});
