import { parameters } from '../../test/support/approved-recipe';
import { isRewritten, withEditor } from './draft-editors';

const draft = {
  content: {
    steps: [{ purpose: 'fill' as const, parameters: parameters(), pauseAfterS: 0 }],
    setUpSteps: [],
    limits: { notes: '' },
    scope: {},
  },
  calibrationId: null,
  reason: 'Rim is light',
  route: 'customer-given' as const,
  effectiveFrom: new Date('2030-01-01'),
  reviewDue: null,
};

describe('withEditor()', () => {
  it('names everybody but the author once', () => {
    expect(withEditor({ createdBy: 'author', editorIds: [] }, 'author')).toEqual([]);
    expect(withEditor({ createdBy: 'author', editorIds: ['one'] }, 'two')).toEqual(['one', 'two']);
    expect(withEditor({ createdBy: 'author', editorIds: ['one'] }, 'one')).toEqual(['one']);
  });
});

describe('isRewritten()', () => {
  it('is false of the same words in another order and of grounds', () => {
    const { steps, ...rest } = draft.content;
    expect(isRewritten(draft, { ...draft, content: { ...rest, steps } })).toBe(false);
    expect(isRewritten(draft, { ...draft, ...{ grounds: 'Marked so for years' } })).toBe(false);
  });

  it.each([
    ['content', { content: { ...draft.content, scope: { customerSpecification: 'A-1' } } }],
    ['calibration', { calibrationId: 'c' }],
    ['reason', { reason: 'Rim is dark' }],
    ['route', { route: 'earlier-experience' as const }],
    ['day', { effectiveFrom: null }],
  ])('is true of another %s', (_, change) => {
    expect(isRewritten(draft, { ...draft, ...change })).toBe(true);
  });
});
