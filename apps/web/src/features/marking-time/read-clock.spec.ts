import { readClock } from './read-clock';

describe('readClock()', () => {
  it('reads seconds, minutes and seconds, and hours before them', () => {
    const seconds = (text: string, locale = 'en-GB') => readClock(text, locale);
    expect([seconds('130'), seconds('12.4 s'), seconds('12,4', 'de-DE')]).toEqual([{ value: 130 }, { value: 12.4 }, { value: 12.4 }]);
    expect([seconds('2:10'), seconds('2:10.5'), seconds('2 min 10 s'), seconds('3 min')]).toEqual([
      ...[{ value: 130 }, { value: 130.5 }, { value: 130 }, { value: 180 }],
    ]);
    expect(seconds('1:02:10')).toEqual({ value: 3730 });
  });

  it('refuses what can be read in two ways, seconds above 59 and no time at all', () => {
    for (const text of ['', '1,500', '2:75', '0', '0:00', '2:10,5', 'soon']) expect(readClock(text, 'en-GB')).toHaveProperty('message');
  });
});
