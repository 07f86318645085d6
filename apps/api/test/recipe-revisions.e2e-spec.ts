import { randomUUID } from 'node:crypto';
import type { CouponDto } from '../src/coupons/dto/coupon.dto';
import type { InspectionDto } from '../src/coupons/dto/inspection.dto';
import type { CalibrationDto } from '../src/machines/dto/calibration.dto';
import type { ComparisonDto } from '../src/recipes/dto/comparison.dto';
import type { EvidenceCandidatesDto } from '../src/recipes/dto/evidence.dto';
import type { RecipeRevisionDto } from '../src/recipes/dto/recipe-revision.dto';
import { ShopsService } from '../src/shops/shops.service';
import { createTestApp, type TestApp } from './support/app';
import { typed } from './support/coupons';
import { asSuperuser } from './support/database';
import { created } from './support/equipment';
import type { TestMember } from './support/factories';
import { makeMarkedCoupon } from './support/inspections';
import { expectProblem, pointersOf } from './support/problem';
import {
  call,
  changeDraft,
  cite,
  draftFromCell,
  makeProvedCoupon,
  makeProvedDraft,
  makeRecipeShop,
  makeSubmitted,
  proveAgain,
  type RecipeShop,
  read,
} from './support/recipes';

let test: TestApp;
let shop: RecipeShop;
let elsewhere: RecipeShop;
let coupon: CouponDto;
let draft: RecipeRevisionDto;

beforeAll(async () => {
  test = await createTestApp();
  [shop, elsewhere] = [await makeRecipeShop(test), await makeRecipeShop(test)];
  coupon = await makeMarkedCoupon(test, shop);
});
beforeEach(async () => {
  draft = await draftFromCell(test, shop, coupon);
});
afterAll(() => test.close());

const patch = (
  payload: object,
  { as = shop.operator, version = draft.version, id = draft.id }: { as?: TestMember; version?: number; id?: string } = {},
) => call(test, as, { method: 'PATCH', url: `/revisions/${id}`, version, payload });
const values = (given: object = {}) => ({
  powerPercent: typed(20, 'percentFromZero'),
  speedMmPerS: typed(400, 'mm/s'),
  frequencyKhz: typed(400, 'kHz'),
  pulseWidthNs: typed(30, 'ns'),
  lineSpacingUm: typed(0.012, 'mm'),
  passes: typed(1, 'count'),
  ...given,
});
const step = (given: object = {}, purpose = 'anneal') => ({
  purpose,
  values: values(given),
  fill: 'both directions',
  assist: 'none',
  pauseAfterS: 0,
});

