import { couponArtworkSvg } from './coupon-artwork';
import { couponLayout } from './coupon-layout';

const layout = couponLayout({ rows: 2, columns: 3, reference: 'T1:<C-0042>&' });
const dataMatrixModules = Array.from({ length: 10 }, (_, row) => Array.from({ length: 10 }, (_, column) => row === 9 || column === 0));
const cells = ['A1', 'A2', 'A3', 'B1', 'B2', 'B3'].map((address, index) => ({ address, runOrder: 6 - index }));
const base = { layout, cells, code: 'C-0042', dataMatrixModules, polarity: 'dark on bright' } as const;

describe('couponArtworkSvg', () => {
  it('is drawn in millimetres at the size of the plate', () => {
    expect(couponArtworkSvg(base)).toContain('width="60mm" height="37.6mm" viewBox="0 0 60 37.6"');
  });

  it('names every group once', () => {
    const ids = [...couponArtworkSvg(base).matchAll(/ id="([^"]+)"/g)].map(([, id]) => id);
    expect(new Set(ids).size).toBe(ids.length);
    expect(ids).toEqual(
      expect.arrayContaining([
        'outline',
        'corner-marks',
        'fiducial-3',
        'row-letters',
        'column-numbers',
        'cells',
        'cell-B3',
        'code',
        'data-matrix',
      ]),
    );
  });

  it('writes the cells in run order', () => {
    const order = [...couponArtworkSvg(base).matchAll(/id="cell-(\w+)" data-run-order="(\d)"/g)].map(
      ([, address, run]) => `${run} ${address}`,
    );
    expect(order).toEqual(['1 B3', '2 B2', '3 B1', '4 A3', '5 A2', '6 A1']);
  });

  it('draws letters as strokes and needs no font', () => {
    const svg = couponArtworkSvg(base);
    expect(svg).not.toContain('<text');
    expect(svg.match(/<polyline/g)?.length).toBeGreaterThan(10);
  });

  it('escapes what comes from outside and stays the same for the same input', () => {
    const svg = couponArtworkSvg(base);
    expect(svg).toContain('reference T1:&lt;C-0042&gt;&amp;;');
    expect(couponArtworkSvg(base)).toBe(svg);
  });

  it('burns other modules for a mark that is brighter than the ground', () => {
    const path = (svg: string) => /id="fiducial-0" d="([^"]+)"/.exec(svg)?.[1];
    const bright = path(couponArtworkSvg({ ...base, polarity: 'bright on dark' }));
    expect(bright).toContain('M1.2 1.2h9.6');
    expect(bright).not.toBe(path(couponArtworkSvg(base)));
  });

  it.each([
    ['a cell that is not on the plate', { cells: [{ address: 'C1', runOrder: 1 }] }, /on the layout/],
    ['an address given twice', { cells: [cells[0], { address: 'A1', runOrder: 9 }] }, /once/],
    ['a run order given twice', { cells: [cells[0], { address: 'A2', runOrder: 6 }] }, /once/],
    ['run order 0', { cells: [{ address: 'A1', runOrder: 0 }] }, /whole run orders/],
    ['a code without glyphs', { code: 'c 42' }, /text must be/],
  ])('refuses %s', (_, wrong, message) => {
    expect(() => couponArtworkSvg({ ...base, ...wrong })).toThrow(message);
  });
});
