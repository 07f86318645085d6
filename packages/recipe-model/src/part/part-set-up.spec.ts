import type { MarkSpot } from '@proofplate/physics';
import type { EnteredPart, PartGround } from './entered-part';
import { partSetUp } from './part-set-up';

const SPOT: MarkSpot = { spotDiameterUm: 40, wavelengthNm: 1064, m2: 1.5 };
const GROUND: PartGround = { spot: SPOT, fieldSizeMm: 110, focusOffsetsMm: [] };
const mm = (value: number) => ({ value, unit: 'mm' as const });
const inch = (value: number) => ({ value, unit: 'in' as const });

const TUBE: EnteredPart = {
  shape: 'tube',
  side: 'outside',
  diameter: mm(20),
  wall: mm(2),
  length: mm(60),
  artworkHeight: mm(12),
  allowance: 'fluence loss',
  allowancePercent: 10,
  focusAt: 'mid',
  shownIn: 'mm',
};
const CONE: EnteredPart = { ...TUBE, shape: 'cone', smallDiameter: mm(60), largeDiameter: mm(80), length: mm(80) };

function numbersOf(part: EnteredPart, ground = GROUND): Record<string, number | undefined> {
  const setUp = partSetUp(part, ground);
  if (setUp.kind === 'refused') throw new RangeError(JSON.stringify(setUp.problems));
  return Object.fromEntries(setUp.numbers.map(({ key, value }) => [key, value]));
}
function problemsOf(part: EnteredPart, ground = GROUND) {
  const setUp = partSetUp(part, ground);
  return setUp.kind === 'refused' ? setUp.problems : [];
}

