import { containsText } from './contains-text';

describe('containsText()', () => {
  it.each([
    ['bezel', '%bezel%'],
    ['50%', String.raw`%50\%%`],
    ['a_b', String.raw`%a\_b%`],
    [String.raw`C:\x`, String.raw`%C:\\x%`],
  ])('finds %s as it is typed', (typed, pattern) => expect(containsText(typed)).toBe(pattern));
});
