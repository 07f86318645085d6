import { makeRevision } from '../../../testing/revisions';
import type { Comparison, ComparisonRow } from '../recipes.api';
import { addressOf, choiceFromAddress } from './compare-address';
import { comparisonView } from './comparison-view';

type Side = Partial<ComparisonRow['values'][number]>;

function row(key: string, sides: Side[], rest: Partial<ComparisonRow> = {}): ComparisonRow {
  const values = sides.map((side, index) => ({
    revisionId: `r${index + 2}`,
    value: null,
    text: side.value === undefined ? null : String(side.value),
    missingBecause: null,
    change: 'changed' as const,
    size: null,
    ...side,
  }));
  return { group: 'entered', key, label: key, unit: 'mm/s', step: 1, isSame: false, values, ...rest };
}

const comparison = (rows: ComparisonRow[]): Comparison => ({ revisions: [], referenceId: 'r3', rows });
const options = { machineName: 'Bench 2', onlyDiffering: true };

describe('comparisonView', () => {
  it('shows a change against the reference column wherever that stands', () => {
    const size = { delta: 50, symbol: 'mm/s', percent: 18.5, points: null };
    const { groups } = comparisonView(
      comparison([
        row('Speed', [
          { value: 320, size },
          { value: 270, change: 'reference' },
        ]),
      ]),
      options,
    );
    expect(groups[0]?.title).toBe('As entered on Bench 2’s panel');
    expect(groups[0]?.rows[0]?.cells.map(({ text, change, isReference }) => [text, change, isReference])).toEqual([
      ['320', '+19\u00A0%', false],
      ['270', '', true],
    ]);
    expect(groups[0]?.rows[0]?.cells[0]?.share).toBeCloseTo(0.185, 3);
  });

  it('leaves equal rows out and names them, 0.8 m/s against 800 mm/s among them', () => {
    const same = row(
      'Speed',
      [
        { value: 800, change: 'same' },
        { value: 800, change: 'reference' },
      ],
      { isSame: true },
    );
    expect(comparisonView(comparison([same]), options)).toEqual({ groups: [], hidden: ['speed'] });
    const all = comparisonView(comparison([same]), { ...options, onlyDiffering: false });
    expect(all.groups[0]?.rows[0]?.cells[0]?.change).toBe('same');
    expect(all.hidden).toEqual([]);
  });

  it('gives the plain difference of what was measured on the mark', () => {
    const size = { delta: -3.5, symbol: '', percent: -12, points: null };
    const { groups } = comparisonView(
      comparison([
        row(
          'lightness',
          [
            { value: 25.7, size },
            { value: 29.2, change: 'reference' },
          ],
          { group: 'mark', step: null, unit: '' },
        ),
      ]),
      options,
    );
    expect(groups[0]?.rows[0]?.cells[0]?.change).toBe('−3.5');
  });

  it('shows the decimals of the finest value in the whole row', () => {
    const { groups } = comparisonView(comparison([row('Line spacing', [{ value: 0.012 }, { value: 0.01 }], { unit: 'mm' })]), options);
    expect(groups[0]?.rows[0]?.cells.map(({ text }) => text)).toEqual(['0.012', '0.010']);
  });

  it('takes computed numbers that read the same for the same', () => {
    const ripple = row('coverageRipple', [{ value: 2e-9 }, { value: 3e-11 }], { group: 'work', label: 'Coverage ripple', unit: '1' });
    expect(comparisonView(comparison([ripple]), options)).toEqual({ groups: [], hidden: ['coverage ripple'] });
  });

  it('names the step of a row as soon as there is more than one', () => {
    const { groups } = comparisonView(
      comparison([row('Speed', [{ value: 1 }, { value: 2 }]), row('Speed', [{ value: 1 }, { value: 2 }], { step: 2 })]),
      options,
    );
    expect(groups[0]?.rows.map(({ label }) => label)).toEqual(['Step 1: Speed', 'Step 2: Speed']);
  });
});

describe('the address of a comparison', () => {
  const brief = (id: string) => makeRevision({ id });
  const recipe = { revisions: [brief('r4'), brief('r3'), brief('r2')], current: brief('r3') };

  it('compares the approved revision with the newest when it names none', () => {
    expect(choiceFromAddress(new URLSearchParams(), recipe)).toEqual({ ids: ['r3', 'r4'], referenceId: undefined, showsAll: false });
  });

  it('round trips up to four revisions, the reference and the switch', () => {
    const choice = { ids: ['r2', 'r3', 'r4'], referenceId: 'r3', showsAll: true };
    expect(choiceFromAddress(addressOf(choice), recipe)).toEqual(choice);
    expect(choiceFromAddress(new URLSearchParams('ids=a,b,c,d,e,a'), recipe).ids).toEqual(['a', 'b', 'c', 'd']);
  });

  it('takes no reference that is not compared', () => {
    expect(choiceFromAddress(new URLSearchParams('ids=r2,r4&reference=r3'), recipe).referenceId).toBeUndefined();
  });
});
