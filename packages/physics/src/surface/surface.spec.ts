import { expectReferences } from '../../test/expect-reference';
import { CROSS_CUT_CLASSES, crossCutClass } from './cross-cut-class';
import { type ProfileRoughness, profileRoughness } from './profile-roughness';
import { sineRoughness } from './sine-roughness';

const keyed = ({ raUm, rqUm, rtUm }: ProfileRoughness) => ({ Ra: raUm, Rq: rqUm, Rt: rtUm });

describe('profileRoughness', () => {
  expectReferences<{ z_um: readonly number[] }>('profile roughness of a short levelled profile', ({ z_um }) =>
    keyed(profileRoughness(z_um)),
  );

  it('comes to the roughness of a sine on a sampled sine, wherever its mean line lies', () => {
    const heights = Array.from({ length: 3600 }, (_height, index) => 7 + 1.5 * Math.sin((index * Math.PI) / 180));
    const sampled = profileRoughness(heights);
    const exact = sineRoughness(1.5);
    expect(sampled.raUm).toBeCloseTo(exact.raUm, 4);
    expect(sampled.rqUm).toBeCloseTo(exact.rqUm, 9);
    expect(sampled.rtUm).toBeCloseTo(exact.rtUm, 9);
  });

  it('refuses a single height and names one that is not a number', () => {
    expect(() => profileRoughness([1])).toThrow('heightsUm must have at least 2 heights, but has 1');
    expect(() => profileRoughness([1, Number.NaN])).toThrow('heightsUm[1] must be a finite number, but is NaN');
  });
});

describe('sineRoughness', () => {
  expectReferences<{ A_um: number }>('profile roughness of a sine', ({ A_um }) => keyed(sineRoughness(A_um)));

  it('refuses a negative amplitude', () => {
    expect(() => sineRoughness(-1)).toThrow('amplitudeUm must be a finite number of at least 0, but is -1');
  });
});

describe('crossCutClass', () => {
  expectReferences<{ percent: number }>('cross-cut adhesion class from percent area removed', ({ percent }) => {
    const { astm, iso } = crossCutClass(percent);
    return { ASTM_D3359_B: astm, ISO_2409: iso };
  });

  it.each([5, 15, 35, 65])('asks for the class at exactly %i %%, where the standards word the limit differently', (limit) => {
    expect(() => crossCutClass(limit)).toThrow(`but is ${limit}: enter the class`);
    expect(crossCutClass(limit + 0.1).iso - crossCutClass(limit - 0.1).iso).toBe(1);
  });

  it('knows six classes of both standards and refuses more than all of the area', () => {
    expect(CROSS_CUT_CLASSES.map(({ astm, iso }) => `${astm}/${iso}`)).toEqual(['5B/0', '4B/1', '3B/2', '2B/3', '1B/4', '0B/5']);
    expect(crossCutClass(100).astm).toBe('0B');
    expect(() => crossCutClass(100.1)).toThrow('removedPercent must be at most 100, but is 100.1');
    expect(() => crossCutClass(-1)).toThrow('removedPercent must be a finite number of at least 0, but is -1');
  });
});
