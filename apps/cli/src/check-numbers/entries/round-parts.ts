import {
  chordForSagitta,
  cylinderFacets,
  flatGraphicOnCylinder,
  ringCircumference,
  rotaryResolution,
  sagitta,
  spotAtIncidence,
  taperDevelopment,
  wrapRoundCylinder,
} from '@proofplate/physics';
import type { FormulaEntry } from '../formula-entry';
import type { Inputs } from '../inputs';

export const ROUND_PARTS: readonly FormulaEntry[] = [
  {
    formula: 'C_out=pi*D; C_in=pi*(D-2t); deg_per_mm=360/(pi*D)',
    evaluate: (inputs) => {
      const ring = ringCircumference(inputs.number('D_mm'), inputs.number('t_mm'));
      return {
        C_out_mm: ring.outsideMm,
        C_in_mm: ring.insideMm,
        deg_per_mm_out: ring.degreesPerMmOutside,
        deg_per_mm_in: ring.degreesPerMmInside,
      };
    },
  },
  {
    formula: 's=R-sqrt(R^2-c^2/4); c=2*sqrt(2*R*s-s^2); phi=asin(c/(2R)); arc=2*R*phi; edge stretch=1/cos(phi); parabola s~c^2/(8R)',
    evaluate: (inputs) => {
      const fall = sagitta(inputs.number('R_mm'), inputs.number('chord_mm'));
      return {
        sag_mm: fall.sagittaMm,
        phi_edge_deg: fall.edgeAngleDeg,
        arc_mm: fall.arcMm,
        edge_stretch: fall.edgeStretch,
        parabola_mm: fall.parabolaMm,
        chord_back_mm: chordForSagitta(inputs.number('R_mm'), fall.sagittaMm),
      };
    },
  },
  {
    formula:
      'allowed sag s = usable depth (focus set half way down the sag, z=+-depth/2) or depth/2 (focus set on the crown); phi=acos(1-s/R); n=ceil(pi/phi) [and n>=ceil(180deg/phi_cap)]; step=360/n',
    evaluate: facets,
  },
  {
    formula:
      "projected straight down, offset x lands at arc=R*asin(x/R); to land at arc=x send x'=R*sin(x/R); local stretch 1/sqrt(1-(x/R)^2); fluence factor cos(phi)",
    evaluate: (inputs) => {
      const point = flatGraphicOnCylinder(inputs.number('R_mm'), inputs.number('x_mm'));
      return {
        arc_uncompensated_mm: point.arcMm,
        x_compensated_mm: point.compensatedMm,
        local_stretch: point.localStretch,
        fluence_factor: point.fluenceFactor,
      };
    },
  },
  {
    formula: 'wrap_deg=360*Wg/(pi*D); overlap_mm=max(0,Wg-pi*D); remaining gap=max(0,pi*D-Wg)',
    evaluate: (inputs) => {
      const { angleDeg, overlapMm, gapMm } = wrapRoundCylinder(inputs.number('D_mm'), inputs.number('width_mm'));
      return { wrap_deg: angleDeg, overlap_mm: overlapMm, gap_mm: gapMm };
    },
  },
  {
    formula: 'major=d/cos(theta); minor=d; area=pi*d^2/(4 cos); F_theta=F*cos(theta)',
    evaluate: (inputs) => {
      const spot = spotAtIncidence(inputs.number('d_um'), inputs.number('theta_deg'));
      return {
        major_um: spot.majorDiameterUm,
        minor_um: spot.minorDiameterUm,
        area_um2: spot.areaUm2,
        F_J_cm2: inputs.number('F0_J_cm2') * spot.fluenceFactor,
      };
    },
  },
  {
    formula: 'slant=sqrt((r2-r1)^2+H^2); half angle=atan((r2-r1)/H); sector=360*(r2-r1)/slant; R=r*slant/(r2-r1)',
    evaluate: (inputs) => {
      const flat = taperDevelopment(inputs.number('r1_mm'), inputs.number('r2_mm'), inputs.number('H_mm'));
      return {
        slant_mm: flat.slantMm,
        half_angle_deg: flat.halfAngleDeg,
        sector_deg: flat.sectorDeg,
        R_small_mm: flat.smallRadiusMm,
        R_large_mm: flat.largeRadiusMm,
      };
    },
  },
  {
    formula: 'step=pi*D/steps_per_rev',
    evaluate: (inputs) => ({ step_um: rotaryResolution(inputs.number('D_mm'), inputs.number('steps_per_rev')) }),
  },
];

function facets(inputs: Inputs) {
  const focusAt = inputs.text('focus_at');
  if (focusAt !== 'mid' && focusAt !== 'crown') throw new TypeError(`input focus_at must be mid or crown, but is ${focusAt}`);
  const found = cylinderFacets({
    radiusMm: inputs.number('R_mm'),
    usableDepthMm: inputs.number('usable_depth_total_mm'),
    focusAt,
    edgeAngleCapDeg: inputs.optionalNumber('edge_angle_cap_deg'),
  });
  return {
    chord_max_mm: found.widestChordMm,
    half_angle_max_deg: found.widestHalfAngleDeg,
    steps: found.steps,
    step_deg: found.stepDeg,
    facet_arc_mm: found.facetArcMm,
    facet_chord_mm: found.facetChordMm,
    sag_used_mm: found.facetSagittaMm,
    cos_edge: found.edgeCosine,
    edge_stretch: found.edgeStretch,
  };
}
