import { expectReferences } from '../../test/expect-reference';
import { chordForSagitta } from './chord-for-sagitta';
import { cylinderFacets } from './cylinder-facets';
import { flatGraphicOnCylinder } from './flat-graphic-on-cylinder';
import { sagitta } from './sagitta';

type Numbers = Readonly<Record<string, number>>;
type FacetInputs = {
  readonly R_mm: number;
  readonly usable_depth_total_mm: number;
  readonly focus_at: 'mid' | 'crown';
  readonly edge_angle_cap_deg: number | null;
};

describe('sagitta and chordForSagitta', () => {
  expectReferences<Numbers>('sagitta, inverse, edge angle, arc, stretch', ({ R_mm, chord_mm }) => {
    const fall = sagitta(R_mm, chord_mm);
    return {
      sag_mm: fall.sagittaMm,
      phi_edge_deg: fall.edgeAngleDeg,
      arc_mm: fall.arcMm,
      edge_stretch: fall.edgeStretch,
      parabola_mm: fall.parabolaMm,
      chord_back_mm: chordForSagitta(R_mm, fall.sagittaMm),
    };
  });

  it('gives the published falls of a radius of 7.8 mm to a unit of their last digit', () => {
    // Benjamin and Rosenblum (1992), table 1, sphere. Its 0.412 is 0.41150 in full, so half a unit would be too strict.
    const printed = { 2: 0.064, 5: 0.412, 8: 1.104, 10: 1.813, 12: 2.816 };
    for (const [chordMm, sagittaMm] of Object.entries(printed)) {
      expect(Math.abs(sagitta(7.8, Number(chordMm)).sagittaMm - sagittaMm)).toBeLessThan(0.001);
    }
  });

  it('refuse a field as wide as the part and a fall beyond its radius', () => {
    expect(() => sagitta(10, 20)).toThrow('chordMm must be below the diameter of 20, but is 20');
    expect(() => chordForSagitta(10, 10.1)).toThrow('sagittaMm must be at most the radius of 10, but is 10.1');
  });
});

describe('cylinderFacets', () => {
  expectReferences<FacetInputs>('flat-field facet on a cylinder: width, index steps, distortion', (inputs) => {
    const facets = cylinderFacets({
      radiusMm: inputs.R_mm,
      usableDepthMm: inputs.usable_depth_total_mm,
      focusAt: inputs.focus_at,
      ...(inputs.edge_angle_cap_deg === null ? {} : { edgeAngleCapDeg: inputs.edge_angle_cap_deg }),
    });
    return {
      chord_max_mm: facets.widestChordMm,
      half_angle_max_deg: facets.widestHalfAngleDeg,
      steps: facets.steps,
      step_deg: facets.stepDeg,
      facet_arc_mm: facets.facetArcMm,
      facet_chord_mm: facets.facetChordMm,
      sag_used_mm: facets.facetSagittaMm,
      cos_edge: facets.edgeCosine,
      edge_stretch: facets.edgeStretch,
    };
  });

  it('never uses more depth than there is', () => {
    for (const radiusMm of [3, 11, 47]) {
      const facets = cylinderFacets({ radiusMm, usableDepthMm: 0.3, focusAt: 'mid' });
      expect(facets.facetSagittaMm).toBeLessThanOrEqual(0.3);
      expect(facets.facetChordMm).toBeLessThanOrEqual(facets.widestChordMm);
    }
  });

  it('refuses a depth that covers the part', () => {
    expect(() => cylinderFacets({ radiusMm: 1, usableDepthMm: 1, focusAt: 'mid' })).toThrow(
      'usableDepthMm must leave less than the radius of 1, but is 1',
    );
  });
});

describe('flatGraphicOnCylinder', () => {
  expectReferences<Numbers>('flat graphic on a cylinder (projection and compensation)', ({ R_mm, x_mm }) => {
    const point = flatGraphicOnCylinder(R_mm, x_mm);
    return {
      arc_uncompensated_mm: point.arcMm,
      x_compensated_mm: point.compensatedMm,
      local_stretch: point.localStretch,
      fluence_factor: point.fluenceFactor,
    };
  });

  it('lands a compensated point where it should', () => {
    expect(flatGraphicOnCylinder(10, flatGraphicOnCylinder(10, 4).compensatedMm).arcMm).toBeCloseTo(4, 12);
  });

  it('refuses a point beside the part', () => {
    expect(() => flatGraphicOnCylinder(10, -10)).toThrow('offsetMm must lie inside the radius of 10, but is -10');
  });
});
