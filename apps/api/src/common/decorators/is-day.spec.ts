import { isDay } from './is-day';

describe('isDay()', () => {
  it.each(['2026-05-14', '2028-02-29', '0001-01-01'])('takes %s', (text) => expect(isDay(text)).toBe(true));

  it.each(['2026-02-30', '2027-02-29', '2026-13-01', '14.05.2026', '2026-5-14', '2026-05-14T00:00:00Z', ''])('refuses %j', (text) =>
    expect(isDay(text)).toBe(false),
  );
});
