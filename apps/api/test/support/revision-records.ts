import type { ParameterSet } from '@proofplate/recipe-model';
import type { ApprovalFacts } from '../../src/recipes/approval-facts';
import type {
  EvidenceCell,
  EvidenceRun,
  LinkedCell,
  RevisionBrief,
  RevisionRecord,
  StoredRevision,
} from '../../src/recipes/stored-revision';
import { DEFAULT_SHOP_POLICY } from '../../src/shops/shop-policy';

/** Records for specs of pure rules: one revision of one step, proved on three cells of a later coupon. */
const KEYS = { materialId: 'm', finishId: 'f', effectId: 'e', machineId: 'b', lensId: 'l' };
export const day = (text: string) => new Date(`${text}T08:00:00Z`);

export const parametersAt = (speed: number): ParameterSet => ({
  values: {
    powerPercent: { entered: { value: 30, unit: 'percentFromZero' }, physical: 30 },
    speedMmPerS: { entered: { value: speed, unit: 'mm/s' }, physical: speed },
    passes: { entered: { value: 1, unit: 'count' }, physical: 1 },
  },
  fill: 'both directions',
  assist: 'none',
  power: { watts: 6, basis: 'calibration' },
});

export function cellOf(
  code: string,
  given: Partial<Omit<EvidenceCell, 'coupon'>> & { coupon?: Partial<EvidenceCell['coupon']> } = {},
): EvidenceCell {
  const { coupon, ...cell } = given;
  return {
    cellId: `${code} ${cell.address ?? 'A1'}`,
    address: 'A1',
    rowIndex: 0,
    columnIndex: 0,
    isMarked: true,
    parameters: parametersAt(400),
    plate: { rows: 1, columns: 3, cellMm: 5, gapMm: 1, layoutVersion: '1' },
    meanRating: 4,
    measurements: [{ quantity: 'lightness', value: 26, grade: null, unit: '1', method: 'colorimeter', measuredAt: '2026-05-02T08:00:00Z' }],
    photo: { shopId: 's', id: 'p', masterSha256: null, largeSha256: null, smallSha256: null, corners: null, widthPx: null, heightPx: null },
    ...cell,
    coupon: {
      id: code,
      code,
      state: 'sealed',
      lot: 'L-1',
      markedAt: day('2026-05-01'),
      sealedAt: day('2026-05-03'),
      criteria: [{ quantity: 'lightness', comparison: 'at most', value: 30, unit: '1' }],
      criteriaRecordedAt: day('2026-05-01'),
      firstLookedAt: day('2026-05-02'),
      unknownFields: [],
      isProof: false,
      confirmsRevisionId: null,
      profileId: 'profile',
      physicalNumber: 1,
      calibrationId: 'calibration',
      keys: KEYS,
      ...coupon,
    },
  };
}

export const proofCells = (count = 3, coupon: Partial<EvidenceCell['coupon']> = {}): EvidenceCell[] =>
  Array.from({ length: count }, (_, index) =>
    cellOf('C-0002', { address: `A${index + 1}`, coupon: { markedAt: day('2026-05-10'), lot: 'L-2', ...coupon } }),
  );

export const runOf = (given: Partial<EvidenceRun> = {}): EvidenceRun => ({
  id: 'run',
  revisionId: 'revision',
  code: 'J-0007',
  lot: 'L-3',
  startedAt: day('2026-05-12'),
  hasBadResult: false,
  steps: [{ purpose: 'fill', parameters: parametersAt(400), pauseAfterS: 0 }],
  measurements: [1, 2, 3].map((piece) => ({ piece, quantity: 'lightness', value: 25 + piece, unit: '1', method: 'colorimeter' })),
  ...given,
});

export const revisionOf = (given: Partial<StoredRevision> = {}): StoredRevision => ({
  id: 'revision',
  recipeId: 'recipe',
  number: null,
  state: 'draft',
  content: {
    steps: [{ purpose: 'fill', parameters: parametersAt(400), pauseAfterS: 0 }],
    setUpSteps: [],
    limits: { notes: '' },
    scope: { featureKind: 'filled-area' },
  },
  profileId: 'profile',
  calibrationId: 'calibration',
  reason: 'First setting.',
  basedOnId: null,
  route: 'coupons',
  grounds: '',
  groundsBy: null,
  effectiveFrom: null,
  reviewDue: null,
  contentHash: null,
  acknowledgedCautionIds: [],
  editorIds: [],
  submittedAt: null,
  approvedAt: null,
  withdrawnAt: null,
  supersededAt: null,
  createdAt: day('2026-05-04'),
  createdBy: 'author',
  version: 1,
  ...given,
});

const linked = (cells: readonly EvidenceCell[], kind: LinkedCell['kind']): LinkedCell[] =>
  cells.map((cell) => ({ ...cell, revisionId: 'revision', kind }));

export function recordOf(given: Partial<RevisionRecord> & { basisCells?: EvidenceCell[]; proof?: EvidenceCell[] } = {}): RevisionRecord {
  const { basisCells = [cellOf('C-0001')], proof = proofCells(), ...rest } = given;
  const revision = given.revision ?? revisionOf();
  const brief: RevisionBrief = { ...revision, authorName: 'Mirela Ashdown', isReviewOverdue: false };
  const field = { parameter: 'speedMmPerS', label: 'Speed', unit: 'mm/s', minimum: 1, maximum: 7000, step: 10 } as const;
  return {
    revision,
    recipe: {
      id: 'recipe',
      code: 'R-0001',
      title: 'Black tag',
      material: { id: KEYS.materialId, name: 'Titanium grade 2', family: 'titanium' },
      finish: { id: KEYS.finishId, name: 'Brushed' },
      effect: { id: KEYS.effectId, name: 'Colour anneal', key: 'colour-anneal' },
      machine: { id: KEYS.machineId, name: 'Bench 2', sourceKind: 'fibre-mopa' },
      lens: { id: KEYS.lensId, name: 'F160' },
    },
    profile: {
      id: 'profile',
      number: 1,
      physicalNumber: 1,
      physical: { sourceKind: 'fibre-mopa', wavelengthNm: 1064, ratedPowerW: 20 },
      panel: { fields: [field] },
    },
    presentPhysicalNumber: 1,
    calibration: {
      id: 'calibration',
      measuredOn: '2026-05-01',
      meter: 'Meter 3',
      frequencyKhz: null,
      pulseWidthNs: null,
      points: straightPoints(0.2),
    },
    groundsByName: null,
    optics: { focalLengthMm: 160, measuredSpotUm: null },
    brief,
    ladder: [brief],
    signOffs: [],
    basis: linked(basisCells, 'basis'),
    confirmation: linked(proof, 'confirmation'),
    runs: [],
    cautions: [],
    ...rest,
  };
}

export const straightPoints = (wattsPerPercent: number) => [10, 50, 100].map((percent) => ({ percent, watts: percent * wattsPerPercent }));

export const factsOf = (given: Partial<ApprovalFacts> = {}): ApprovalFacts => ({
  record: recordOf(),
  policy: DEFAULT_SHOP_POLICY,
  now: day('2026-06-01'),
  current: null,
  readings: [],
  mates: [],
  acknowledgedByAuthor: [],
  ...given,
});
