import { expectReferences } from '../../test/expect-reference';
import { arealDose } from '../exposure/areal-dose';
import { doseTransfer } from './dose-transfer';

const source = { powerW: 20, speedMmPerS: 500, lineSpacingUm: 50, scans: 1 };

describe('doseTransfer', () => {
  expectReferences<Readonly<Record<string, number>>>('dose-only transfer (keep areal dose)', (inputs) => {
    const { arealDoseJPerMm2, speedMmPerS } = doseTransfer(
      { powerW: inputs.P1_W, speedMmPerS: inputs.v1_mm_s, lineSpacingUm: inputs.h1_um, scans: inputs.passes1 },
      { powerW: inputs.P2_W, lineSpacingUm: inputs.h2_um, scans: inputs.passes2 },
    );
    return { dose_J_mm2: arealDoseJPerMm2, v2_mm_s: speedMmPerS };
  });

  it('gives back the same dose', () => {
    const other = { powerW: 33, lineSpacingUm: 17, scans: 3 };
    const { arealDoseJPerMm2, speedMmPerS } = doseTransfer(source, other);
    expect(arealDose({ ...other, speedMmPerS })).toBeCloseTo(arealDoseJPerMm2, 12);
  });

  it('refuses a source without power, which has no dose to keep', () => {
    expect(() => doseTransfer({ ...source, powerW: 0 }, source)).toThrow('source.powerW must be a finite number above 0, but is 0');
  });
});
