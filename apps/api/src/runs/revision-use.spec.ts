import { codesOf, REVISION_STATE_LABELS, RUN_KINDS } from '@proofplate/recipe-model';
import { whyNotUsable } from './revision-use';

const usable = (kind: (typeof RUN_KINDS)[number]) =>
  codesOf(REVISION_STATE_LABELS).filter((state) => whyNotUsable(kind, state) === undefined);

describe('whyNotUsable()', () => {
  it('marks parts and checks the machine with approved revisions only', () => {
    expect(usable('production')).toEqual(['approved']);
    expect(usable('daily-check')).toEqual(['approved']);
  });

  it('proves drafts and what is under way, and proves again what is approved', () => {
    expect(usable('confirmation')).toEqual(['draft', 'in_review', 'scheduled', 'approved']);
  });

  it('says the way out', () => {
    expect(whyNotUsable('production', 'withdrawn')).toMatch(/Do not mark with it/);
    expect(whyNotUsable('confirmation', 'superseded')).toMatch(/A newer revision/);
    expect(whyNotUsable('production', 'draft')).toMatch(/confirmation run/);
  });
});
