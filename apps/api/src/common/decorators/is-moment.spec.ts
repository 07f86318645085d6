import { isMoment } from './is-moment';

describe('isMoment()', () => {
  it.each(['2026-05-14T08:30:00Z', '2026-05-14T08:30Z', '2026-05-14T08:30:00.123+02:00', '2028-02-29T23:59:59-11:00'])('takes %s', (text) =>
    expect(isMoment(text)).toBe(true),
  );

  it.each([
    ['a day', '2026-05-14'],
    ['a time of no zone', '2026-05-14T08:30:00'],
    ['a week', '2026-W10-3'],
    ['an ordinal day', '2026-200'],
    ['a decimal comma', '2026-05-14T08:30:00,5Z'],
    ['a day that is not', '2026-02-30T08:30:00Z'],
    ['an hour that is not', '2026-05-14T25:00:00Z'],
    ['nothing', ''],
  ])('refuses %s', (_, text) => expect(isMoment(text)).toBe(false));
});