describe('PATCH /api/revisions/:id', () => {
  it('keeps steps, set-up, limits, scope, reason and dates as they were typed', async () => {
    const payload = {
      steps: [step(), { ...step({ speedMmPerS: typed(0.8, 'm/s') }, 'clean-up'), delaysUs: { laserOn: 50 }, pauseAfterS: 20 }],
      setUpSteps: [
        { text: 'Clamp the tag', caution: 'Edges are sharp', mustTick: true },
        { text: 'Wipe with isopropanol', mustTick: false },
      ],
      limits: { thicknessMm: { from: 0.8, to: 2 }, notes: 'Flat tags only' },
      scope: { featureKind: 'stroke-text', featureSizeMm: { from: 1 } },
      reason: 'Rim stayed pale.',
      effectiveFrom: '2999-01-01T06:00:00Z',
      reviewDue: '2999-06-01T06:00:00Z',
      acknowledgedCautionIds: draft.cautions.map(({ id }) => id),
    };
    const after = (await patch(payload)).json<RecipeRevisionDto>();
    expect(after).toMatchObject({
      version: draft.version + 1,
      steps: [{ purpose: 'anneal' }, { purpose: 'clean-up', pauseAfterS: 20, parameters: { delaysUs: { laserOn: 50 } } }],
      setUpSteps: payload.setUpSteps,
      limits: payload.limits,
      scope: payload.scope,
      reason: payload.reason,
      effectiveFrom: '2999-01-01T06:00:00.000Z',
    });
    expect(after.steps[1]?.parameters.values.speedMmPerS).toEqual({ entered: { value: 0.8, unit: 'm/s' }, physical: 800 });
    expect(after.cautions.every(({ isAcknowledged }) => isAcknowledged)).toBe(true);
    expect(after.contentHash).not.toBe(draft.contentHash);
    expect((await read<RecipeRevisionDto>(test, shop.operator, `/revisions/${draft.id}`)).contentHash).toBe(after.contentHash);
  });

  it('works the watts out anew for another calibration and leaves what was typed', async () => {
    const later = await created<CalibrationDto>(test, shop.lead, `/api/machines/${shop.machine.id}/calibrations`, {
      ...{
        measuredOn: new Date().toISOString().slice(0, 10),
        meter: 'Bench meter 3',
        wavelengthNm: 1064,
        frequencyKhz: 400,
        pulseWidthNs: 30,
      },
      points: [10, 50, 100].map((percent) => ({ percent, watts: percent * 0.15 })),
    });
    const after = await changeDraft(test, shop.operator, draft, { calibrationId: later.id });
    const [before] = draft.steps;
    expect(after.steps[0]?.parameters).toEqual({ ...before?.parameters, power: { watts: expect.closeTo(3, 9), basis: 'calibration' } });
    expect(after.calibration).toMatchObject({ id: later.id });
    expect((await changeDraft(test, shop.operator, after, { calibrationId: null })).steps[0]?.parameters.power).toMatchObject({
      basis: 'not calibrated',
    });
  });

  it('names every wrong field of a step at its place, with the nearest values', async () => {
    const problem = expectProblem(
      await patch({
        steps: [
          step({ powerPercent: typed(120, 'percentFromZero'), hatchAngleDeg: typed(45, 'deg') }),
          step({ passes: typed(1.5, 'count') }),
        ],
        setUpSteps: [{ text: 'Look', photoId: randomUUID(), mustTick: true }],
        limits: { thicknessMm: { from: 4, to: 1 } },
        scope: { materialGroupId: randomUUID() },
        effectiveFrom: '2001-01-01T00:00:00Z',
        reviewDue: '2001-01-01T00:00:00Z',
        calibrationId: elsewhere.calibration.id,
      }),
      422,
      'invalid-fields',
    );
    expect(pointersOf(problem)).toEqual([
      '#/calibrationId',
      '#/effectiveFrom',
      '#/limits/thicknessMm',
      '#/reviewDue',
      '#/reviewDue',
      '#/scope/materialGroupId',
      '#/setUpSteps/0/photoId',
      '#/steps/0/values/hatchAngleDeg',
      '#/steps/0/values/powerPercent',
      '#/steps/1/values/passes',
    ]);
    expect(problem.errors?.find(({ pointer }) => pointer.endsWith('powerPercent'))?.detail).toContain('100 %');
  });

  it('refuses a body that is no revision', async () => {
    const bad = {
      steps: [{ purpose: 'sing', values: { speedMmPerS: { value: 'fast', unit: 'mph' } }, fill: 'x', assist: 'y' }],
      route: 'z',
    };
    expect(pointersOf(expectProblem(await patch(bad), 422, 'invalid-fields'))).toEqual([
      '#/route',
      '#/steps/0/assist',
      '#/steps/0/fill',
      '#/steps/0/purpose',
      '#/steps/0/values/speedMmPerS/unit',
      '#/steps/0/values/speedMmPerS/value',
    ]);
  });

  it('never loses an edit: an older version gets the present state instead', async () => {
    await changeDraft(test, shop.operator, draft, { reason: 'First' });
    const problem = expectProblem(await patch({ reason: 'Second' }, { as: shop.lead }), 412, 'stale-version');
    expect(problem.current).toMatchObject({ reason: 'First', version: draft.version + 1 });
    expectProblem(
      await call(test, shop.operator, { method: 'PATCH', url: `/revisions/${draft.id}`, payload: {} }),
      428,
      'version-required',
    );
  });

  it('lets a lead write the grounds and nobody else', async () => {
    expectProblem(await patch({ route: 'customer-given', grounds: 'The customer says so.' }), 403, 'not-permitted');
    const changed = await changeDraft(test, shop.operator, draft, { route: 'customer-given' });
    const grounded = await changeDraft(test, shop.lead, changed, { grounds: 'Customer drawing 4711, revision C.' });
    expect(grounded).toMatchObject({
      grounds: 'Customer drawing 4711, revision C.',
      groundsBy: { id: shop.lead.id, name: shop.lead.printedName },
    });
  });

  it('begins a copy without the grounds, which were written for the setting as it was', async () => {
    const own = await draftFromCell(test, shop, coupon);
    const changed = await changeDraft(test, shop.operator, own, { route: 'customer-given' });
    const grounded = await changeDraft(test, shop.lead, changed, { grounds: 'Customer drawing 4711, revision C.' });
    const payload = { basedOnRevisionId: grounded.id, reason: 'Deeper' };
    const copy = await created<RecipeRevisionDto>(test, shop.lead, `/api/recipes/${own.recipe.id}/drafts`, payload);
    expect(copy).toMatchObject({ route: 'customer-given', grounds: '', groundsBy: null, basedOnId: grounded.id });
  });

  it('refuses anonymous callers, trainees, other operators’ drafts and other shops', async () => {
    const leads = await draftFromCell(test, shop, coupon, { as: shop.lead });
    expectProblem(await patch({ reason: 'Mine' }, { id: leads.id, version: leads.version }), 403, 'not-permitted');
    expectProblem(await patch({}, { as: shop.trainee }), 403, 'not-permitted');
    expectProblem(await patch({}, { as: elsewhere.owner }), 404, 'not-found');
    expectProblem(
      await call(test, undefined, { method: 'PATCH', url: `/revisions/${draft.id}`, version: 1, payload: {} }),
      401,
      'not-signed-in',
    );
  });

  it('refuses every edit of a submitted revision and carries its state', async () => {
    const submitted = await makeSubmitted(test, shop);
    const on = { id: submitted.id, version: submitted.version };
    expect(expectProblem(await patch({ reason: 'Late' }, on), 409, 'revision-state').current).toMatchObject({ state: 'in_review' });
    const cells = { basisCellIds: [], confirmationCellIds: [] };
    const url = `/revisions/${submitted.id}`;
    expectProblem(
      await call(test, shop.operator, { method: 'PUT', url: `${url}/evidence`, version: on.version, payload: cells }),
      409,
      'revision-state',
    );
    expectProblem(await call(test, shop.lead, { method: 'DELETE', url, version: on.version }), 409, 'revision-state');
  });
});

