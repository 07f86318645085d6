import fc from 'fast-check';
import { expectReference } from '../../test/expect-reference';
import { areaRate } from './area-rate';
import { arealDose } from './areal-dose';

const positive = fc.double({ min: 0.1, max: 5000, noNaN: true });

describe('arealDose', () => {
  expectReference('scan numbers (pitch, overlaps, line energy, areal dose)', 'areal_dose_J_mm2', ({ P_W, v_mm_s, h_um, passes }) =>
    arealDose({ powerW: P_W, speedMmPerS: v_mm_s, lineSpacingUm: h_um, scans: passes }),
  );
  expectReference(
    'scan numbers (pitch, overlaps, line energy, areal dose)',
    'areal_dose_J_cm2',
    ({ P_W, v_mm_s, h_um, passes }) => 100 * arealDose({ powerW: P_W, speedMmPerS: v_mm_s, lineSpacingUm: h_um, scans: passes }),
  );

  it('times the area is the power times the beam-on time', () => {
    fc.assert(
      fc.property(
        positive,
        positive,
        positive,
        positive,
        fc.integer({ min: 1, max: 40 }),
        (powerW, speedMmPerS, lineSpacingUm, areaMm2, scans) => {
          const beamOnS = (scans * areaMm2) / areaRate(speedMmPerS, lineSpacingUm);
          const energyJ = arealDose({ powerW, speedMmPerS, lineSpacingUm, scans }) * areaMm2;
          expect(Math.abs(energyJ / (powerW * beamOnS) - 1)).toBeLessThan(1e-12);
        },
      ),
    );
  });

  it('refuses no scan at all', () => {
    expect(() => arealDose({ powerW: 20, speedMmPerS: 200, lineSpacingUm: 25, scans: 0 })).toThrow(
      'scans must be a whole number of at least 1, but is 0',
    );
  });
});
