import {
  beamParameterProduct,
  depthForFluenceLoss,
  depthForSpotGrowth,
  depthOfFocus,
  fluenceRatioAtOffset,
  focusedSpotDiameter,
  fullDivergence,
  rayleighLength,
  spotDiameterAtOffset,
  truncatedSpotDiameter,
} from '@proofplate/physics';
import type { FormulaEntry } from '../formula-entry';
import type { Inputs } from '../inputs';

const focusedBeam = (inputs: Inputs) => ({
  wavelengthNm: inputs.number('lambda_nm'),
  focalLengthMm: inputs.number('f_mm'),
  beamDiameterMm: inputs.number('D_1e2_mm'),
  m2: inputs.number('M2'),
});

const waist = (inputs: Inputs) => ({
  spotDiameterUm: inputs.number('d0_um'),
  wavelengthNm: inputs.number('lambda_nm'),
  m2: inputs.number('M2'),
});

export const BEAM: readonly FormulaEntry[] = [
  {
    formula: 'd0=4*M2*lambda*f/(pi*D); zR=pi*d0^2/(4*M2*lambda); DOF=2*zR; Theta=4*M2*lambda/(pi*d0)=D/f; BPP=M2*lambda/pi=d0*Theta/4',
    evaluate: (inputs) => {
      const beam = focusedBeam(inputs);
      const focus = { spotDiameterUm: focusedSpotDiameter(beam), wavelengthNm: beam.wavelengthNm, m2: beam.m2 };
      const zR_mm = rayleighLength(focus);
      return {
        d0_um: focus.spotDiameterUm,
        zR_mm,
        dof_2zR_mm: depthOfFocus(zR_mm),
        theta_full_mrad: fullDivergence(focus),
        bpp_mm_mrad: beamParameterProduct(beam.wavelengthNm, beam.m2),
      };
    },
  },
  {
    formula: 'd0=APO*M2*lambda*f/D (APO=4/pi=1.2732 is the untruncated Gaussian limit)',
    evaluate: (inputs) => ({ d0_um: truncatedSpotDiameter(focusedBeam(inputs), inputs.number('APO')) }),
  },
  {
    formula: 'd(z)=d0*sqrt(1+(z/zR)^2); F(z)/F(0)=(d0/d)^2',
    evaluate: (inputs) => {
      const zR_mm = rayleighLength(waist(inputs));
      const z_mm = inputs.number('z_mm');
      return { zR_mm, d_um: spotDiameterAtOffset(inputs.number('d0_um'), zR_mm, z_mm), fluence_ratio: fluenceRatioAtOffset(zR_mm, z_mm) };
    },
  },
  {
    formula: 'total_p=2*zR*sqrt((1+p)^2-1); total_q=2*zR*sqrt(1/(1-q)-1)',
    evaluate: (inputs) => {
      const zR_mm = rayleighLength(waist(inputs));
      return {
        zR_mm,
        total_depth_growth_mm: depthForSpotGrowth(zR_mm, inputs.number('p')),
        total_depth_fluence_mm: depthForFluenceLoss(zR_mm, inputs.number('q')),
      };
    },
  },
  {
    formula: 'BPP=M2*lambda/pi (waist radius x half angle)',
    evaluate: (inputs) => ({ bpp_mm_mrad: beamParameterProduct(inputs.number('lambda_nm'), inputs.number('M2')) }),
  },
];
