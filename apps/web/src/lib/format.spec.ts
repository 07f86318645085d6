import { makeSessionAnswer } from '../testing/sessions';
import {
  formatClock,
  formatCount,
  formatDate,
  formatDuration,
  formatEntered,
  formatNumber,
  formatPercentChange,
  formatQuantity,
  formatSize,
  formatTime,
  formatUnit,
  inShopNumbers,
} from './format';
import { closeSession, openSession, updateShop } from './session';

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

describe('the shop that is open', () => {
  const session = (locale: string) => ({ ...makeSessionAnswer(), shop: { ...makeSessionAnswer().shop, locale } });
  afterEach(() => closeSession('left'));

  it('decides the decimal sign of every number, without a word from the page', () => {
    openSession(session('de-DE'));
    expect([formatNumber(25.5), formatQuantity(176.5, 'mm'), formatSize(1.5, 2.25, 'mm')]).toEqual([
      '25,5',
      '176,5\u00A0mm',
      '1,5 × 2,25\u00A0mm',
    ]);
    expect(formatEntered(-0.05)).toBe('−0,05');
    expect(formatNumber(1234.5)).toBe('1234,5');
  });

  it('changes its way of writing at once, and leaves none behind', () => {
    openSession(session('de-DE'));
    updateShop({ name: 'Tidewater Marking', unitSystem: 'metric', timeZone: 'Europe/Berlin', locale: 'en-GB' });
    expect(formatNumber(1.5)).toBe('1.5');
    updateShop({ name: 'Tidewater Marking', unitSystem: 'metric', timeZone: 'Europe/Berlin', locale: 'de-DE' });
    closeSession('left');
    expect(formatNumber(1.5)).toBe('1.5');
  });

  it('writes the numbers of a computed sentence, and leaves names and addresses alone', () => {
    openSession(session('de-DE'));
    expect(inShopNumbers('At most 0.5 mm (0.25 to 1.75), by F163.5 and 1.2.3, in steps of 0.1.')).toBe(
      'At most 0,5 mm (0,25 to 1,75), by F163.5 and 1.2.3, in steps of 0,1.',
    );
  });
});
