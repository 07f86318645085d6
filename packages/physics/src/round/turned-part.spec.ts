import { expectReferences } from '../../test/expect-reference';
import { ringCircumference } from './ring-circumference';
import { rotaryResolution } from './rotary-resolution';
import { spotAtIncidence } from './spot-at-incidence';
import { taperDevelopment } from './taper-development';
import { wrapRoundCylinder } from './wrap-round-cylinder';

type Numbers = Readonly<Record<string, number>>;

describe('ringCircumference', () => {
  expectReferences<Numbers>('circumference outside and inside a ring', ({ D_mm, t_mm }) => {
    const ring = ringCircumference(D_mm, t_mm);
    return {
      C_out_mm: ring.outsideMm,
      C_in_mm: ring.insideMm,
      deg_per_mm_out: ring.degreesPerMmOutside,
      deg_per_mm_in: ring.degreesPerMmInside,
    };
  });

  it('refuses a wall that leaves no hole', () => {
    expect(() => ringCircumference(20, 10)).toThrow('wallMm must be below half the diameter of 20, but is 10');
  });
});

describe('wrapRoundCylinder', () => {
  expectReferences<Numbers>('wrap of a flat graphic round a cylinder', ({ D_mm, width_mm }) => {
    const { angleDeg, overlapMm, gapMm } = wrapRoundCylinder(D_mm, width_mm);
    return { wrap_deg: angleDeg, overlap_mm: overlapMm, gap_mm: gapMm };
  });

  it('refuses a graphic without width', () => {
    expect(() => wrapRoundCylinder(20, 0)).toThrow('widthMm must be a finite number above 0, but is 0');
  });
});

describe('spotAtIncidence', () => {
  expectReferences<Numbers>('spot ellipse and fluence at incidence angle', ({ d_um, theta_deg, F0_J_cm2 }) => {
    const spot = spotAtIncidence(d_um, theta_deg);
    return {
      major_um: spot.majorDiameterUm,
      minor_um: spot.minorDiameterUm,
      area_um2: spot.areaUm2,
      F_J_cm2: F0_J_cm2 * spot.fluenceFactor,
    };
  });

  it('refuses a grazing beam', () => {
    expect(() => spotAtIncidence(50, 90)).toThrow('incidenceAngleDeg must be below 90, but is 90');
  });
});

describe('taperDevelopment', () => {
  expectReferences<Numbers>('taper (cone frustum) development', ({ r1_mm, r2_mm, H_mm }) => {
    const flat = taperDevelopment(r1_mm, r2_mm, H_mm);
    return {
      slant_mm: flat.slantMm,
      half_angle_deg: flat.halfAngleDeg,
      sector_deg: flat.sectorDeg,
      R_small_mm: flat.smallRadiusMm,
      R_large_mm: flat.largeRadiusMm,
    };
  });

  it('keeps the circumference of both ends along the arcs of the sector', () => {
    const { sectorDeg, largeRadiusMm } = taperDevelopment(30, 40, 80);
    expect((Number(largeRadiusMm) * sectorDeg * Math.PI) / 180).toBeCloseTo(2 * Math.PI * 40, 9);
  });

  it('refuses ends in the wrong order', () => {
    expect(() => taperDevelopment(40, 30, 80)).toThrow('largeEndRadiusMm must be at least 40, but is 30');
  });
});

describe('rotaryResolution', () => {
  expectReferences<Numbers>('rotary resolution at the surface', ({ D_mm, steps_per_rev }) => ({
    step_um: rotaryResolution(D_mm, steps_per_rev),
  }));

  it('refuses half a step', () => {
    expect(() => rotaryResolution(20, 0.5)).toThrow('stepsPerRevolution must be a whole number of at least 1, but is 0.5');
  });
});
