import type { Role } from '@proofplate/recipe-model';

/** An answer as `status`, `status code-of-the-problem`, or with the first field that is to blame. */
export type Answer = string;

export type RightsRow = {
  /** Method and path as the router has them. */
  readonly route: string;
  /** The role that is enough; `anybody` needs no sign-in. */
  readonly least: Role | 'anybody';
  /** For an empty request of each role that is enough: it shows that no guard stood in the way. By role where they see different things. */
  readonly own: Answer | Readonly<Partial<Record<Role, Answer>>>;
  /** The call ends every session of its caller, who is made for it. */
  readonly endsSessions?: true;
  /** Ids of the address or of the body are another shop's: a complete request of that shop's owner. Absent: no ids. */
  readonly foreign?: { readonly body?: Readonly<Record<string, unknown>>; readonly query?: string; readonly answer?: Answer };
};

/** Any well-formed id; ids of the shop are written `{coupon}` and filled in by the test. */
const ID = '01990000-0000-7000-8000-000000000000';
const OK = '200';
const NO_BODY = '422 invalid-fields';
const NO_KEY = '400 idempotency-key-required';
const NO_TAG = '428 version-required';

const row = (route: string, least: RightsRow['least'], own: RightsRow['own'], foreign?: RightsRow['foreign']): RightsRow => ({
  ...{ route, least, own },
  ...(foreign === undefined ? {} : { foreign }),
});
const read = (path: string, least: RightsRow['least'], own: RightsRow['own'] = OK): RightsRow =>
  row(`GET ${path}`, least, own, path.includes(':') ? {} : undefined);

const COLUMNS = { parameter: 'powerPercent', from: 10, to: 50, count: 5, spacing: 'steps' };
const SETTING = { values: {}, fill: 'both directions', assist: 'none' };
const WORK = { materialId: '{material}', finishId: '{finish}', effectId: '{effect}', machineId: '{machine}', lensId: '{lens}' };
const PLAN = { ...WORK, columns: COLUMNS, base: SETTING, cellMm: 5, gapMm: 1.2, fillDrawnBy: 'machine', acknowledgedCautionIds: [] };
const OLD_PLATE = { ...WORK, acknowledgedCautionIds: [], grid: { rows: 2, columns: 2 } };
const LENGTH = { value: 20, unit: 'mm' };
const PART = {
  ...{ shape: 'cylinder', side: 'outside', diameter: LENGTH, length: LENGTH, artworkHeight: { value: 5, unit: 'mm' } },
  ...{ allowance: 'fluence loss', allowancePercent: 10, focusAt: 'mid', shownIn: 'mm' },
};
const CRITERION = { quantity: 'contrast', comparison: 'at least', value: 0.5 };

const ACCOUNTS: readonly RightsRow[] = [
  row('POST /api/auth/sign-up', 'anybody', NO_BODY),
  row('POST /api/auth/sign-in', 'anybody', NO_BODY),
  row('POST /api/auth/refresh', 'anybody', '403 wrong-origin'),
  row('POST /api/auth/sign-out', 'anybody', '403 wrong-origin'),
  { ...row('POST /api/auth/sign-out-everywhere', 'trainee', '204'), endsSessions: true },
  row('POST /api/auth/forgot-password', 'anybody', NO_BODY),
  row('POST /api/auth/reset-password', 'anybody', NO_BODY),
  row('POST /api/auth/invitation-preview', 'anybody', NO_BODY),
  row('POST /api/auth/accept-invitation', 'anybody', NO_BODY),
  row('POST /api/auth/change-password', 'trainee', NO_BODY),
  row('GET /api/auth/sessions', 'trainee', OK),
  row('DELETE /api/auth/sessions/:id', 'trainee', '404 not-found', {}),
  row('GET /api/session', 'trainee', OK),
  row('GET /api/health/live', 'anybody', OK),
  row('GET /api/health/ready', 'anybody', OK),
  row('GET /problems/:code', 'anybody', OK),
];

const SHOP: readonly RightsRow[] = [
  read('/api/shop', 'lead'),
  row('PATCH /api/shop', 'owner', NO_TAG),
  read('/api/members', 'lead'),
  read('/api/members/:id', 'lead'),
  row('PATCH /api/members/:id', 'owner', NO_TAG, { body: { role: 'operator' } }),
  row('DELETE /api/members/:id', 'owner', NO_TAG, {}),
  read('/api/members/:id/training-records', 'lead'),
  row('POST /api/members/:id/training-records', 'owner', NO_KEY, {
    body: { subject: 'Focus', taughtBy: 'Somebody', taughtOn: '2026-01-09' },
  }),
  read('/api/invitations', 'lead'),
  row('POST /api/invitations', 'owner', NO_KEY),
  row('DELETE /api/invitations/:id', 'owner', '204', {}),
  read('/api/ledger', 'operator'),
  read('/api/ledger/actors', 'operator'),
  read('/api/ledger/export.csv', 'lead'),
  read('/api/ledger/export.json', 'lead'),
  row('POST /api/ledger/verify', 'lead', OK),
  read('/api/undelivered-letters', 'owner'),
];

