import fc from 'fast-check';
import { rayleighLength } from '../beam/rayleigh-length';
import type { DerivedNumber } from '../exposure/derived/derived-number';
import { type RoundPartSetUp, roundPartSetUp } from './round-part-set-up';
import type { PartOptics, RoundPart } from './set-up/round-part';

const WAVELENGTH_NM = 1064;

/** Optics whose whole depth at a fluence loss of one half is the depth given: 2 zR sqrt(0.5/0.5). */
function opticsOfDepth(depthMm: number): PartOptics {
  const spotDiameterUm = Math.sqrt((4 * WAVELENGTH_NM * depthMm) / (2 * Math.PI));
  return { spot: { spotDiameterUm, wavelengthNm: WAVELENGTH_NM, m2: 1 }, focusOffsetsMm: [], fieldSizeMm: 110 };
}

const ROD: RoundPart = {
  side: 'outside',
  body: { outerDiameterMm: 20, wallMm: 2 },
  lengthMm: 60,
  artworkHeightMm: 12,
  artwork: { seamMm: 0 },
  allowance: { kind: 'fluence loss', share: 0.5 },
  focusAt: 'mid',
};
const CONE: RoundPart = { ...ROD, body: { smallDiameterMm: 60, largeDiameterMm: 80 }, lengthMm: 80, artworkHeightMm: 40 };

const find = ({ numbers }: RoundPartSetUp, key: string): DerivedNumber => {
  const found = numbers.find((number) => number.key === key);
  if (found === undefined) throw new RangeError(`there is no ${key}`);
  return found;
};
const value = (setUp: RoundPartSetUp, key: string) => find(setUp, key).value;

