import fc from 'fast-check';
import { depthForFluenceLoss } from './depth-for-fluence-loss';
import { depthForSpotGrowth } from './depth-for-spot-growth';
import { focusReach } from './focus-reach';
import { spotDiameterAtOffset } from './spot-diameter-at-offset';

const share = fc.double({ min: 0.01, max: 0.9, noNaN: true });
const rayleigh = fc.double({ min: 0.05, max: 20, noNaN: true });
const offset = fc.double({ min: -40, max: 40, noNaN: true });

describe('focusReach', () => {
  it('is half of the depth of focus to either side when the surface lies in focus', () => {
    fc.assert(
      fc.property(rayleigh, share, (zR, part) => {
        const grown = focusReach(zR, 0, (1 + part) ** 2);
        const lost = focusReach(zR, 0, 1 / (1 - part));
        expect(grown.awayFromLensMm / depthForSpotGrowth(zR, part)).toBeCloseTo(0.5, 9);
        expect(lost.awayFromLensMm / depthForFluenceLoss(zR, part)).toBeCloseTo(0.5, 9);
        expect(grown.towardsLensMm / grown.awayFromLensMm).toBeCloseTo(1, 12);
      }),
    );
  });

  it('ends where the area of the spot has changed by the factor, and stays within it before', () => {
    fc.assert(
      fc.property(rayleigh, offset, share, (zR, at, part) => {
        const factor = 1 + part;
        const areaAt = (z: number) => spotDiameterAtOffset(30, zR, z) ** 2;
        const reach = focusReach(zR, at, factor);
        for (const [way, sign] of [
          [reach.awayFromLensMm, 1],
          [reach.towardsLensMm, -1],
        ] as const) {
          const change = areaAt(at + sign * way) / areaAt(at);
          expect(Math.max(change, 1 / change) / factor).toBeCloseTo(1, 6);
          for (const before of [0.25, 0.5, 0.9]) {
            const within = areaAt(at + sign * way * before) / areaAt(at);
            expect(Math.max(within, 1 / within)).toBeLessThanOrEqual(factor * (1 + 1e-9));
          }
        }
      }),
    );
  });

  it('turns round with the sign of the offset', () => {
    const below = focusReach(1, 2, 1.2);
    const above = focusReach(1, -2, 1.2);
    expect(above).toEqual({ towardsLensMm: below.awayFromLensMm, awayFromLensMm: below.towardsLensMm });
  });

  it('refuses a factor that allows no change', () => {
    expect(() => focusReach(1, 0, 1)).toThrow('areaFactor must be above 1, but is 1');
  });
});
