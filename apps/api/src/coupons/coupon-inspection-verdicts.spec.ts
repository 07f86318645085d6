import type { Criterion } from '@proofplate/recipe-model';
import { cellVerdicts, countingIdsOf, countingMeasurement, type JudgedMeasurement } from './coupon-inspection-verdicts';

const DARK: Criterion = { quantity: 'lightness', comparison: 'at most', value: 30, unit: '1' };
const STRONG: Criterion = { quantity: 'contrast', comparison: 'at least', value: 0.6, unit: '1' };
const NO_MEASUREMENTS: JudgedMeasurement[] = [];

let count = 0;
function measured(cellId: string, quantity: string, value: number, given: Partial<JudgedMeasurement> = {}): JudgedMeasurement {
  count += 1;
  const measuredAt = new Date(Date.UTC(2026, 4, 13, 9, count));
  return { id: `m${count}`, cellId, quantity, value, method: 'colorimeter', measuredAt, supersedesId: null, ...given };
}

describe('cells against the criteria', () => {
  it('meet them only when every criterion is measured and met, and name the one that fails', () => {
    const verdicts = cellVerdicts(['a', 'b', 'c'], {
      criteria: [DARK, STRONG],
      ratings: [],
      measurements: [
        measured('a', 'lightness', 30),
        measured('a', 'contrast', 0.6),
        measured('b', 'lightness', 30.1),
        measured('c', 'lightness', 20),
      ],
    });
    expect(verdicts.map(({ meets }) => meets)).toEqual([true, false, null]);
    expect(verdicts[1]?.results).toEqual([
      { criterion: 'Lightness at most 30', value: 30.1, meets: false },
      { criterion: 'Contrast to the bare ground at least 0.6', value: null, meets: null },
    ]);
  });

  it('rank before one that is not measured, and that before one that fails; then ratings decide and equal ones share a place', () => {
    const verdicts = cellVerdicts(['fails', 'open', 'low', 'high', 'twin', 'bare'], {
      criteria: [DARK],
      ratings: [
        { cellId: 'fails', rating: 5 },
        { cellId: 'open', rating: 5 },
        { cellId: 'low', rating: 3 },
        { cellId: 'high', rating: 4 },
        { cellId: 'twin', rating: 3 },
        { cellId: 'twin', rating: 5 },
        { cellId: 'bare', rating: null },
      ],
      measurements: ['low', 'high', 'twin'].map((id) => measured(id, 'lightness', 20)).concat(measured('fails', 'lightness', 50)),
    });
    expect(verdicts.map(({ cellId, rank }) => [cellId, rank])).toEqual([
      ['fails', 5],
      ['open', 4],
      ['low', 3],
      ['high', 1],
      ['twin', 1],
      ['bare', null],
    ]);
  });

  it('have no verdict without criteria, but a place by their ratings', () => {
    const [verdict] = cellVerdicts(['a'], { criteria: [], ratings: [{ cellId: 'a', rating: 2 }], measurements: NO_MEASUREMENTS });
    expect(verdict).toEqual({ cellId: 'a', meanRating: 2, meets: null, results: [], rank: 1 });
  });

  it('are judged by what stands: a superseded value no longer counts', () => {
    const wrong = measured('a', 'lightness', 12);
    const right = measured('a', 'lightness', 55, { supersedesId: wrong.id });
    const [verdict] = cellVerdicts(['a'], { criteria: [DARK], ratings: [], measurements: [wrong, right] });
    expect(verdict?.results[0]).toMatchObject({ value: 55, meets: false });
  });
});

describe('the measurement that counts', () => {
  it('is an instrument’s rather than an estimate from a photo, and then the newest', () => {
    const first = measured('a', 'lightness', 30);
    const second = measured('a', 'lightness', 31);
    const photo = measured('a', 'lightness', 20, { method: 'photo' });
    expect(countingMeasurement([second, photo, first], 'lightness')).toBe(second);
    expect(countingMeasurement([photo], 'lightness')).toBe(photo);
    expect(countingMeasurement([photo], 'depth')).toBeUndefined();
  });

  it('is one per cell and quantity, and none of those that were superseded', () => {
    const wrong = measured('a', 'lightness', 12);
    const right = measured('a', 'lightness', 55, { supersedesId: wrong.id });
    const depth = measured('a', 'depth', 9);
    const other = measured('b', 'lightness', 20, { method: 'photo' });
    expect([...countingIdsOf([wrong, depth, right, other])].sort()).toEqual([right.id, depth.id, other.id].sort());
  });
});