const EQUIPMENT: readonly RightsRow[] = [
  read('/api/machines', 'operator'),
  row('POST /api/machines', 'lead', NO_KEY),
  read('/api/machines/:machineId', 'operator'),
  row('PATCH /api/machines/:machineId', 'lead', NO_TAG, { body: { name: 'Other' } }),
  read('/api/machines/:machineId/profiles', 'operator'),
  row('POST /api/machines/:machineId/archive', 'lead', NO_TAG, {}),
  row('POST /api/machines/:machineId/restore', 'lead', NO_TAG, {}),
  read('/api/machines/:machineId/lenses', 'operator'),
  row('POST /api/machines/:machineId/lenses', 'lead', NO_KEY, { body: { lensId: ID } }),
  row('PATCH /api/machines/:machineId/lenses/:lensId', 'lead', NO_TAG, { body: { workingDistanceMm: 180 } }),
  read('/api/machines/:machineId/lenses/:lensId/spots', 'operator'),
  read('/api/machines/:machineId/calibrations', 'operator'),
  row('POST /api/machines/:machineId/calibrations', 'lead', NO_KEY, {
    body: {
      measuredOn: '2026-02-02',
      meter: 'Meter',
      wavelengthNm: 1064,
      points: [10, 50, 100].map((percent) => ({ percent, watts: percent / 5 })),
    },
  }),
  row('GET /api/machines/:machineId/calibrations/:calibrationId/watts', 'operator', NO_BODY, { query: 'percent=50' }),
  read('/api/machines/:machineId/logged-times', 'operator'),
  row('POST /api/machines/:machineId/logged-times/:loggedTimeId/corrections', 'operator', NO_KEY, {
    body: { counts: false, reason: 'Wrong piece' },
  }),
  read('/api/lenses', 'operator'),
  row('POST /api/lenses', 'lead', NO_KEY),
  read('/api/lenses/:lensId', 'operator'),
  row('PATCH /api/lenses/:lensId', 'lead', NO_TAG, { body: { name: 'Other' } }),
  row('POST /api/lenses/:lensId/archive', 'lead', NO_TAG, {}),
  row('POST /api/lenses/:lensId/restore', 'lead', NO_TAG, {}),
];

const MATERIALS: readonly RightsRow[] = [
  read('/api/materials', 'operator'),
  read('/api/materials/facets', 'operator'),
  row('POST /api/materials', 'lead', NO_KEY),
  read('/api/materials/:materialId', 'operator'),
  row('PATCH /api/materials/:materialId', 'lead', NO_TAG, { body: { name: 'Other' } }),
  row('POST /api/materials/:materialId/archive', 'lead', NO_TAG, {}),
  row('POST /api/materials/:materialId/restore', 'lead', NO_TAG, {}),
  read('/api/finishes', 'operator'),
  row('POST /api/finishes', 'lead', NO_KEY),
  read('/api/finishes/:finishId', 'operator'),
  row('PATCH /api/finishes/:finishId', 'lead', NO_TAG, { body: { name: 'Other' } }),
  row('POST /api/finishes/:finishId/archive', 'lead', NO_TAG, {}),
  row('POST /api/finishes/:finishId/restore', 'lead', NO_TAG, {}),
  read('/api/material-groups', 'operator'),
  row('POST /api/material-groups', 'lead', NO_KEY),
  read('/api/material-groups/:groupId', 'operator'),
  row('PATCH /api/material-groups/:groupId', 'lead', NO_TAG, { body: { name: 'Other' } }),
  read('/api/effects', 'operator'),
  row('POST /api/effects', 'lead', NO_KEY),
  read('/api/effects/:effectId', 'operator'),
  row('PATCH /api/effects/:effectId', 'lead', NO_TAG, { body: { name: 'Other' } }),
  row('POST /api/effects/:effectId/archive', 'lead', NO_TAG, {}),
  row('POST /api/effects/:effectId/restore', 'lead', NO_TAG, {}),
  read('/api/cautions', 'trainee'),
  row('POST /api/cautions', 'lead', NO_KEY),
  row('GET /api/cautions/for', 'trainee', NO_BODY, { query: 'materialId={material}' }),
  row('PATCH /api/cautions/:cautionId', 'lead', NO_TAG, { body: { text: 'Another text' } }),
];

