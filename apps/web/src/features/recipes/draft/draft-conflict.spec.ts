import type { RevisionChange } from '../recipes.api';
import { changedParts, conflictParts, mergedValues, partsOf } from './draft-conflict';
import type { DraftValues } from './draft-values';

const step = (power: number): NonNullable<RevisionChange['steps']>[number] => ({
  purpose: 'fill',
  fill: 'one direction',
  assist: 'none',
  values: { powerPercent: { value: power, unit: 'percentFromZero' } },
  pauseAfterS: 0,
});
const base: RevisionChange = { steps: [step(60)], reason: 'darker', grounds: '' };

describe('two people in one draft', () => {
  it('only the parts that differ from the last save are sent', () => {
    expect(changedParts({ ...base, reason: 'darker still' }, partsOf(base))).toEqual({ reason: 'darker still' });
    expect(changedParts(base, partsOf(base))).toEqual({});
  });

  it('both values of every differing part are shown, in the words of the panel, with where it was changed', () => {
    const parts = conflictParts({
      saved: partsOf(base),
      mine: { ...base, steps: [step(55)], reason: 'mine' },
      theirs: { ...base, steps: [{ ...step(50), fill: 'crossed' }], grounds: 'seen at the bench' },
      fields: [{ parameter: 'powerPercent', label: 'PWR', unit: 'percentFromZero', minimum: 0, maximum: 100, step: 1 }],
    });
    expect(parts).toEqual([
      {
        key: 'steps',
        label: 'Mark steps',
        changedBy: 'both',
        leaves: [
          { name: 'Step 1: Fill', mine: 'one direction', theirs: 'crossed (two scans a pass)' },
          { name: 'Step 1: PWR', mine: '55 %', theirs: '50 %' },
        ],
      },
      { key: 'reason', label: 'Reason', changedBy: 'me', leaves: [{ name: '', mine: 'mine', theirs: 'darker' }] },
      { key: 'grounds', label: 'Grounds', changedBy: 'them', leaves: [{ name: '', mine: 'nothing', theirs: 'seen at the bench' }] },
    ]);
  });

  it('the decided draft holds each part as it was chosen', () => {
    // Only two parts matter here.
    const mine = { reason: 'mine', grounds: '' } as DraftValues;
    const theirs = { reason: 'darker', grounds: 'seen at the bench' } as DraftValues;
    expect(mergedValues(mine, theirs, new Set(['reason']))).toMatchObject({ reason: 'mine', grounds: 'seen at the bench' });
  });
});
