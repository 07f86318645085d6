import { fieldNameFromPointer } from './form-problem';

describe('the field that a pointer names', () => {
  it.each([
    ['#/email', 'email'],
    ['#/factors/0/from', 'factors.0.from'],
    ['/policy/reviewEveryDays', 'policy.reviewEveryDays'],
    ['#/a~1b/c~0d', 'a/b.c~d'],
    ['#/caf%C3%A9', 'café'],
  ])('is read from %s', (pointer, name) => {
    expect(fieldNameFromPointer(pointer)).toBe(name);
  });
});