describe('roundPartSetUp', () => {
  // Values of the plane-geometry table: D 20 mm, wall 2 mm; R 10 mm with a usable depth of 0.2 mm.
  it('gives the diameter, the wrap and the turn of the outside', () => {
    const setUp = roundPartSetUp(ROD, opticsOfDepth(0.2));
    expect(value(setUp, 'rotaryDiameter')).toBe(20);
    expect(value(setUp, 'wrapLength')).toBeCloseTo(62.831853, 6);
    expect(value(setUp, 'turnPerMm')).toBeCloseTo(5.729578, 6);
    expect(setUp.isMirrored).toBe(false);
  });

  it('gives those of the inside by the inner diameter, and mirrors once', () => {
    const setUp = roundPartSetUp({ ...ROD, side: 'inside' }, opticsOfDepth(0.2));
    expect(value(setUp, 'rotaryDiameter')).toBe(16);
    expect(value(setUp, 'wrapLength')).toBeCloseTo(50.265482, 6);
    expect(value(setUp, 'turnPerMm')).toBeCloseTo(7.1619724, 6);
    expect(setUp.isMirrored).toBe(true);
  });

  it.each([
    { focusAt: 'mid', stripWidth: 3.9799497, steps: 16, step: 22.5, field: 3.9018064, fall: 0.1921472, cosine: 0.98078528 },
    { focusAt: 'crown', stripWidth: 2.8213472, steps: 23, step: 15.652174, field: 2.723333, fall: 0.09314054, cosine: 0.99068595 },
  ] as const)(
    'divides a whole turn into flat strips with the focus at $focusAt',
    ({ focusAt, stripWidth, steps, step, field, fall, cosine }) => {
      const setUp = roundPartSetUp({ ...ROD, focusAt }, opticsOfDepth(0.2));
      expect(value(setUp, 'stripWidth')).toBeCloseTo(stripWidth, 6);
      expect(value(setUp, 'leastIndexSteps')).toBe(steps);
      expect(value(setUp, 'stepsOfWholeTurn')).toBe(steps);
      expect(value(setUp, 'indexAngle')).toBeCloseTo(step, 6);
      expect(value(setUp, 'fieldWidth')).toBeCloseTo(field, 6);
      expect(value(setUp, 'stripFall')).toBeCloseTo(fall, 6);
      expect(value(setUp, 'edgeFluence')).toBeCloseTo(cosine, 8);
      expect(value(setUp, 'focusBelowCrown')).toBeCloseTo(focusAt === 'mid' ? fall / 2 : 0, 6);
      expect(setUp.stripLimit).toBe('focus');
    },
  );

  it('lets the steepest edge end the strip where it comes before the focus', () => {
    const setUp = roundPartSetUp({ ...ROD, steepestEdgeDeg: 15 }, opticsOfDepth(1));
    expect(setUp.stripLimit).toBe('edge angle');
    expect(value(setUp, 'leastIndexSteps')).toBe(12);
    expect(value(setUp, 'fieldWidth')).toBeCloseTo(5.1763809, 6);
  });

  it('lets the marking field end the strip on a part that is wider than it', () => {
    const drum = { ...ROD, body: { outerDiameterMm: 2000, wallMm: 0 } };
    const setUp = roundPartSetUp(drum, { ...opticsOfDepth(40), fieldSizeMm: 110 });
    expect(setUp.stripLimit).toBe('field');
    expect(value(setUp, 'stripWidth')).toBeCloseTo(110, 6);
  });

  it('tells the seam of a typed width: a gap, or an overlap', () => {
    const gap = roundPartSetUp({ ...ROD, artwork: { widthMm: 30 } }, opticsOfDepth(0.2));
    expect(value(gap, 'wrapAngle')).toBeCloseTo(171.88734, 5);
    expect(value(gap, 'seamGap')).toBeCloseTo(32.831853, 6);
    const overlap = roundPartSetUp({ ...ROD, artwork: { widthMm: 70 } }, opticsOfDepth(0.2));
    expect(value(overlap, 'wrapAngle')).toBeCloseTo(401.07046, 5);
    expect(value(overlap, 'seamOverlap')).toBeCloseTo(7.1681469, 6);
  });

  it('makes the artwork of a whole turn longer by an overlap and shorter by a gap', () => {
    for (const seamMm of [1.5, -1.5]) {
      const setUp = roundPartSetUp({ ...ROD, artwork: { seamMm } }, opticsOfDepth(0.2));
      expect(value(setUp, 'artworkWidth')).toBeCloseTo(62.831853 + seamMm, 6);
      expect(value(setUp, seamMm > 0 ? 'seamOverlap' : 'seamGap')).toBeCloseTo(1.5, 9);
    }
  });

  it('unrolls a cone and tells what a rectangle would lose on it', () => {
    const setUp = roundPartSetUp(CONE, opticsOfDepth(0.5));
    expect(value(setUp, 'slantLength')).toBeCloseTo(80.622577, 6);
    expect(value(setUp, 'tiltAngle')).toBeCloseTo(7.1250163, 6);
    expect(value(setUp, 'sectorAngle')).toBeCloseTo(44.652504, 6);
    expect(value(setUp, 'sectorInnerRadius')).toBeCloseTo(241.86773, 5);
    expect(value(setUp, 'sectorOuterRadius')).toBeCloseTo(322.49031, 5);
    expect(value(setUp, 'rotaryDiameter')).toBe(70);
    // 20 mm along a slant of 80.62 mm, over which the radius grows by 10 mm from its mean of 35 mm.
    expect(value(setUp, 'widthErrorAtEnds')).toBeCloseTo(((20 / 80.622577) * 10) / 35, 6);
  });

  it('has the numbers of a cone on a cone only', () => {
    expect(find(roundPartSetUp(ROD, opticsOfDepth(0.2)), 'sectorAngle')).toMatchObject({
      missingBecause: 'the part has no taper',
      isRuledOutByMode: true,
    });
  });

  it('gives the way of the surface for one motor step where the steps are known', () => {
    expect(value(roundPartSetUp({ ...ROD, stepsPerTurn: 12800 }, opticsOfDepth(0.2)), 'surfaceStep')).toBeCloseTo(4.9087385, 6);
    expect(find(roundPartSetUp(ROD, opticsOfDepth(0.2)), 'surfaceStep').missingBecause).toBe('the motor steps of one turn are not given');
  });

  it.each([
    { what: 'M²', missing: { m2: { unknownBecause: 'the M² is not known' } }, because: 'the M² is not known' },
    { what: 'beam diameter', missing: { beamDiameterMm: { unknownBecause: 'the beam is not known' } }, because: 'the beam is not known' },
  ])('gives no strip and no steps without the $what, but still the wrap', ({ missing, because }) => {
    const spot = { wavelengthNm: WAVELENGTH_NM, focalLengthMm: 160, beamDiameterMm: 7, m2: 1.4, ...missing };
    const setUp = roundPartSetUp(ROD, { spot, focusOffsetsMm: [], fieldSizeMm: 110 });
    for (const key of ['usableFall', 'stripWidth', 'leastIndexSteps', 'indexAngle', 'edgeFluence', 'focusBelowCrown']) {
      expect(find(setUp, key)).toMatchObject({ missingBecause: because });
      expect(value(setUp, key)).toBeUndefined();
    }
    expect(value(setUp, 'wrapLength')).toBeCloseTo(62.831853, 6);
    expect(setUp.stripLimit).toBeNull();
  });

  it('says that a deep focus sets no limit to a thin part, and asks for an angle', () => {
    const pin = { ...ROD, body: { outerDiameterMm: 1, wallMm: 0 } };
    expect(find(roundPartSetUp(pin, opticsOfDepth(4)), 'stripWidth').missingBecause).toMatch('give the steepest angle');
    expect(value(roundPartSetUp({ ...pin, steepestEdgeDeg: 45 }, opticsOfDepth(4)), 'leastIndexSteps')).toBe(4);
  });

  it('follows the mark step that allows the least, and the side that the surface turns to', () => {
    const optics = opticsOfDepth(2);
    const at = (focusOffsetsMm: number[], side: RoundPart['side'] = 'outside') =>
      value(roundPartSetUp({ ...ROD, side, focusAt: 'crown' }, { ...optics, focusOffsetsMm }), 'usableFall') ?? 0;
    expect(at([0, -3])).toBe(Math.min(at([0]), at([-3])));
    expect(at([1], 'inside')).not.toBeCloseTo(at([1]), 3);
    expect(at([1], 'inside')).toBeCloseTo(at([-1]), 9);
  });

  it('never lets a strip fall by more than the focus allows', () => {
    const radius = fc.double({ min: 1, max: 60, noNaN: true });
    const depth = fc.double({ min: 0.05, max: 2, noNaN: true });
    fc.assert(
      fc.property(
        radius,
        depth,
        fc.constantFrom('mid', 'crown'),
        fc.double({ min: 0.05, max: 1.05, noNaN: true }),
        (radiusMm, depthMm, focusAt, turns) => {
          const body = { outerDiameterMm: 2 * radiusMm, wallMm: 0 };
          const artwork = { widthMm: turns * 2 * Math.PI * radiusMm };
          const setUp = roundPartSetUp({ ...ROD, body, artwork, focusAt, steepestEdgeDeg: 60 }, opticsOfDepth(depthMm));
          const [fall, usable] = [value(setUp, 'stripFall') ?? 0, value(setUp, 'usableFall') ?? 0];
          expect(fall).toBeLessThanOrEqual(usable * (1 + 1e-6));
          const steps = value(setUp, 'leastIndexSteps') ?? 0;
          expect((value(setUp, 'indexAngle') ?? 0) * steps).toBeCloseTo(360 * turns, 6);
        },
      ),
    );
  });

  it('keeps the same keys for every part', () => {
    const keys = (part: RoundPart) => roundPartSetUp(part, opticsOfDepth(0.2)).numbers.map(({ key }) => key);
    expect(keys(CONE)).toEqual(keys(ROD));
    expect(new Set(keys(ROD)).size).toBe(keys(ROD).length);
  });

  it('computes the spot of the lens as the beam formulas do', () => {
    const setUp = roundPartSetUp(ROD, opticsOfDepth(0.2));
    const spotDiameterUm = value(setUp, 'focalSpot') ?? 0;
    expect(value(setUp, 'rayleighLength')).toBeCloseTo(rayleighLength({ spotDiameterUm, wavelengthNm: WAVELENGTH_NM, m2: 1 }), 12);
    expect(value(setUp, 'rayleighLength')).toBeCloseTo(0.1, 9);
  });

  it.each([
    [{ body: { outerDiameterMm: 20, wallMm: 10 } }, 'wallMm must be below half the diameter of 20, but is 10'],
    [{ body: { smallDiameterMm: 30, largeDiameterMm: 20 } }, 'largeEndRadiusMm must be at least 15, but is 10'],
    [{ artworkHeightMm: 61 }, 'artworkHeightMm must be at most the surface’s length of 60, but is 61'],
    [{ artwork: { seamMm: -70 } }, 'widthMm must be'],
    [{ allowance: { kind: 'spot growth', share: 0 } }, 'allowanceShare must be'],
    [{ steepestEdgeDeg: 90 }, 'steepestEdgeDeg must be below 90, but is 90'],
    [{ indexSteps: 2.5 }, 'indexSteps must be a whole number'],
  ] as const)('refuses %j', (given, message) => {
    expect(() => roundPartSetUp({ ...ROD, ...given }, opticsOfDepth(0.2))).toThrow(message);
  });
});
