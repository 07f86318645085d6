// An invented answer of the finder, as the api gives it.

const named = (id: string, name: string) => ({ id, name });
export const KEYS = {
  machine: named('bench2', 'Bench 2'),
  lens: named('f160', 'F160'),
  material: named('black', 'Black anodised 6061'),
  finish: named('satin', 'Sealed satin'),
  effect: named('white', 'White mark'),
};

type OptionGiven = { id: string; name: string; count?: number; reason?: string };
export const makeSlot = (options: readonly OptionGiven[], rest: object = {}) => ({
  chosenId: null,
  settledId: null,
  fitCount: options.filter(({ count = 1 }) => count > 0).length,
  options: options.map(({ id, name, count = 1, reason = null }) => ({ id, name, detail: '', count, reason })),
  ...rest,
});

const set = (value: number, unit: string, physical = value) => ({ entered: { value, unit }, physical });

export const makeAnswer = (rest: object = {}) => ({
  ...KEYS,
  recipeId: 'recipe-31',
  code: 'R-0031',
  title: 'Dial, white on black',
  revisionNumber: 3,
  revisionId: 'revision-3',
  holds: [],
  panel: {
    fields: [
      { parameter: 'powerPercent', label: 'Power', unit: 'percentFromZero', step: 1 },
      { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s', step: 1 },
      { parameter: 'lineSpacingUm', label: 'Line spacing', unit: 'mm', step: 0.001 },
    ],
  },
  profileNumber: 4,
  isProfilePresent: true,
  steps: [
    {
      purpose: 'fill',
      pauseAfterS: 0,
      parameters: {
        values: { powerPercent: set(30, 'percentFromZero'), speedMmPerS: set(900, 'mm/s'), lineSpacingUm: set(0.03, 'mm', 30) },
        fill: 'both directions',
        assist: 'none',
        power: { watts: 5.8, basis: 'calibration' },
      },
    },
  ],
  derived: [],
  derivedTotals: [],
  setUpSteps: [
    { text: 'Seat the dial in fixture T-14', mustTick: true },
    { text: 'Wipe with isopropanol', caution: 'Flammable', mustTick: false },
  ],
  limits: { thicknessMm: { from: 1, to: 3 }, notes: 'Sealed wrought dials only' },
  scope: {},
  focus: { workingDistanceMm: 163, focusMethod: 'height gauge' },
  reference: {
    couponCode: 'C-0088',
    address: 'C5',
    plate: { rows: 6, columns: 8, cellMm: 5, gapMm: 1.2, layoutVersion: 'coupon-layout/1' },
    lot: '6061-B14',
    measurements: [{ quantity: 'contrast', value: 0.95, grade: null, unit: '1', method: 'photo', criterion: 'at least 0.9' }],
    photo: null,
  },
  route: 'coupons',
  signature: { printedName: 'Hanne Voss', signedAt: '2026-03-03T08:12:00.000Z', isByAuthor: false },
  holdsUntil: '2026-09-30T10:00:00.000Z',
  isOverdue: false,
  checkDue: null,
  contentHash: '7f3ac21e'.repeat(8),
  blockedBecause: [],
  allowedActions: ['start-run'],
  ...rest,
});

export const makeFinderResult = (rest: object = {}) => ({
  slots: {
    machine: makeSlot([KEYS.machine, { id: 'bench1', name: 'Bench 1' }]),
    lens: makeSlot([KEYS.lens]),
    material: makeSlot([KEYS.material, { id: 'clear', name: 'Clear anodised 6061', count: 0, reason: 'not for White mark' }]),
    finish: makeSlot([KEYS.finish]),
    effect: makeSlot([KEYS.effect]),
  },
  approvedCount: 57,
  matchCount: 57,
  matches: [],
  cautions: [],
  isForbidden: false,
  answer: null,
  withdrawn: [],
  nearMisses: [],
  ...rest,
});

export const makeCaution = (subject: string, rest: object = {}) => ({
  id: subject,
  level: 'care',
  subject,
  text: 'Anodise dust is harmful.',
  source: 'Laboratory lists',
  isGeneral: false,
  ...rest,
});