const COUPONS: readonly RightsRow[] = [
  read('/api/coupons', 'operator'),
  read('/api/coupons/facets', 'operator'),
  read('/api/coupons/export.csv', 'operator'),
  row('POST /api/coupons', 'operator', NO_KEY, { body: PLAN }),
  row('POST /api/coupons/preview', 'operator', NO_BODY, { body: PLAN }),
  row('POST /api/coupons/confirmation', 'operator', NO_KEY, { body: { revisionId: '{revision}', count: 5, acknowledgedCautionIds: [] } }),
  row('POST /api/coupons/import', 'operator', NO_KEY, { body: OLD_PLATE }),
  row('POST /api/coupons/import/preview', 'operator', NO_BODY, { body: OLD_PLATE }),
  read('/api/coupons/:couponId', 'operator'),
  row('POST /api/coupons/:couponId/marking/start', 'operator', '409 coupon-state', {}),
  row('POST /api/coupons/:couponId/marking/cells', 'operator', NO_KEY, { body: { cellId: ID, cellVersion: 1, outcome: 'marked' } }),
  row('POST /api/coupons/:couponId/marking/undo', 'operator', NO_KEY, { body: { cellId: ID, cellVersion: 1 } }),
  read('/api/coupons/:couponId/logged-times', 'operator'),
  row('POST /api/coupons/:couponId/logged-times', 'operator', NO_KEY, { body: { seconds: 12 } }),
  row('POST /api/coupons/:couponId/marking/finish', 'operator', NO_KEY, { body: {} }),
  read('/api/coupons/:couponId/artwork.svg', 'operator'),
  read('/api/coupons/:couponId/cells.csv', 'operator'),
  read('/api/coupons/:couponId/inspection', 'operator'),
  read('/api/coupons/:couponId/crater-fit', 'operator'),
  row('POST /api/coupons/:couponId/crater-fit/measured-spot', 'lead', NO_KEY, { body: { shownSpotUm: 40 } }),
  row('PUT /api/coupons/:couponId/criteria', 'operator', NO_TAG, { body: { criteria: [CRITERION] } }),
  row('POST /api/coupons/:couponId/inspect', 'operator', NO_KEY, { body: {} }),
  row('POST /api/coupons/:couponId/seal', 'operator', NO_KEY, {}),
  row('POST /api/coupons/:couponId/corrections', 'operator', NO_KEY, { body: { text: 'Lot B15', reason: 'Misread' } }),
  row('PUT /api/coupons/:couponId/ratings', 'operator', NO_BODY, { body: { ratings: [{ cellId: ID, seenVersion: 1, rating: 4 }] } }),
  row('POST /api/coupons/:couponId/measurements', 'operator', NO_KEY, {
    body: { measurements: [{ cellId: ID, quantity: 'wipe-test', value: 20, method: 'manual' }] },
  }),
  read('/api/coupons/:couponId/photos', 'operator'),
  row('POST /api/coupons/:couponId/photos', 'operator', '409 coupon-sealed', {}),
  read('/api/photos/:photoId', 'operator'),
  row('PUT /api/photos/:photoId/corners', 'operator', NO_TAG, {
    body: {
      corners: [
        [0, 0],
        [1, 0],
        [1, 1],
        [0, 1],
      ].map(([x, y]) => ({ x, y })),
      foundBy: 'hand',
    },
  }),
  row('POST /api/photos/:photoId/retry', 'operator', '409 coupon-sealed', {}),
  row('GET /api/photos/:photoId/:size', 'anybody', NO_BODY),
];