describe('DELETE /api/revisions/:id', () => {
  const discard = (as: TestMember | undefined, { id, version }: RecipeRevisionDto) =>
    call(test, as, { method: 'DELETE', url: `/revisions/${id}`, version });

  it('discards a draft; the ledger keeps that it was', async () => {
    expect((await discard(shop.operator, draft)).statusCode).toBe(204);
    expectProblem(await call(test, shop.operator, { url: `/revisions/${draft.id}` }), 404, 'not-found');
    const events = await read<{ items: { action: string }[] }>(test, shop.lead, `/ledger?subjectId=${draft.id}`);
    expect(events.items.map(({ action }) => action)).toEqual(['revision.discarded', 'revision.drafted']);
  });

  it('keeps a draft that a coupon was planned to prove', async () => {
    await proveAgain(test, shop, draft, { count: 1 });
    expectProblem(await discard(shop.operator, draft), 409, 'still-in-use');
  });

  it('refuses anonymous callers, trainees, other shops and an older version', async () => {
    expectProblem(await discard(undefined, draft), 401, 'not-signed-in');
    expectProblem(await discard(shop.trainee, draft), 403, 'not-permitted');
    expectProblem(await discard(elsewhere.owner, draft), 404, 'not-found');
    expectProblem(await discard(shop.operator, { ...draft, version: 9 }), 412, 'stale-version');
  });
});

