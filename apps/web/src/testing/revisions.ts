import type { components } from '@proofplate/api-client';

type Schemas = components['schemas'];
type Revision = Schemas['RecipeRevisionDto'];
type Recipe = Schemas['RecipeDto'];

const RECIPE = {
  id: 'recipe-42',
  code: 'R-0042',
  title: '316L brushed, black anneal',
  material: { id: 'm1', name: '316L', family: 'stainless-steel' as const },
  finish: { id: 'f1', name: 'Brushed' },
  effect: { id: 'e1', name: 'Dark anneal', key: 'dark-anneal' },
  machine: { id: 'x1', name: 'Bench 2', sourceKind: 'fibre-mopa' as const },
  lens: { id: 'l1', name: 'F160' },
};

const SET = { powerPercent: 60, speedMmPerS: 270 };

/** An invented cell on an invented coupon, without a photo. */
export function makeEvidenceCell(rest: Partial<Schemas['EvidenceCellDto']> = {}): Schemas['EvidenceCellDto'] {
  return {
    cellId: 'cell-c5',
    address: 'C5',
    rowIndex: 2,
    columnIndex: 4,
    couponId: 'coupon-98',
    couponCode: 'C-0098',
    couponState: 'sealed',
    lot: '2140',
    markedAt: '2026-03-01T09:00:00.000Z',
    sealedAt: '2026-03-02T09:00:00.000Z',
    parameters: makeStep().parameters,
    essentialDifferences: [],
    meanRating: 4,
    measurements: [
      { quantity: 'lightness', value: 29.2, grade: null, unit: '1', method: 'colorimeter', measuredAt: '2026-03-02T08:00:00.000Z' },
    ],
    criteria: [],
    meets: true,
    plate: { rows: 6, columns: 6, cellMm: 5, gapMm: 1.2, layoutVersion: 'coupon-layout/1' },
    photo: null,
    ...rest,
  };
}

export function makeStep(powerPercent = SET.powerPercent): Schemas['MarkStepDto'] {
  return {
    purpose: 'anneal',
    pauseAfterS: 0,
    parameters: {
      values: {
        powerPercent: { entered: { value: powerPercent, unit: 'percentFromZero' }, physical: powerPercent },
        speedMmPerS: { entered: { value: SET.speedMmPerS, unit: 'mm/s' }, physical: SET.speedMmPerS },
      },
      fill: 'one direction',
      assist: 'none',
      power: { watts: 12.05, basis: 'calibration' },
    },
  };
}

/** An invented revision; approved and numbered 3 unless told otherwise. */
export function makeRevision(rest: Partial<Revision> = {}): Revision {
  return {
    id: 'revision-3',
    number: 3,
    state: 'approved',
    route: 'coupons',
    reason: 'Faster, after the new F160',
    author: { id: 'member-2', name: 'Mirela Ashdown' },
    basedOnId: null,
    createdAt: '2026-03-01T08:00:00.000Z',
    submittedAt: '2026-03-02T09:00:00.000Z',
    approvedAt: '2026-03-03T08:12:00.000Z',
    supersededAt: null,
    withdrawnAt: null,
    effectiveFrom: null,
    reviewDue: '2027-03-03T08:12:00.000Z',
    isReviewOverdue: false,
    signOffs: [makeSignOff()],
    recipe: RECIPE,
    steps: [makeStep()],
    setUpSteps: [{ text: 'Lens F160 fitted, protective glass clean, extraction on', mustTick: true }],
    limits: { notes: '' },
    scope: { featureKind: 'filled-area' },
    profile: {
      id: 'profile-1',
      number: 1,
      physicalNumber: 1,
      isPresent: true,
      physical: { sourceKind: 'fibre-mopa', wavelengthNm: 1064, ratedPowerW: 20 },
      panel: {
        fields: [
          { parameter: 'powerPercent', label: 'Power', unit: 'percentFromZero', minimum: 0, maximum: 100, step: 1 },
          { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s', minimum: 1, maximum: 8000, step: 1 },
        ],
      },
    },
    calibration: null,
    grounds: '',
    groundsBy: null,
    evidence: { basis: [makeEvidenceCell()], confirmation: [], runs: [] },
    cautions: [
      {
        id: 'caution-1',
        level: 'care',
        subject: 'Let the part cool.',
        text: 'It holds heat.',
        source: 'The manual.',
        isGeneral: false,
        isAcknowledged: false,
      },
    ],
    changes: [],
    comparedWith: null,
    derived: [{ step: 1, numbers: [], remarks: [] }],
    derivedTotals: [],
    optics: { focalLengthMm: 160, measuredSpotUm: null },
    doseCaution: null,
    contentHash: 'a'.repeat(64),
    version: 7,
    allowedActions: ['copy'],
    ...rest,
  };
}

export function makeSignOff(rest: Partial<Schemas['SignOffDto']> = {}): Schemas['SignOffDto'] {
  return {
    id: 'sign-off-1',
    memberId: 'member-1',
    printedName: 'Hanne Voss',
    role: 'lead',
    meaning: 'approved',
    comment: '',
    signedAt: '2026-03-03T08:12:00.000Z',
    contentHash: 'a'.repeat(64),
    ledgerHashBefore: 'b'.repeat(64),
    method: 'password',
    isByAuthor: false,
    ...rest,
  };
}

/** Its recipe, with the given revisions as the ladder. */
export function makeRecipe(current: Revision | null, revisions: readonly Revision[], rest: Partial<Recipe> = {}): Recipe {
  return {
    ...RECIPE,
    state: 'approved',
    current,
    underWay: revisions.find(({ id }) => id !== current?.id) ?? null,
    isHeld: false,
    checkDue: null,
    face: null,
    last30Days: { good: 110, scrap: 2 },
    needsYou: null,
    allowedActions: ['propose-change'],
    scope: {},
    holds: [],
    currentRevision: current,
    revisions: [...revisions],
    createdAt: '2026-01-01T08:00:00.000Z',
    version: 3,
    ...rest,
  };
}

/** A page of the list with the counts that belong to it. */
export function makeRecipePage(items: readonly Recipe[], rest: Partial<Schemas['RecipeFacetsDto']> = {}): Schemas['RecipePageDto'] {
  return {
    items: [...items],
    nextCursor: null,
    facets: {
      states: [{ value: 'approved', label: 'approved', count: items.length }],
      materials: [{ value: 'm1', label: '316L', count: items.length }],
      effects: [{ value: 'e1', label: 'Dark anneal', count: items.length }],
      machines: [{ value: 'x1', label: 'Bench 2', count: items.length }],
      matchCount: items.length,
      totalCount: items.length,
      ...rest,
    },
  };
}

export function makeChecks(rest: Partial<Schemas['ApprovalChecksDto']> = {}): Schemas['ApprovalChecksDto'] {
  return {
    items: [
      { key: 'confirmation', passes: true, title: 'Confirmation', detail: '5 of 3 marks count.', isAdvisory: false, blocks: 'approve' },
      { key: 'reason', passes: true, title: 'Reason', detail: 'Source lost power.', isAdvisory: false, blocks: 'submit' },
    ],
    confirmation: { markCount: 5, neededCount: 3, notCountingCount: 0, lots: ['2190'], dayCount: 1, spreads: [] },
    maySubmit: true,
    mayApprove: true,
    contentHash: 'c'.repeat(64),
    ...rest,
  };
}
