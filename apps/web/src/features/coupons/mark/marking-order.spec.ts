import type { Panel } from '@proofplate/recipe-model';
import { setShopStyle } from '../../../lib/format';
import type { CouponCell, ParameterSet } from '../coupons.api';
import { cellSetBefore, currentCell, dialRows, inRunOrder, lastDone, notOnPanel } from './marking-order';

const panel: Panel = {
  fields: [
    { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s' },
    { parameter: 'powerPercent', label: 'PWR', unit: 'percentFromZero' },
  ],
};
const set = (speed: number, power: number): ParameterSet => ({
  values: {
    speedMmPerS: { entered: { value: speed, unit: 'mm/s' }, physical: speed },
    powerPercent: { entered: { value: power, unit: 'percentFromZero' }, physical: power },
  },
  fill: 'both directions',
  assist: 'none',
  power: { watts: 1, basis: 'calibration' },
});
const cell = (runOrder: number, markState: CouponCell['markState'], markedAt: string | null = null) =>
  ({ id: `c${runOrder}`, address: `A${runOrder}`, runOrder, markState, markedAt, parameters: set(100 * runOrder, 20) }) as CouponCell;

describe('the order of marking', () => {
  const ordered = inRunOrder({
    cells: [cell(3, 'planned'), cell(1, 'marked', '2026-05-14T08:00:00Z'), cell(2, 'skipped', '2026-05-14T08:01:00Z'), cell(4, 'planned')],
  });

  it('goes on at the first cell that nothing was said of', () => {
    expect(ordered.map(({ runOrder }) => runOrder)).toEqual([1, 2, 3, 4]);
    expect(currentCell(ordered)?.id).toBe('c3');
    expect(currentCell([cell(1, 'marked')])).toBeUndefined();
  });

  it('compares with the last cell that was really marked, since a skipped one was not', () => {
    expect(cellSetBefore(ordered, cell(3, 'planned'))?.id).toBe('c1');
    expect(cellSetBefore(ordered, cell(1, 'planned'))).toBeUndefined();
  });

  it('takes the latest act back, not the last in the order', () => {
    expect(lastDone(ordered)?.id).toBe('c2');
    const again = [cell(1, 'marked', '2026-05-14T09:00:00Z'), cell(2, 'marked', '2026-05-14T08:01:00Z')];
    expect(lastDone(again)?.id).toBe('c1');
  });
});

describe('dialRows()', () => {
  it('stands in the order of the panel and names what changes', () => {
    expect(dialRows(panel, set(800, 20), set(400, 20)).map(({ key, value, unit, before }) => [key, value, unit, before])).toEqual([
      ['speedMmPerS', '800', 'mm/s', '400'],
      ['powerPercent', '20', '%', undefined],
    ]);
  });

  it('calls nothing a change for the first cell, nor the same quantity in another unit', () => {
    expect(dialRows(panel, set(800, 20)).every(({ before }) => before === undefined)).toBe(true);
    const metres = set(0, 20);
    metres.values.speedMmPerS = { entered: { value: 0.8, unit: 'm/s' }, physical: 800 };
    expect(dialRows(panel, metres, set(800, 20))[0]).toMatchObject({ value: '800', before: undefined });
  });

  it('names values that the panel cannot take', () => {
    const extra = set(1, 1);
    extra.values.pulseWidthNs = { entered: { value: 30, unit: 'ns' }, physical: 30 };
    expect(notOnPanel(panel, extra)).toEqual(['Pulse width']);
  });
});

describe('the numerals of the dial', () => {
  afterEach(() => setShopStyle(undefined));

  it('are written as the shop writes numbers, beside what stood there before', () => {
    setShopStyle({ locale: 'de-DE', unitSystem: 'metric' });
    const [speed, power] = dialRows(panel, set(0.05, 12.5), set(0.05, 7.5));
    expect([speed?.value, power?.value, power?.before]).toEqual(['0,05', '12,5', '7,5']);
  });
});
