import {
  cellOf,
  day,
  factsOf,
  parametersAt,
  proofCells,
  recordOf,
  revisionOf,
  runOf,
  straightPoints,
} from '../../test/support/revision-records';
import { DEFAULT_SHOP_POLICY } from '../shops/shop-policy';
import { blocksApproval, blocksSubmit, inReadingOrder } from './approval-check';
import type { ApprovalFacts } from './approval-facts';
import { revisionChecks } from './revision-checks';

const failing = (facts: Partial<ApprovalFacts> = {}) =>
  revisionChecks(factsOf(facts))
    .items.filter(blocksApproval)
    .map(({ key }) => key);
const detailOf = (key: string, facts: Partial<ApprovalFacts> = {}) =>
  revisionChecks(factsOf(facts)).items.find((item) => item.key === key)?.detail;
const stepsAt = (speed: number) => [{ purpose: 'fill' as const, parameters: parametersAt(speed), pauseAfterS: 0 }];
const contentAt = (speed: number) => ({ ...revisionOf().content, steps: stepsAt(speed) });

describe('revisionChecks()', () => {
  it('finds nothing wrong with a setting that was proved again on a later coupon', () => {
    expect(failing()).toEqual([]);
  });

  it('lists every failing check, never just the first', () => {
    const record = recordOf({
      revision: revisionOf({ reason: ' ', content: { ...revisionOf().content, steps: [] } }),
      basisCells: [],
      proof: [],
      calibration: null,
      presentPhysicalNumber: 2,
      cautions: [
        { id: 'n', level: 'never', subject: 'Do not mark PVC.', text: 'Chlorine', source: 'Safety data sheet', isGeneral: false },
        { id: 'c', level: 'care', subject: 'Keep the extraction on.', text: 'Fumes', source: 'Manual', isGeneral: false },
      ],
    });
    const mates = [{ recipeCode: 'R-0009', scope: {} }];
    expect(failing({ record, mates })).toEqual([
      'setting',
      'reason',
      'never',
      'cautions-author',
      'basis',
      'confirmation',
      'profile',
      'calibration',
      'scope',
    ]);
    expect(detailOf('never', { record })).toContain('Do not mark PVC. (Safety data sheet)');
    expect(detailOf('scope', { mates })).toContain('R-0009');
  });

  it('asks for a value that the panel can show, a cell of the same work and a sealed coupon', () => {
    expect(failing({ record: recordOf({ revision: revisionOf({ content: contentAt(405) }), proof: [] }) })).toEqual([
      'panel',
      'confirmation',
    ]);
    expect(failing({ record: recordOf({ basisCells: [cellOf('C-0001', { coupon: { state: 'inspected' } })] }) })).toEqual(['basis']);
    expect(failing({ record: recordOf({ basisCells: [cellOf('C-0001', { coupon: { physicalNumber: 2 } })] }) })).toEqual(['basis']);
  });

  it('takes no proof cell for a basis, not even beside one that was tried out, and lets none be submitted', () => {
    const proof = cellOf('C-0003', { coupon: { isProof: true } });
    for (const basisCells of [[proof], [cellOf('C-0001'), proof]]) {
      const record = recordOf({ basisCells });
      expect(failing({ record })).toEqual(['basis']);
      expect(detailOf('basis', { record })).toContain('C-0003');
      expect(revisionChecks(factsOf({ record })).items.some(blocksSubmit)).toBe(true);
    }
  });

  it('asks for criteria that were there first, and for photos where the policy does', () => {
    const late = { criteriaRecordedAt: day('2026-05-05'), firstLookedAt: day('2026-05-04') };
    expect(failing({ record: recordOf({ basisCells: [cellOf('C-0001', { coupon: late })] }) })).toEqual(['criteria']);
    const bare = recordOf({ basisCells: [cellOf('C-0001', { photo: null })] });
    expect(failing({ record: bare })).toEqual(['photo']);
    expect(failing({ record: bare, policy: { ...DEFAULT_SHOP_POLICY, photoRequired: false } })).toEqual([]);
  });

  it('takes a reading of the limit’s age and none that is a day older', () => {
    expect(failing({ now: day('2026-10-28') })).toEqual([]);
    expect(failing({ now: day('2026-10-29') })).toEqual(['calibration']);
  });

  it('shows a reading that moved the watts too far without blocking', () => {
    const record = recordOf();
    const moved = (factor: number) =>
      revisionChecks(
        factsOf({
          record,
          readings:
            record.calibration === null
              ? []
              : [{ ...record.calibration, id: 'newer', points: straightPoints(0.2 * factor) }, record.calibration],
        }),
      ).items.find(({ key }) => key === 'power-shift');
    expect(moved(0.96)).toMatchObject({ passes: true, isAdvisory: true });
    expect(moved(0.94)).toMatchObject({ passes: false, isAdvisory: true, detail: expect.stringContaining('6.0 %') });
  });

  it('needs a lead’s grounds instead of coupons on every other route', () => {
    const revision = revisionOf({ route: 'customer-given' });
    const bare = { revision, basisCells: [], proof: [], calibration: null };
    expect(failing({ record: recordOf(bare) })).toEqual(['grounds']);
    const grounded = revisionOf({ route: 'customer-given', grounds: 'Drawing 4711.' });
    expect(failing({ record: recordOf({ ...bare, revision: grounded, groundsByName: 'Hanne Voss' }) })).toEqual([]);
  });

  it('needs marks on the target for a transfer, beside the grounds of a lead', () => {
    const grounds = { grounds: 'Same spot and pulses by the numbers.' };
    const transferred = { revision: revisionOf({ route: 'transferred', ...grounds }), groundsByName: 'Hanne Voss', basisCells: [] };
    expect(failing({ record: recordOf(transferred) })).toEqual([]);
    expect(failing({ record: recordOf({ ...transferred, proof: [] }) })).toEqual(['confirmation']);
    expect(failing({ record: recordOf({ ...transferred, proof: proofCells(2) }) })).toEqual(['confirmation']);
    const elsewhere = proofCells(3).map((cell) => ({ ...cell, coupon: { ...cell.coupon, physicalNumber: 2 } }));
    expect(failing({ record: recordOf({ ...transferred, proof: elsewhere }) })).toEqual(['confirmation']);
    const bare = { revision: revisionOf({ route: 'transferred' }), basisCells: [], calibration: null };
    expect(failing({ record: recordOf(bare) })).toEqual(['grounds', 'calibration']);
  });

  it('wants newer marks for an essential change, and old ones are enough for any other', () => {
    const current = { number: 1, steps: stepsAt(300), newestEvidenceAt: day('2026-05-09') };
    expect(failing({ current })).toEqual([]);
    expect(failing({ current: { ...current, newestEvidenceAt: day('2026-05-10') } })).toEqual(['new-confirmation']);
    expect(failing({ current: { ...current, steps: stepsAt(400), newestEvidenceAt: day('2026-05-30') } })).toEqual([]);
    expect(detailOf('changes', { current })).toBe('Essential changes: step 1: scan speed.');
  });

  it('counts marks of confirmation runs', () => {
    expect(failing({ record: recordOf({ proof: [] }) })).toEqual(['confirmation']);
    expect(failing({ record: recordOf({ proof: [], runs: [runOf()] }) })).toEqual([]);
    expect(
      failing({ record: recordOf({ proof: proofCells(2), runs: [runOf({ measurements: runOf().measurements.slice(0, 1) })] }) }),
    ).toEqual([]);
  });
});

describe('reading order', () => {
  it('puts what blocks first, then what advises, then what passes', () => {
    const record = recordOf({ revision: revisionOf({ route: 'customer-given', reason: '' }), calibration: null });
    const ordered = inReadingOrder(revisionChecks(factsOf({ record })).items);
    expect(ordered.slice(0, 3).map(({ key, isAdvisory }) => [key, isAdvisory])).toEqual([
      ['reason', false],
      ['grounds', false],
      ['calibration', true],
    ]);
    expect(ordered.slice(3).every(({ passes }) => passes)).toBe(true);
    expect(ordered.filter(blocksSubmit)).toHaveLength(2);
  });
});