describe('PUT /api/revisions/:id/evidence', () => {
  const put = (payload: object, { as = shop.operator, version = draft.version }: { as?: TestMember; version?: number } = {}) =>
    call(test, as, { method: 'PUT', url: `/revisions/${draft.id}/evidence`, version, payload });
  const idOf = (address: string) => coupon.cells.find((cell) => cell.address === address)?.id ?? '';

  it('replaces basis and confirmation, and says where a cell differs from the setting', async () => {
    const proof = await proveAgain(test, shop, draft, { count: 2 });
    const confirmation = proof.cells.map(({ id }) => id);
    const cited = await cite(test, shop.operator, draft, { basis: [idOf('B1'), idOf('B2')], confirmation });
    expect(cited.evidence.basis.map(({ address, essentialDifferences }) => [address, essentialDifferences])).toEqual([
      ['B1', []],
      ['B2', ['Power']],
    ]);
    expect(cited.evidence.confirmation).toMatchObject([
      {
        couponCode: proof.code,
        couponState: 'sealed',
        lot: 'L-2',
        meets: true,
        criteria: [{ value: 26, method: 'colorimeter', meets: true }],
      },
      { measurements: [{ quantity: 'lightness', value: 26.5, unit: '1' }] },
    ]);
    expect(cited.contentHash).not.toBe(draft.contentHash);
    expect((await cite(test, shop.operator, cited, { basis: [idOf('B1')], confirmation: [] })).contentHash).toBe(draft.contentHash);
  });

  it('offers the cells that could be cited', async () => {
    const proof = await proveAgain(test, shop, draft, { count: 1 });
    const candidates = await read<EvidenceCandidatesDto>(test, shop.operator, `/revisions/${draft.id}/evidence/candidates`);
    expect(candidates.basis.map(({ couponId }) => couponId)).toContain(coupon.id);
    expect(candidates.basis.map(({ address, couponId }) => `${couponId} ${address}`)).not.toContain(`${coupon.id} A2`);
    expect(candidates.confirmation.every(({ essentialDifferences }) => essentialDifferences.length === 0)).toBe(true);
    expect(candidates.confirmation.map(({ couponId }) => couponId)).toContain(proof.id);
    expectProblem(await call(test, elsewhere.operator, { url: `/revisions/${draft.id}/evidence/candidates` }), 404, 'not-found');
    expectProblem(await call(test, shop.trainee, { url: `/revisions/${draft.id}/evidence/candidates` }), 403, 'not-permitted');
    expectProblem(await call(test, undefined, { url: `/revisions/${draft.id}/evidence/candidates` }), 401, 'not-signed-in');
  });

  it('offers no cell of the coupon that the setting comes from as its proof', async () => {
    const { basis, confirmation } = await read<EvidenceCandidatesDto>(test, shop.operator, `/revisions/${draft.id}/evidence/candidates`);
    expect(basis.map(({ couponId }) => couponId)).toContain(coupon.id);
    expect(confirmation.map(({ couponId }) => couponId)).not.toContain(coupon.id);
  });

  it('proposes for a proof the criteria that the coupon of its basis was judged by', async () => {
    const proved = await makeProvedCoupon(test, shop);
    const { criteria, proposedCriteria: ofEffect } = await read<InspectionDto>(test, shop.operator, `/coupons/${proved.id}/inspection`);
    expect(criteria).not.toEqual(ofEffect);
    const { id: revisionId } = await draftFromCell(test, shop, proved, { as: shop.lead });
    const planned = await created<CouponDto>(test, shop.operator, '/api/coupons/confirmation', { revisionId, count: 2 });
    const { proposedCriteria } = await read<InspectionDto>(test, shop.operator, `/coupons/${planned.id}/inspection`);
    expect(proposedCriteria).toEqual(criteria);
  });

  it('neither offers nor takes the cells of a coupon of equal cells as what the setting comes from', async () => {
    const proof = await proveAgain(test, shop, draft, { count: 1 });
    const other = await proveAgain(test, shop, await draftFromCell(test, shop, coupon, { as: shop.lead }), { count: 1 });
    const candidates = await read<EvidenceCandidatesDto>(test, shop.operator, `/revisions/${draft.id}/evidence/candidates`);
    const offered = candidates.basis.map(({ couponId }) => couponId);
    expect(offered).not.toContain(proof.id);
    expect(offered).not.toContain(other.id);
    const basisCellIds = [idOf('B1'), proof.cells[0]?.id, other.cells[0]?.id];
    const problem = expectProblem(await put({ basisCellIds, confirmationCellIds: [] }), 422, 'invalid-fields');
    expect(pointersOf(problem)).toEqual(['#/basisCellIds/1', '#/basisCellIds/2']);
  });

  it('refuses cells of other shops, cells that were skipped, and a basis that proves itself', async () => {
    const foreign = await makeMarkedCoupon(test, elsewhere);
    const problem = expectProblem(
      await put({ basisCellIds: [foreign.cells[0]?.id, idOf('A2'), idOf('B1')], confirmationCellIds: [idOf('B1')] }),
      422,
      'invalid-fields',
    );
    expect(pointersOf(problem)).toEqual(['#/basisCellIds/0', '#/basisCellIds/1', '#/confirmationCellIds/0']);
  });

  it('refuses anonymous callers, trainees, other shops, an older version and a bad body', async () => {
    const none = { basisCellIds: [], confirmationCellIds: [] };
    const url = `/revisions/${draft.id}/evidence`;
    expectProblem(await call(test, undefined, { method: 'PUT', url, version: 1, payload: none }), 401, 'not-signed-in');
    expectProblem(await put(none, { as: shop.trainee }), 403, 'not-permitted');
    expectProblem(await put(none, { as: elsewhere.lead }), 404, 'not-found');
    expectProblem(await put(none, { version: 7 }), 412, 'stale-version');
    expect(pointersOf(expectProblem(await put({ basisCellIds: ['x'] }), 422, 'invalid-fields'))).toEqual([
      '#/basisCellIds',
      '#/confirmationCellIds',
    ]);
  });
});

