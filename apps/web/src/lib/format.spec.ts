import {
  formatClock,
  formatCount,
  formatDate,
  formatDuration,
  formatNumber,
  formatPercentChange,
  formatQuantity,
  formatSize,
  formatTime,
  formatUnit,
} from './format';

describe('numbers', () => {
  it('carry a true minus, a sign where asked, and their unit behind a space that does not break', () => {
    expect(formatNumber(-17)).toBe('−17');
    expect(formatQuantity(0.5, 'mm', { decimals: 1, isSigned: true })).toBe('+0.5\u00A0mm');
    expect(formatQuantity(0.03, 'mm', { decimals: 3 })).toBe('0.030\u00A0mm');
    expect(formatQuantity(1, '')).toBe('1');
  });

  it('follow the shop’s decimal sign and never group thousands', () => {
    expect(formatNumber(1234.5, { locale: 'de-DE' })).toBe('1234,5');
    expect(formatNumber(1234.5, { locale: 'en-GB' })).toBe('1234.5');
  });

  it('print units as people write them', () => {
    expect(['um', 'uJ', 'J/cm^2', 'mm/s', 'mm^3'].map(formatUnit)).toEqual(['µm', 'µJ', 'J/cm²', 'mm/s', 'mm³']);
  });

  it('show sizes, changes, counts and durations', () => {
    expect(formatSize(81, 72, 'mm')).toBe('81 × 72\u00A0mm');
    expect(formatPercentChange(-0.259)).toBe('−26\u00A0%');
    expect(formatPercentChange(0)).toBe('0\u00A0%');
    expect([formatCount(1, 'recipe'), formatCount(57, 'recipe')]).toEqual(['1 recipe', '57 recipes']);
    expect([733, 3900, 0].map(formatDuration)).toEqual(['12\u00A0min 13\u00A0s', '1\u00A0h 5\u00A0min', '0\u00A0s']);
  });
});

describe('times', () => {
  it('stand in the shop’s zone and name it', () => {
    expect(formatTime('2026-03-03T08:12:00Z', 'Europe/Berlin')).toBe('3 Mar 2026 09:12 CET');
    expect(formatTime('2026-05-14T22:30:00Z', 'Europe/Berlin')).toBe('15 May 2026 00:30 CEST');
    expect(formatClock('2026-05-14T22:30:00Z', 'UTC')).toBe('22:30');
  });

  it('write September like the other months, in three letters', () => {
    expect(formatDate('2026-09-30T12:00:00Z', 'UTC')).toBe('30 Sep 2026');
  });
});
