// Invented runs, as the api gives them.
import { KEYS, makeAnswer } from './finder-results';

const { panel, steps, setUpSteps } = makeAnswer();

export const makeStartSheet = (rest: object = {}) => ({
  ...KEYS,
  recipe: { id: 'recipe-31', code: 'R-0031', title: 'Dial, white on black' },
  revision: { id: 'revision-3', number: 3, state: 'approved' },
  lenses: [KEYS.lens, { id: 'f254', name: 'F254' }],
  ...{ panel, steps, setUpSteps, derived: [], derivedTotals: [] },
  ...{ holds: [], cautions: [] },
  deviations: [],
  kinds: ['production', 'daily-check'],
  ...rest,
});

export const makeRun = (rest: object = {}) => ({
  id: 'run-7',
  code: 'J-0007',
  kind: 'production',
  state: 'started',
  recipe: { id: 'recipe-31', code: 'R-0031', title: 'Dial, white on black' },
  revision: { id: 'revision-3', number: 3, state: 'approved' },
  machine: KEYS.machine,
  material: KEYS.material,
  finish: KEYS.finish,
  effect: KEYS.effect,
  lensFitted: KEYS.lens,
  ...{ jobReference: 'J-26-0411', part: 'TD-210', lot: 'B14', good: 0, scrap: 0 },
  ...{ firstPiece: null, badResult: null, deviation: null, notes: '', measurements: [], holds: [], stop: null, cautions: [] },
  startedBy: { id: 'member-1', name: 'Jonah Pell' },
  ...{ startedAt: '2026-05-14T07:30:00.000Z', finishedAt: null },
  ...{ panel, steps, setUpSteps, derived: [], derivedTotals: [] },
  ticks: { 'set-up.0': '2026-05-14T07:29:00.000Z' },
  contentHash: '7f3ac21e'.repeat(8),
  version: 1,
  allowedActions: ['tick', 'set-up-part', 'first-piece', 'finish', 'bad-result'],
  ...rest,
});

export const makeDeviation = (rest: object = {}) => ({
  ...{ id: 'd1', revisionId: 'revision-3', description: 'Power 28 % for the thin sheet', reason: 'Old stock' },
  ...{ endsAt: '2026-05-20T16:00:00.000Z', maximumQuantity: 50, usedQuantity: 12, isLive: true },
  ...{ grantedBy: 'Hanne Voss', grantedAt: '2026-05-13T08:00:00.000Z' },
  ...rest,
});
