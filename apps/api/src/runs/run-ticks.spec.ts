import type { RevisionContent } from '@proofplate/recipe-model';
import { tickProblems } from './run-ticks';

const content: RevisionContent = {
  steps: [
    {
      purpose: 'fill',
      pauseAfterS: 0,
      parameters: {
        values: { passes: { entered: { value: 2, unit: 'count' }, physical: 2 } },
        fill: 'both directions',
        assist: 'none',
        power: { watts: null, reason: 'No power is set.' },
      },
    },
  ],
  setUpSteps: [
    { text: 'Extraction on', mustTick: true },
    { text: 'Compare', mustTick: false },
  ],
  limits: { notes: '' },
  scope: {},
};

describe('tickProblems()', () => {
  it('asks at the start for the steps that must be ticked, and for nothing else', () => {
    expect(tickProblems(content, [], { isStart: true })).toEqual([
      { pointer: '#/ticks', detail: 'Do and tick step 1 first: Extraction on' },
    ]);
    expect(tickProblems(content, ['set-up.0'], { isStart: true })).toEqual([]);
    expect(tickProblems(content, [], { isStart: false })).toEqual([]);
  });

  it('knows the values on the setting card, and refuses what is not there', () => {
    expect(tickProblems(content, ['setting.0.passes'], { isStart: false })).toEqual([]);
    for (const unknown of ['set-up.2', 'setting.0.speedMmPerS', 'setting.1.passes'])
      expect(tickProblems(content, [unknown], { isStart: false })).toHaveLength(1);
  });
});
