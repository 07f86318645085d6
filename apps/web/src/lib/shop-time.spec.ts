import { dayInZone, instantInZone } from './shop-time';

describe('instantInZone', () => {
  // Offsets as the IANA time zone database gives them: London UTC+1 in May and UTC in January, Kathmandu UTC+5:45 all year.
  it.each([
    ['2026-05-14T07:40', 'Europe/London', '2026-05-14T06:40:00.000Z'],
    ['2026-01-14T07:40', 'Europe/London', '2026-01-14T07:40:00.000Z'],
    ['2026-01-14T07:40', 'Asia/Kathmandu', '2026-01-14T01:55:00.000Z'],
  ])('reads %s by the clock of %s', (wallTime, timeZone, instant) => {
    expect(instantInZone(wallTime, timeZone)).toBe(instant);
  });

  // In 2026 the clocks of the European Union go forward at 01:00 UTC on 29 March.
  it('takes the offset of that very hour on the day of a change of the clock', () => {
    expect(instantInZone('2026-03-29T01:30', 'Europe/Berlin')).toBe('2026-03-29T00:30:00.000Z');
    expect(instantInZone('2026-03-29T03:30', 'Europe/Berlin')).toBe('2026-03-29T01:30:00.000Z');
  });

  it('gives nothing for what is no time', () => {
    expect(instantInZone('tomorrow', 'Europe/London')).toBeUndefined();
  });
});

it.each([
  ['2026-05-14T22:30:00Z', 'Europe/Berlin', '2026-05-15'],
  ['2026-05-14T02:30:00Z', 'America/New_York', '2026-05-13'],
])('%s is a day of the calendar in %s: %s', (at, timeZone, day) => {
  expect(dayInZone(new Date(at), timeZone)).toBe(day);
});
