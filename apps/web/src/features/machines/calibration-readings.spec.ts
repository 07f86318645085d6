import { readReadings } from './calibration-readings';

describe('readReadings', () => {
  it('gives the readings of a rising table', () => {
    expect(readReadings('0 0\n50 5\n100 5', 'en-GB')).toEqual({
      points: [
        { percent: 0, watts: 0 },
        { percent: 50, watts: 5 },
        { percent: 100, watts: 5 },
      ],
    });
  });

  it('names the pair whose watts fall or whose percentage stays', () => {
    expect(readReadings('0 0\n50 5\n60 4', 'en-GB').message).toContain('Readings 2 and 3 (50 % 5 W; 60 % 4 W): the watts must not fall');
    expect(readReadings('0 0\n50 5\n50 6', 'en-GB').message).toContain('the percentage must rise');
  });

  it('counts what is there when there are too few', () => {
    expect(readReadings('0 0\n50 5', 'en-GB').message).toBe('Enter at least 3 readings; there are 2.');
  });

  it('refuses a percentage beyond 100', () => {
    expect(readReadings('0 0\n50 5\n120 6', 'en-GB').message).toMatch(/^Reading 3 is impossible/);
  });
});
