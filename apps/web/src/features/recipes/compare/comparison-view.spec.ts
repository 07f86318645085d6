import { makeRevision } from '../../../testing/revisions';
import type { Comparison, ComparisonRow } from '../recipes.api';
import { addressOf, choiceFromAddress } from './compare-address';
import { comparisonView, leftOutWords } from './comparison-view';

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
  it('names apart what is known of none: nobody can say that it is the same', () => {
    const side = (revisionId: string, change: 'reference' | 'same') => ({
      ...{ revisionId, value: null, text: null, missingBecause: 'The spot is not known.', change, size: null },
    });
    const dose = {
      ...{ group: 'work' as const, key: 'arealDose', label: 'Dose', unit: 'J/mm²', step: 1, isSame: true },
      values: [side('r3', 'reference'), side('r4', 'same')],
    };
    const view = comparisonView(comparison([dose]), options);
    expect(view).toEqual({ groups: [], hidden: [], unknown: ['dose'] });
    expect(leftOutWords(view)).toBe('Not known of any: dose');
    expect(leftOutWords({ hidden: ['passes'], unknown: ['dose'] })).toBe('Equal rows hidden: passes. Not known of any: dose');
  });

  it('shows an overlap in percent, and its change in points', () => {
    const sides: Side[] = [
      { value: -0.25, change: 'reference' },
      { value: -0.3, size: { delta: -0.05, symbol: '1', percent: -20, points: null } },
    ];
    const { groups } = comparisonView(
      { ...comparison([row('lineOverlap', sides, { group: 'work', unit: '1' })]), referenceId: 'r2' },
      options,
    );
    expect(groups[0]?.rows[0]).toMatchObject({ unit: '%', cells: [{ text: '−25.0' }, { text: '−30.0', change: '−5 points' }] });
  });

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
    expect(comparisonView(comparison([same]), options)).toEqual({ groups: [], hidden: ['speed'], unknown: [] });
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
    expect(comparisonView(comparison([ripple]), options)).toEqual({ groups: [], hidden: ['coverage ripple'], unknown: [] });
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
