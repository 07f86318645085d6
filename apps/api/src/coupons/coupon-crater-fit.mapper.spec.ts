import type { CraterFit } from '@proofplate/recipe-model';
import { type PlaceNow, whyNotSavable } from './coupon-crater-fit.mapper';

const FOUND: CraterFit = {
  ...{ points: [], series: { pulses: 1, pulseWidthNs: 8, focusOffsetMm: 0 }, pointCount: 9 },
  ...{ fit: null, refusedBecause: null, remarks: [], incubation: null },
};
const SPOT = { diameterUm: 38.4, standardErrorUm: 0.6, method: 'Crater widths of C-0012, n = 9', measuredOn: '2026-11-20' };
const PLACE: PlaceNow = {
  ...{ machineId: 'm', machineName: 'Bench 2', lensId: 'l', lensName: 'F160', version: 1 },
  ...{ measuredSpotUm: 36, spotMethod: 'Knife edge', spotMeasuredOn: '2026-01-13', physicalNumber: 1, isArchived: false },
};

describe('whyNotSavable()', () => {
  it('lets a spot in focus of the machine as it is through', () => {
    expect(whyNotSavable({ found: FOUND, spot: SPOT, place: PLACE }, 1)).toBeNull();
    const other = { ...PLACE, measuredSpotUm: 38.4 };
    expect(whyNotSavable({ found: FOUND, spot: SPOT, place: other }, 1)).toBeNull();
  });

  it.each([
    ['a plate out of focus', { found: { ...FOUND, series: { pulses: 1, pulseWidthNs: 8, focusOffsetMm: 2 } } }, 'marked 2 mm out of focus'],
    ['a machine that was changed since', { place: { ...PLACE, physicalNumber: 2 } }, 'was changed since the plate was marked'],
    ['an archived machine', { place: { ...PLACE, isArchived: true } }, 'The machine is archived'],
    ['a lens that is not on the machine', { place: undefined }, 'This lens is not on the machine'],
    ['a spot that no lens makes', { spot: { ...SPOT, diameterUm: 0.3 } }, 'lies outside 0.5 to 5000 µm'],
    ['what is saved already', { place: { ...PLACE, measuredSpotUm: 38.4, spotMethod: SPOT.method } }, 'It is the measured spot already.'],
    [
      'craters without a line',
      { found: { ...FOUND, series: null, refusedBecause: '4 craters can be used' }, spot: null },
      '4 craters can be used',
    ],
  ])('refuses %s', (_, changed, reason) => {
    expect(whyNotSavable({ found: FOUND, spot: SPOT, place: PLACE, ...changed }, 1)).toContain(reason);
  });
});