describe('GET /api/revisions/compare', () => {
  const compare = (ids: readonly string[], as: TestMember | undefined = shop.operator, referenceId?: string) =>
    call(test, as, { url: `/revisions/compare?ids=${ids.join(',')}${referenceId === undefined ? '' : `&referenceId=${referenceId}`}` });

  it('shows values in the reference’s units with the size of each change, and no change between 0.4 m/s and 400 mm/s', async () => {
    const other = await changeDraft(test, shop.lead, await draftFromCell(test, shop, coupon, { as: shop.lead }), {
      steps: [{ ...step({ speedMmPerS: typed(0.4, 'm/s'), powerPercent: typed(30, 'percentFromZero') }), pauseAfterS: 5 }],
    });
    const comparison = (await compare([draft.id, other.id])).json<ComparisonDto>();
    expect(comparison.referenceId).toBe(draft.id);
    const row = (group: string, key: string) => comparison.rows.find((found) => found.group === group && found.key === key);
    expect(row('entered', 'speedMmPerS')).toMatchObject({
      ...{ unit: 'mm/s', label: 'Speed', step: 1, isSame: true },
      values: [
        { value: 400, change: 'reference' },
        { value: 400, change: 'same', size: null },
      ],
    });
    expect(row('entered', 'powerPercent')).toMatchObject({
      unit: '%',
      isSame: false,
      values: [{}, { value: 30, size: { points: 10, percent: null } }],
    });
    expect(row('entered', 'pauseAfterS')).toMatchObject({ values: [{ value: 0 }, { value: 5, change: 'changed' }] });
    expect(row('work', 'powerW')).toMatchObject({ unit: 'W', values: [{}, { size: { percent: expect.closeTo(50, 9) } }] });
    expect(row('work', 'arealDose')).toMatchObject({ isSame: false, values: [{}, { size: { percent: expect.closeTo(50, 9) } }] });
    expect(row('work', 'pulsePitch')).toMatchObject({ isSame: true });
  });

  it('reads the policy of the shop once, however many revisions are compared', async () => {
    const other = await draftFromCell(test, shop, coupon, { as: shop.lead });
    const reading = jest.spyOn(test.app.get(ShopsService, { strict: false }), 'getRow');
    try {
      expect((await compare([draft.id, other.id])).json<ComparisonDto>().revisions).toHaveLength(2);
      expect(reading).toHaveBeenCalledTimes(1);
    } finally {
      reading.mockRestore();
    }
  });

  it('compares with the revision that is asked for, and shows the reference cell’s measurements', async () => {
    const proved = await makeProvedCoupon(test, shop);
    const [first, second] = [
      await draftFromCell(test, shop, proved, { address: 'A1' }),
      await draftFromCell(test, shop, proved, { address: 'B2', as: shop.lead }),
    ];
    const comparison = (await compare([first.id, second.id], shop.operator, second.id)).json<ComparisonDto>();
    expect(comparison.referenceId).toBe(second.id);
    expect(comparison.rows.find(({ key }) => key === 'lightness')).toMatchObject({
      group: 'mark',
      label: 'Lightness',
      values: [
        { value: 26, change: 'changed', size: { delta: -1.5 } },
        { value: 27.5, change: 'reference' },
      ],
    });
    expect(comparison.revisions.map(({ id }) => id)).toEqual([first.id, second.id]);
  });

  it('refuses one or five revisions, one twice, foreign ones, trainees and anonymous callers', async () => {
    const five = Array.from({ length: 5 }, () => randomUUID());
    for (const ids of [[draft.id], five, [draft.id, draft.id], ['x', 'y']])
      expect(pointersOf(expectProblem(await compare(ids), 422, 'invalid-fields'))).toEqual(['#/ids']);
    const foreign = await draftFromCell(test, elsewhere, await makeMarkedCoupon(test, elsewhere));
    expectProblem(await compare([draft.id, foreign.id]), 404, 'not-found');
    expectProblem(await compare([draft.id, foreign.id], shop.trainee), 403, 'not-permitted');
    expectProblem(await call(test, undefined, { url: `/revisions/compare?ids=${draft.id},${foreign.id}` }), 401, 'not-signed-in');
  });
});