describe('partSetUp', () => {
  it('works out a tube inside: inner diameter to enter, its wrap, mirrored', () => {
    const setUp = partSetUp({ ...TUBE, side: 'inside' }, GROUND);
    expect(setUp).toMatchObject({ kind: 'worked out', isMirrored: true });
    const numbers = numbersOf({ ...TUBE, side: 'inside' });
    expect(numbers.rotaryDiameter).toBe(16);
    expect(numbers.wrapLength).toBeCloseTo(50.265482, 6);
  });

  it('gives the same part the same numbers, typed in millimetres or in inch', () => {
    const metric = numbersOf({ ...TUBE, diameter: mm(25.4), wall: mm(2.54), length: mm(50.8), artworkHeight: mm(12.7) });
    const inches = numbersOf({ ...TUBE, diameter: inch(1), wall: inch(0.1), length: inch(2), artworkHeight: inch(0.5), shownIn: 'in' });
    expect(inches).toEqual(metric);
  });

  it('leaves lengths out that the shape does not use', () => {
    const rod: EnteredPart = { ...TUBE, shape: 'cylinder', wall: mm(50), smallDiameter: mm(-3) };
    expect(numbersOf(rod).rotaryDiameter).toBe(20);
  });

  it('gives the reason instead of a strip where the beam is not known, and the wrap all the same', () => {
    const spot = { wavelengthNm: 1064, focalLengthMm: 160, beamDiameterMm: { unknownBecause: 'the beam diameter is not known' }, m2: 1.5 };
    const setUp = partSetUp(TUBE, { ...GROUND, spot });
    const strip = setUp.kind === 'worked out' ? setUp.numbers.find(({ key }) => key === 'stripWidth') : undefined;
    expect(strip).toMatchObject({ missingBecause: 'the beam diameter is not known' });
    expect(numbersOf(TUBE, { ...GROUND, spot }).wrapLength).toBeCloseTo(62.831853, 6);
  });

  it('allows more to a growth of the spot than to the same share of lost fluence', () => {
    const loss = numbersOf(TUBE).stripWidth ?? 0;
    const growth = numbersOf({ ...TUBE, allowance: 'spot growth' }).stripWidth ?? 0;
    expect(growth).toBeGreaterThan(loss);
  });

  it('refuses a part no wider than the spot of the lens, with both widths and the way out', () => {
    const wire: EnteredPart = { ...TUBE, shape: 'cylinder', diameter: mm(0.04), artworkHeight: mm(1) };
    expect(problemsOf(wire)).toEqual([
      {
        field: 'diameter',
        detail:
          'This part is too small for this lens: 0.04 mm of it can be marked at once, and the spot alone is 0.04 mm wide. Take a lens of shorter focal length.',
      },
    ]);
    expect(problemsOf({ ...wire, diameter: mm(0.4) })).toEqual([]);
  });

  it('refuses fewer index steps than the focus asks for, and says how many it takes', () => {
    const least = numbersOf(TUBE).leastIndexSteps ?? 0;
    expect(least).toBeGreaterThan(2);
    // 20 mm across: without turning at all, half a turn of artwork cannot stay in focus.
    expect(problemsOf({ ...TUBE, artworkWidth: mm(30), indexSteps: 1 })[0]?.detail).toMatch(/too small for 1 index step with this lens/);
    expect(problemsOf({ ...TUBE, indexSteps: least - 1 })).toEqual([
      {
        field: 'indexSteps',
        detail: expect.stringMatching(new RegExp(`too small for ${least - 1} index steps.*Take at least ${least}, `)),
      },
    ]);
    expect(numbersOf({ ...TUBE, indexSteps: least + 3 }).indexSteps).toBe(least + 3);
  });

  it('refuses so many index steps that a strip is narrower than the spot', () => {
    expect(problemsOf({ ...TUBE, indexSteps: 5000 })[0]).toMatchObject({
      field: 'indexSteps',
      detail: expect.stringMatching(/^The part is too small for 5000 index steps: .*no wider than the spot of 0.04 mm\.$/),
    });
  });

  it.each<[string, EnteredPart, string, RegExp]>([
    ['the inside of a solid part', { ...TUBE, shape: 'cylinder', side: 'inside' }, 'side', /has no inside/],
    ['a wall of half the diameter', { ...TUBE, wall: mm(10) }, 'wall', /thinner than half the diameter, 10 mm/],
    ['a missing diameter', { ...TUBE, diameter: undefined } as unknown as EnteredPart, 'diameter', /^Enter the outside diameter/],
    ['a diameter of zero', { ...TUBE, diameter: mm(0) }, 'diameter', /must be above zero/],
    ['a cone that narrows the wrong way', { ...CONE, smallDiameter: mm(90) }, 'smallDiameter', /wider than the large end/],
    ['a cone without taper', { ...CONE, smallDiameter: mm(80) }, 'largeDiameter', /no cone/],
    ['artwork longer than the part', { ...TUBE, artworkHeight: mm(61) }, 'artworkHeight', /surface is long, 60 mm/],
    [
      'artwork higher than the field',
      { ...TUBE, length: mm(300), artworkHeight: mm(120) },
      'artworkHeight',
      /field of this lens is 110 mm/,
    ],
    ['artwork twice round and more', { ...TUBE, artworkWidth: mm(126) }, 'artworkWidth', /more than twice round/],
    ['a gap as long as the turn', { ...TUBE, seam: mm(-63) }, 'seam', /shorter than a whole turn, 62.83 mm/],
    ['an allowance of nothing', { ...TUBE, allowancePercent: 0 }, 'allowancePercent', /0.1 to 90 %/],
    ['an edge along the beam', { ...TUBE, steepestEdgeDeg: 90 }, 'steepestEdgeDeg', /1 to 85/],
    ['half an index step', { ...TUBE, indexSteps: 1.5 }, 'indexSteps', /whole number/],
    ['index steps finer than the motor’s', { ...TUBE, indexSteps: 400, stepsPerTurn: 200 }, 'indexSteps', /cannot be finer/],
    ['a part longer than any', { ...TUBE, length: inch(200) }, 'length', /at most 196.9 in/],
  ])('refuses %s at its field', (_what, part, field, words) => {
    expect(problemsOf(part)).toEqual([{ field, detail: expect.stringMatching(words) }]);
  });

  it('names every missing length at once', () => {
    const bare: EnteredPart = {
      shape: 'ring',
      side: 'inside',
      allowance: 'fluence loss',
      allowancePercent: 10,
      focusAt: 'mid',
      shownIn: 'mm',
    };
    expect(problemsOf(bare).map(({ field }) => field)).toEqual(['diameter', 'wall', 'length', 'artworkHeight']);
  });

  it('tells widths in inch to who reads inch', () => {
    expect(problemsOf({ ...TUBE, wall: mm(10), shownIn: 'in' })[0]?.detail).toMatch('0.3937 in');
  });
});
