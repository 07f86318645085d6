import type { FrequencyInterval } from '@proofplate/recipe-model';
import { intervalScale, intervalWords } from './interval-scale';

const interval = (given: Partial<FrequencyInterval> = {}): FrequencyInterval => ({
  ...{ lowestKhz: 20, highestKhz: 53.333333, isEmpty: false, endsBy: 'rated power', rangeFromKhz: 20, rangeToKhz: 100, sourceKhz: 40 },
  calibrated: [{ fromKhz: 36, toKhz: 44, calibrationId: 'a', measuredOn: '2026-08-17' }],
  ...given,
});

describe('intervalScale()', () => {
  it('draws a narrow range evenly and a wide one by ratio', () => {
    const even = intervalScale({ rangeFromKhz: 20, rangeToKhz: 100 });
    expect([even.isByRatio, even.at(20), even.at(60), even.at(100)]).toEqual([false, 0, 0.5, 1]);
    const wide = intervalScale({ rangeFromKhz: 1, rangeToKhz: 1000 });
    expect(wide.isByRatio).toBe(true);
    expect(wide.at(10)).toBeCloseTo(1 / 3, 12);
  });

  it('keeps what lies outside at the ends', () => {
    const { at } = intervalScale({ rangeFromKhz: 20, rangeToKhz: 100 });
    expect([at(17), at(300)]).toEqual([0, 1]);
  });
});

describe('intervalWords()', () => {
  it('says what the drawing shows', () => {
    expect(intervalWords(interval(), 'Bench 2', 40)).toBe(
      'Frequencies of Bench 2, 20 to 100 kHz. The numbers are kept from 20 to 53.33 kHz, where the rated power ends it. ' +
        'A power table holds from 36 to 44 kHz. The source runs at 40 kHz. Chosen: 40 kHz.',
    );
  });

  it('says that there is none, and that no table holds', () => {
    const none = interval({ isEmpty: true, highestKhz: 17.777, calibrated: [] });
    expect(intervalWords(none, 'Bench 2', undefined)).toContain('No frequency keeps the numbers: the rated power ends at 17.78 kHz.');
    const tooStrong = interval({ isEmpty: true, calibrated: [] });
    expect(intervalWords(tooStrong, 'Bench 2', undefined)).toContain('the pulses would have to be stronger than the machine gives');
    expect(intervalWords(interval({ calibrated: [] }), 'Bench 2', undefined)).toContain('No power table holds in it.');
  });
});
