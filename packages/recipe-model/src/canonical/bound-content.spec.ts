import { type BoundRevision, boundContent } from './bound-content';
import { contentText } from './content-text';

const revision: BoundRevision = {
  content: { steps: [], setUpSteps: [], limits: { notes: '' }, scope: {} },
  recipeId: 'r',
  keys: { materialId: 'm', finishId: 'f', effectId: 'e', machineId: 'n', lensId: 'l' },
  profileId: 'p',
  calibrationId: null,
  basisCellIds: ['b2', 'b1'],
  confirmationCellIds: ['c1'],
  route: 'coupons',
  grounds: '',
  groundsBy: null,
  reason: 'first',
  basedOnId: null,
  authorId: 'a',
  effectiveFrom: null,
};
const textOf = (change: Partial<BoundRevision> = {}) => contentText(boundContent({ ...revision, ...change }));

describe('boundContent', () => {
  it('does not depend on the order of the cells', () => {
    expect(textOf({ basisCellIds: ['b1', 'b2'] })).toBe(textOf());
  });

  it('ignores what a key carries besides its id', () => {
    const keys = { ...revision.keys, machineName: 'Bench' };
    expect(textOf({ keys })).toBe(textOf());
  });

  it.each<Partial<BoundRevision>>([
    { calibrationId: 'c' },
    { confirmationCellIds: [] },
    { route: 'transferred' },
    { grounds: 'because' },
    { reason: 'second' },
    { basedOnId: 'x' },
    { authorId: 'z' },
    { effectiveFrom: new Date('2026-01-05T08:00:00Z') },
    { keys: { ...revision.keys, lensId: 'other' } },
  ])('binds %j', (change) => {
    expect(textOf(change)).not.toBe(textOf());
  });
});
