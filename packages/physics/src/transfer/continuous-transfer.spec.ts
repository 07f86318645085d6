import { expectReferences } from '../../test/expect-reference';
import { arealDose } from '../exposure/areal-dose';
import { averageIrradiance } from '../exposure/average-irradiance';
import { continuousTransfer } from './continuous-transfer';

const KW_PER_CM2_PER_W_PER_MM2 = 0.1;
const source = { powerW: 30, speedMmPerS: 100, lineSpacingUm: 80, spotDiameterUm: 60 };

describe('continuousTransfer', () => {
  expectReferences<Readonly<Record<string, number>>>('CW transfer keeping irradiance, interaction time and line overlap', (inputs) => {
    const found = continuousTransfer(
      { powerW: inputs.P1_W, speedMmPerS: inputs.v1_mm_s, lineSpacingUm: inputs.h1_um, spotDiameterUm: inputs.d1_um },
      inputs.d2_um,
    );
    return {
      P2_W: found.powerW,
      v2_mm_s: found.speedMmPerS,
      h2_um: found.lineSpacingUm,
      irradiance_avg_kW_cm2: found.averageIrradianceWPerMm2 * KW_PER_CM2_PER_W_PER_MM2,
      interaction_time_us: found.interactionTimeUs,
      dose_J_mm2: found.arealDoseJPerMm2,
    };
  });

  it('keeps irradiance and dose on the other spot', () => {
    const found = continuousTransfer(source, 90);
    expect(averageIrradiance(found.powerW, 90)).toBeCloseTo(found.averageIrradianceWPerMm2, 9);
    expect(arealDose({ ...found, scans: 1 })).toBeCloseTo(found.arealDoseJPerMm2, 12);
  });

  it('refuses a spot of zero', () => {
    expect(() => continuousTransfer(source, 0)).toThrow('targetSpotDiameterUm must be a finite number above 0, but is 0');
  });
});