describe('GET /api/revisions/:id', () => {
  it('tells what changed against the approved revision, with class and size', async () => {
    const proved = await makeProvedDraft(test, shop);
    await asSuperuser(test, async (sql) => {
      await sql`update revision set state = 'in_review', number = 1, content_hash = 'x' where id = ${proved.id}`;
      await sql`update revision set state = 'approved', approved_at = now() where id = ${proved.id}`;
    });
    const copy = await created<RecipeRevisionDto>(test, shop.operator, `/api/recipes/${proved.recipe.id}/drafts`, {});
    const changed = await changeDraft(test, shop.operator, copy, {
      steps: [{ ...step({ speedMmPerS: typed(200, 'mm/s') }), assist: 'nitrogen' }],
    });
    expect(changed.changes).toMatchObject([
      {
        step: 1,
        change: 'changed',
        changes: [
          { item: 'speedMmPerS', class: 'essential', before: '400 mm/s', after: '200 mm/s', size: { percent: -50 } },
          { item: 'assist', class: 'supplementary', before: 'None', after: 'Nitrogen', size: null },
        ],
      },
    ]);
    expect(changed.comparedWith).toMatchObject({ id: proved.id, number: 1 });
  });

  it('refuses anonymous callers, trainees, other shops and what is no id', async () => {
    const url = `/revisions/${draft.id}`;
    expectProblem(await call(test, undefined, { url }), 401, 'not-signed-in');
    expectProblem(await call(test, shop.trainee, { url }), 403, 'not-permitted');
    expectProblem(await call(test, elsewhere.owner, { url }), 404, 'not-found');
    expectProblem(await call(test, shop.operator, { url: '/revisions/nothing' }), 404, 'not-found');
  });
});
