import { hasBegun, isDay } from './is-day';

describe('isDay()', () => {
  it.each(['2026-05-14', '2028-02-29', '0001-01-01'])('takes %s', (text) => expect(isDay(text)).toBe(true));

  it.each(['2026-02-30', '2027-02-29', '2026-13-01', '14.05.2026', '2026-5-14', '2026-05-14T00:00:00Z', ''])('refuses %j', (text) =>
    expect(isDay(text)).toBe(false),
  );
});

describe('hasBegun()', () => {
  const now = new Date('2026-05-14T11:00:00Z');

  it('takes today wherever the shop is, and every day before', () => {
    expect(hasBegun('2026-05-15', now)).toBe(true);
    expect(hasBegun('2020-01-01', now)).toBe(true);
  });

  it('refuses a day to come', () => {
    expect(hasBegun('2026-05-16', now)).toBe(false);
    expect(hasBegun('2031-01-01', now)).toBe(false);
  });
});
