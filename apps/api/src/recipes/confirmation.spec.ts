import { cellOf, day, parametersAt, proofCells, revisionOf, runOf } from '../../test/support/revision-records';
import { confirmationOf } from './confirmation';

const input = {
  revisionId: 'revision',
  steps: revisionOf().content.steps,
  basis: [cellOf('C-0001')],
  confirmation: proofCells(),
  runs: [],
  isSameWork: () => true,
};
const faultsOf = (...parameters: Parameters<typeof proofCells>) =>
  confirmationOf({ ...input, confirmation: proofCells(...parameters) }).marks[0]?.faults;

describe('confirmationOf()', () => {
  it('tells n, lowest, highest and mean, lots and days of the marks that count', () => {
    const [first, second, third] = proofCells();
    if (first === undefined || second === undefined || third === undefined) throw new Error('there are three cells');
    const measured = (value: number) => [{ quantity: 'lightness', value, grade: null, unit: '1', method: 'colorimeter', measuredAt: '' }];
    const later = { ...third, measurements: measured(29), coupon: { ...third.coupon, lot: 'L-9', markedAt: day('2026-05-11') } };
    const confirmation = confirmationOf({
      ...input,
      confirmation: [{ ...first, measurements: measured(25) }, { ...second, measurements: measured(27) }, later],
    });
    expect(confirmation).toMatchObject({
      ...{ count: 3, lots: ['L-2', 'L-9'], dayCount: 2 },
      spreads: [{ quantity: 'lightness', label: 'Lightness', n: 3, lowest: 25, highest: 29, mean: 27 }],
    });
  });

  it('says why a mark does not count', () => {
    expect(faultsOf(1, { state: 'inspected' })).toEqual(['its coupon is not sealed']);
    expect(faultsOf(1, { markedAt: day('2026-05-01') })).toEqual(['its coupon is not later than the one that the setting comes from']);
    expect(faultsOf(1, { markedAt: null })).toEqual(['its coupon is not later than the one that the setting comes from']);
    expect(faultsOf(1, { criteria: [] })).toEqual(['no acceptance criteria were recorded']);
    const other = confirmationOf({
      ...input,
      isSameWork: () => false,
      confirmation: [cellOf('C-0002', { isMarked: false, parameters: parametersAt(410), measurements: [] })],
    });
    expect(other.marks[0]?.faults).toEqual([
      'it was skipped',
      'its coupon is of other material, finish, effect, machine or lens',
      'its coupon is not later than the one that the setting comes from',
      'it differs in scan speed',
      'it does not meet every criterion',
    ]);
    expect(other.count).toBe(0);
  });

  it('takes no undated mark for a later one, not even where the date of the basis is not known', () => {
    const basis = [cellOf('C-0001', { coupon: { markedAt: null } })];
    expect(confirmationOf({ ...input, basis }).count).toBe(3);
    expect(confirmationOf({ ...input, basis, confirmation: proofCells(3, { markedAt: null }) }).count).toBe(0);
  });

  it('never takes another cell of the basis coupon for a proof', () => {
    const basis = [cellOf('C-0001'), cellOf('C-0002', { coupon: { markedAt: day('2026-04-01') } })];
    expect(confirmationOf({ ...input, basis }).count).toBe(0);
  });

  it('counts the step that was proved least, and cells only of a coupon made for all steps', () => {
    const steps = [400, 800].map((speed) => ({ purpose: 'fill' as const, parameters: parametersAt(speed), pauseAfterS: 0 }));
    const ours = { confirmsRevisionId: 'revision' };
    const second = proofCells(2, ours).map((cell) => ({ ...cell, parameters: parametersAt(800) }));
    expect(confirmationOf({ ...input, steps, confirmation: proofCells(3) }).count).toBe(0);
    expect(confirmationOf({ ...input, steps, confirmation: proofCells(3, ours) }).count).toBe(0);
    expect(confirmationOf({ ...input, steps, confirmation: [...proofCells(3, ours), ...second] }).count).toBe(2);
  });

  it('weighs each piece of a run by the basis coupon’s criteria', () => {
    const runs = [
      runOf({
        measurements: [26, 31].map((value, index) => ({
          piece: index + 1,
          quantity: 'lightness',
          value,
          unit: '1',
          method: 'colorimeter',
        })),
      }),
    ];
    const { marks, count } = confirmationOf({ ...input, confirmation: [], runs });
    expect(marks.map(({ name, faults }) => [name, faults])).toEqual([
      ['J-0007, piece 1', []],
      ['J-0007, piece 2', ['it does not meet every criterion']],
    ]);
    expect(count).toBe(1);
  });

  it('does not count a run with other essentials, without its steps, too early, or with a bad result', () => {
    const countOf = (given: Parameters<typeof runOf>[0]) => confirmationOf({ ...input, confirmation: [], runs: [runOf(given)] }).count;
    expect(countOf({})).toBe(3);
    expect(countOf({ steps: [{ purpose: 'fill', parameters: parametersAt(500), pauseAfterS: 0 }] })).toBe(0);
    expect(countOf({ steps: null })).toBe(0);
    expect(countOf({ startedAt: day('2026-04-30') })).toBe(0);
    expect(countOf({ hasBadResult: true })).toBe(0);
  });
});
