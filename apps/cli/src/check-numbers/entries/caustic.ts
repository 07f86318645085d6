import { type Caustic, causticByParabola, causticByWidths, scanField, waistThroughLens } from '@proofplate/physics';
import type { FormulaEntry } from '../formula-entry';
import type { Inputs } from '../inputs';

const measured = (inputs: Inputs) => ({
  positionsMm: inputs.numbers('z_mm'),
  diametersUm: inputs.numbers('d_um'),
  wavelengthNm: inputs.number('lambda_nm'),
});

const keyed = ({ waistDiameterUm, waistPositionMm, fullDivergenceMrad, rayleighLengthMm, m2 }: Caustic) => ({
  d0_um: waistDiameterUm,
  z0_mm: waistPositionMm,
  theta_full_mrad: fullDivergenceMrad,
  zR_mm: rayleighLengthMm,
  M2: m2,
});

export const CAUSTIC: readonly FormulaEntry[] = [
  {
    formula:
      'least squares d^2=a+b*z+c*z^2; d0=sqrt(4ac-b^2)/(2*sqrt(c)); z0=-b/(2c); Theta=sqrt(c); zR=sqrt(4ac-b^2)/(2c); M2=pi*sqrt(4ac-b^2)/(8*lambda)',
    evaluate: (inputs) => keyed(causticByParabola(measured(inputs))),
  },
  {
    formula: 'minimise sum (d_i - sqrt(d0^2+Theta^2*(z_i-z0)^2))^2',
    evaluate: (inputs) => keyed(causticByWidths(measured(inputs)).value),
  },
  {
    formula: 'fit returns the generating values',
    evaluate: (inputs) => keyed(causticByWidths(measured(inputs)).value),
  },
  {
    formula:
      "zR1=pi*w0^2/(M2*lambda); m=f/sqrt((s+f)^2+zR1^2); w0'=m*w0; zR'=m^2*zR1; image=f-f^2*(s+f)/((s+f)^2+zR1^2) with s<0 before the lens",
    evaluate: (inputs) => {
      const image = waistThroughLens({
        waistRadiusUm: inputs.number('w0_um'),
        wavelengthNm: inputs.number('lambda_nm'),
        m2: inputs.number('M2'),
        focalLengthMm: inputs.number('f_mm'),
        waistPositionMm: inputs.number('s_mm'),
      });
      return {
        zR1_mm: image.inputRayleighLengthMm,
        w0_image_um: image.waistRadiusUm,
        zR_image_mm: image.rayleighLengthMm,
        image_distance_mm: image.distanceMm,
      };
    },
  },
  {
    formula:
      'side_per_axis=2*f*theta_max (theta optical, rad); side_if_diagonal_limited=sqrt(2)*f*theta_max; theta_optical=2*theta_mechanical; plain lens would give 2*f*tan(theta)',
    evaluate: (inputs) => {
      const { sideMm, diagonalLimitedSideMm, plainLensSideMm } = scanField(inputs.number('f_mm'), inputs.number('theta_max_optical_deg'));
      return { side_axis_mm: sideMm, side_diag_mm: diagonalLimitedSideMm, plain_lens_mm: plainLensSideMm };
    },
  },
];
