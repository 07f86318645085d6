import type { ComparisonRow } from './sign-offs.api';
import { whatChanges } from './what-changes';

type Side = Partial<ComparisonRow['values'][number]>;

function row(key: string, sides: [Side, Side], rest: Partial<ComparisonRow> = {}): ComparisonRow {
  const values = sides.map((side, index) => ({
    revisionId: `r${index}`,
    value: null,
    text: side.value === undefined ? null : String(side.value),
    missingBecause: null,
    change: index === 0 ? ('reference' as const) : ('changed' as const),
    size: null,
    ...side,
  }));
  return { group: 'entered', key, label: key, unit: 'mm/s', step: 1, isSame: false, values, ...rest };
}

describe('whatChanges', () => {
  it('gives both values, the percentage and a bar, in the order of the rows', () => {
    const { lines } = whatChanges({ rows: [row('speedMmPerS', [{ value: 270 }, { value: 200 }], { label: 'Speed' })] });
    expect(lines).toMatchObject([{ label: 'Speed', before: '270', after: '200', unit: 'mm/s', change: '−26\u00A0%', isLit: false }]);
    expect(lines[0]?.share).toBeCloseTo(-0.259, 3);
  });

  it('says for power the points of the panel and the watts at the work', () => {
    const size = { delta: -10, symbol: '%', percent: null, points: -10 };
    const { lines } = whatChanges({
      rows: [
        row('powerPercent', [{ value: 60 }, { value: 50, size }], { unit: '%' }),
        row('powerW', [{ value: 12.05 }, { value: 9.95 }], { group: 'work', unit: 'W' }),
      ],
    });
    expect(lines.map(({ key, note }) => [key, note])).toEqual([['entered 1 powerPercent', '10 points, 12.1 to 9.95\u00A0W']]);
  });

  it('lights a longer marking time', () => {
    const { lines } = whatChanges({ rows: [row('timePer100Mm2', [{ value: 31.1 }, { value: 50.4 }], { group: 'work', unit: 's' })] });
    expect(lines[0]).toMatchObject({ isLit: true, change: '+62\u00A0%' });
  });

  it('names what stays the same instead of showing it', () => {
    const { lines, same } = whatChanges({
      rows: [row('frequencyKhz', [{ value: 400 }, { value: 400 }], { label: 'Frequency', unit: 'kHz', isSame: true })],
    });
    expect(lines).toEqual([]);
    expect(same).toEqual(['frequency 400\u00A0kHz']);
  });

  it('says added and not known in words', () => {
    const { lines } = whatChanges({
      rows: [
        row('pulseWidthNs', [{}, { value: 60, change: 'added' }]),
        row('arealDose', [{ value: 3 }, { missingBecause: 'The line spacing is not known.', change: 'not comparable' }], { group: 'work' }),
      ],
    });
    expect(lines.map(({ before, after, change }) => [before, after, change])).toEqual([
      ['not set', '60', 'added'],
      ['3.00', 'not known', 'not comparable'],
    ]);
  });
});
