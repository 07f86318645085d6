import { qrModules } from './sheet-code';

const FINDER_PATTERN = ['1111111', '1000001', '1011101', '1011101', '1011101', '1000001', '1111111'];

describe('qrModules()', () => {
  it('is a square symbol with its finder pattern in three corners', () => {
    const rows = qrModules('https://proofs.example.invalid/machine?recipe=0190');
    expect(new Set(rows.map((row) => row.length))).toEqual(new Set([rows.length]));
    expect(rows.slice(0, 7).map((row) => row.slice(0, 7))).toEqual(FINDER_PATTERN);
    expect(rows.slice(0, 7).map((row) => row.slice(-7))).toEqual(FINDER_PATTERN);
    expect(rows.slice(-7).map((row) => row.slice(0, 7))).toEqual(FINDER_PATTERN);
  });

  it('differs for another address', () => {
    expect(qrModules('https://a.example/1')).not.toEqual(qrModules('https://a.example/2'));
  });
});