const RECIPES: readonly RightsRow[] = [
  read('/api/recipes', 'operator'),
  row('POST /api/recipes', 'operator', NO_KEY, {
    body: { ...WORK, route: 'earlier-experience', reason: 'Notebook', steps: [{ purpose: 'fill', pauseAfterS: 0, ...SETTING }] },
    answer: '422 invalid-fields #/materialId',
  }),
  row('POST /api/recipes/from-cell', 'operator', NO_KEY, { body: { couponId: '{coupon}', cellId: '{cell}' } }),
  read('/api/recipes/power-shifts', 'operator'),
  read('/api/recipes/:recipeId', 'operator'),
  row('PATCH /api/recipes/:recipeId', 'operator', NO_TAG, { body: { title: 'Other' } }),
  row('POST /api/recipes/:recipeId/drafts', 'operator', NO_KEY, { body: {} }),
  row('GET /api/revisions/compare', 'operator', NO_BODY, { query: 'ids={revision},{draft}' }),
  read('/api/revisions/:revisionId', 'operator'),
  row('PATCH /api/revisions/:revisionId', 'operator', NO_TAG, { body: { reason: 'Other' } }),
  row('DELETE /api/revisions/:revisionId', 'operator', NO_TAG, {}),
  row('PUT /api/revisions/:revisionId/evidence', 'operator', NO_TAG, { body: { basisCellIds: [], confirmationCellIds: [] } }),
  read('/api/revisions/:revisionId/evidence/candidates', 'operator'),
  read('/api/revisions/:revisionId/checks', 'operator'),
  read('/api/revisions/:revisionId/transfers/targets', 'operator'),
  row('POST /api/revisions/:revisionId/transfers/preview', 'operator', NO_BODY, { body: { machineId: '{machine}', lensId: '{lens}' } }),
  row('POST /api/revisions/:revisionId/transfers', 'operator', NO_KEY, { body: { machineId: '{machine}', lensId: '{lens}' } }),
  row('POST /api/revisions/:revisionId/submit', 'operator', NO_KEY, { body: { acknowledgedCautionIds: [] } }),
  row('POST /api/revisions/:revisionId/recall', 'operator', NO_KEY, { body: {} }),
  row('POST /api/revisions/:revisionId/return', 'lead', NO_KEY, { body: { comment: 'Burn a coupon' } }),
  row('POST /api/revisions/:revisionId/approve', 'lead', NO_KEY, {
    body: { password: '{password}', contentHash: 'a'.repeat(64), acknowledgedCautionIds: [] },
  }),
  row('POST /api/revisions/:revisionId/withdraw', 'lead', NO_KEY, { body: { password: '{password}', reason: 'Burr' } }),
  read('/api/sign-offs/queue', 'operator'),
];

const FLOOR: readonly RightsRow[] = [
  read('/api/finder', 'trainee'),
  // It draws the id that it is given and looks nothing up, so it has nothing to tell of another shop.
  row('GET /api/finder/sheet-code', 'trainee', NO_BODY, { query: 'recipeId={recipe}', answer: OK }),
  row('GET /api/find', 'trainee', NO_BODY),
  read('/api/runs', 'trainee'),
  row('POST /api/runs', 'trainee', NO_KEY, {
    body: { clientId: ID, kind: 'production', revisionId: '{revision}', lensFittedId: '{lens}', ticks: [] },
  }),
  read('/api/runs/export.csv', 'trainee'),
  read('/api/runs/start-sheet/:revisionId', 'trainee'),
  read('/api/runs/part-ground/:revisionId', 'trainee'),
  read('/api/runs/timing/:revisionId', 'trainee'),
  row('GET /api/runs/:run', 'trainee', { trainee: '404 not-found', operator: OK, lead: OK, owner: OK }, {}),
  row('PATCH /api/runs/:runId/ticks', 'trainee', NO_BODY, { body: { tick: [], untick: [] } }),
  row('GET /api/runs/:runId/part-set-up', 'trainee', { trainee: '404 not-found', operator: OK, lead: OK, owner: OK }, {}),
  row('POST /api/runs/:runId/part-set-up', 'trainee', NO_KEY, { body: PART }),
  row('GET /api/runs/:runId/logged-times', 'trainee', { trainee: '404 not-found', operator: OK, lead: OK, owner: OK }, {}),
  row('POST /api/runs/:runId/logged-times', 'trainee', NO_KEY, { body: { seconds: 12, widthMm: 20, heightMm: 10 } }),
  row('POST /api/runs/:runId/first-piece', 'trainee', NO_KEY, { body: { ok: true } }),
  row('POST /api/runs/:runId/finish', 'trainee', NO_KEY, { body: { good: 1, scrap: 0 } }),
  row('POST /api/runs/:runId/bad-result', 'trainee', NO_KEY, { body: { outcome: 'burr' } }),
  read('/api/holds', 'trainee'),
  row('POST /api/holds', 'lead', NO_KEY, { body: { recipeId: '{recipe}', reason: 'Burr' } }),
  row('POST /api/holds/:holdId/release', 'lead', NO_KEY, { body: { reason: 'Mended' } }),
  read('/api/setting-requests', 'trainee'),
  row('POST /api/setting-requests', 'trainee', NO_KEY, { body: { materialId: '{material}' }, answer: '422 invalid-fields #/materialId' }),
  row('POST /api/setting-requests/:requestId/answer', 'operator', NO_KEY, { body: { answer: 'R-0003', state: 'answered' } }),
  read('/api/deviations', 'operator'),
  row('POST /api/deviations', 'lead', NO_KEY, {
    body: { revisionId: '{revision}', description: 'Slower', reason: 'Thick coat', maximumQuantity: 10 },
  }),
];

export const RIGHTS_MATRIX: readonly RightsRow[] = [...ACCOUNTS, ...SHOP, ...EQUIPMENT, ...MATERIALS, ...COUPONS, ...RECIPES, ...FLOOR];
