import type { EnteredPart } from './entered-part';
import { type PartOpticsFacts, partGround } from './part-ground';
import { partResults } from './part-results';
import { partSetUp } from './part-set-up';

const FACTS: PartOpticsFacts = {
  ...{ wavelengthNm: 1064, m2: 1.4, beamDiameterMm: 7, focalLengthMm: 160, fieldSizeMm: 110, measuredSpotUm: null },
  focusOffsetsMm: [],
};
const ROD: EnteredPart = {
  ...{ shape: 'cylinder', side: 'outside', allowance: 'fluence loss', allowancePercent: 10, focusAt: 'mid', shownIn: 'mm' },
  ...{ diameter: { value: 20, unit: 'mm' }, length: { value: 60, unit: 'mm' }, artworkHeight: { value: 10, unit: 'mm' } },
};

function numbersOf(facts: PartOpticsFacts) {
  const setUp = partSetUp(ROD, partGround(facts));
  if (setUp.kind === 'refused') throw new RangeError(JSON.stringify(setUp.problems));
  return new Map(partResults(setUp).numbers.map((number) => [number.key, number]));
}

describe('the ground of a part', () => {
  it('computes the spot from the beam and the lens: 4 M² λ f / (π D)', () => {
    // 4 x 1.4 x 1.064 um x 160 mm / (pi x 7 mm)
    expect(numbersOf(FACTS).get('focalSpot')?.value).toBeCloseTo(43.35, 2);
  });

  it('takes a measured spot before a computed one', () => {
    expect(numbersOf({ ...FACTS, measuredSpotUm: 51 }).get('focalSpot')?.value).toBe(51);
    expect(numbersOf({ ...FACTS, measuredSpotUm: 51, beamDiameterMm: null }).get('stripWidth')?.value).toBeGreaterThan(0);
  });

  it.each([
    ['M²', { m2: null, measuredSpotUm: 51 }, 'the beam’s M² is not recorded; add it to the machine'],
    ['the beam diameter', { beamDiameterMm: null }, 'the beam diameter at the lens is not recorded; add it to the machine'],
  ])('keeps the reason in the place of each number that needs %s', (_what, missing, because) => {
    const numbers = numbersOf({ ...FACTS, ...missing });
    expect(numbers.get('stripWidth')).toMatchObject({ value: null, missingBecause: because, isRuledOutByMode: false, inputs: {} });
    expect(numbers.get('rotaryDiameter')).toMatchObject({ value: 20, missingBecause: null });
  });
});

describe('the results of a part', () => {
  it('survive the way through JSON unchanged', () => {
    const setUp = partSetUp(ROD, partGround(FACTS));
    if (setUp.kind === 'refused') throw new RangeError('refused');
    const results = partResults(setUp);
    expect(JSON.parse(JSON.stringify(results))).toEqual(results);
  });
});
