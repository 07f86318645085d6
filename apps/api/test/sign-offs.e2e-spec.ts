import { randomUUID } from 'node:crypto';
import type { RecipeDto } from '../src/recipes/dto/recipe.dto';
import type { RecipeRevisionDto } from '../src/recipes/dto/recipe-revision.dto';
import type { ApprovalChecksDto } from '../src/sign-offs/dto/checks.dto';
import type { SignOffQueueDto } from '../src/sign-offs/dto/sign-off-queue.dto';
import { createTestApp, type TestApp } from './support/app';
import { typed } from './support/coupons';
import { asSuperuser } from './support/database';
import { created, makeMaterial } from './support/equipment';
import { makeMember, type TestMember } from './support/factories';
import { expectProblem, pointersOf } from './support/problem';
import {
  acts,
  call,
  changeDraft,
  cite,
  draftFromCell,
  FOR_CUSTOMER,
  makeApproved,
  makeProvedCoupon,
  makeProvedDraft,
  makeRecipeShop,
  makeSubmitted,
  proveAgain,
  type RecipeShop,
  read,
} from './support/recipes';

let test: TestApp;
let elsewhere: RecipeShop;
let shop: RecipeShop;

beforeAll(async () => {
  test = await createTestApp();
  [shop, elsewhere] = [await makeRecipeShop(test), await makeRecipeShop(test)];
});
afterAll(() => test.close());

const checksOf = (id: string, as = shop.operator) => read<ApprovalChecksDto>(test, as, `/revisions/${id}/checks`);
const failing = ({ items }: { items: readonly { key: string; passes: boolean; isAdvisory: boolean }[] }) =>
  items.filter(({ passes, isAdvisory }) => !passes && !isAdvisory).map(({ key }) => key);
const mailsTo = (member: TestMember) =>
  asSuperuser(
    test,
    (sql) => sql<{ kind: string }[]>`select kind from outbox where payload->'to'->>'address' = ${member.email} order by id`,
  );

describe('the way of a revision', () => {
  it('goes from a cell over proof, submission and signature to the approved setting', async () => {
    const submitted = await makeSubmitted(test, shop);
    expect(submitted).toMatchObject({
      number: 1,
      state: 'in_review',
      allowedActions: ['recall', 'copy', 'transfer', 'start-confirmation'],
    });
    const answer = await acts(test, submitted.id).approve(shop.lead, submitted, { comment: 'Even and dark.' });
    const approved = answer.json<RecipeRevisionDto>();
    expect(approved).toMatchObject({
      state: 'approved',
      contentHash: submitted.contentHash,
      reviewDue: expect.any(String),
      signOffs: [
        { meaning: 'submitted for review', printedName: shop.operator.printedName, role: 'operator', method: 'session', isByAuthor: true },
        {
          ...{ meaning: 'approved', printedName: shop.lead.printedName, role: 'lead', method: 'password', comment: 'Even and dark.' },
          ...{ contentHash: submitted.contentHash, ledgerHashBefore: expect.stringMatching(/^[0-9a-f]{64}$/), isByAuthor: false },
        },
      ],
    });
    const days = (new Date(approved.reviewDue ?? 0).getTime() - new Date(approved.approvedAt ?? 0).getTime()) / 86_400_000;
    expect(Math.round(days)).toBe(365);
    const recipe = await read<RecipeDto>(test, shop.operator, `/recipes/${submitted.recipe.id}`);
    expect(recipe).toMatchObject({ state: 'approved', current: { id: submitted.id }, underWay: null });
    expect((await mailsTo(shop.lead)).at(-1)).toEqual({ kind: 'revision-submitted' });
    expect((await mailsTo(shop.operator)).at(-1)).toEqual({ kind: 'revision-approved' });
  });

  it('supersedes the approved revision by a proved change, without a gap in the numbers', async () => {
    const first = await makeApproved(test, shop);
    const copy = await created<RecipeRevisionDto>(test, shop.operator, `/api/recipes/${first.recipe.id}/drafts`, {});
    const [step] = copy.steps;
    const values = { ...Object.fromEntries(Object.entries(step?.parameters.values ?? {}).map(([key, { entered }]) => [key, entered])) };
    const steps = [{ purpose: 'anneal', values: { ...values, speedMmPerS: typed(300, 'mm/s') }, fill: 'both directions', assist: 'none' }];
    const changed = await changeDraft(test, shop.operator, copy, { steps, reason: 'Darker at the rim.' });
    expect(failing(await checksOf(changed.id))).toEqual(['cautions-author', 'confirmation', 'new-confirmation']);
    const proof = await proveAgain(test, shop, changed);
    const basis = changed.evidence.basis.map(({ cellId }) => cellId);
    const cited = await cite(test, shop.operator, changed, { basis, confirmation: proof.cells.map(({ id }) => id) });
    const submitted = (await acts(test, cited.id).submit(shop.operator, cited)).json<RecipeRevisionDto>();
    expect(submitted).toMatchObject({ number: 2, comparedWith: { number: 1 }, changes: [{ changes: [{ item: 'speedMmPerS' }] }] });
    expect((await acts(test, cited.id).approve(shop.lead, submitted)).json<RecipeRevisionDto>().state).toBe('approved');
    const recipe = await read<RecipeDto>(test, shop.operator, `/recipes/${first.recipe.id}`);
    expect(recipe.revisions.map(({ number, state }) => [number, state])).toEqual([
      [2, 'approved'],
      [1, 'superseded'],
    ]);
  });

  it('lets a change that is not essential cite the old proof and lists it', async () => {
    const first = await makeApproved(test, shop);
    const copy = await created<RecipeRevisionDto>(test, shop.operator, `/api/recipes/${first.recipe.id}/drafts`, {});
    const [step] = copy.steps;
    const values = Object.fromEntries(Object.entries(step?.parameters.values ?? {}).map(([key, { entered }]) => [key, entered]));
    const steps = [{ purpose: 'anneal', values, fill: 'both directions', assist: 'air', delaysUs: { laserOn: 20 } }];
    const changed = await changeDraft(test, shop.operator, copy, { steps, reason: 'Air keeps the glass clean.' });
    const checks = await checksOf(changed.id);
    expect(failing(checks)).toEqual(['cautions-author']);
    expect(checks.items.find(({ key }) => key === 'changes')?.detail).toContain('step 1: assist, laser-on delay');
    expect((await acts(test, changed.id).submit(shop.operator, changed)).statusCode).toBe(200);
  });
});

describe('GET /api/revisions/:id/checks', () => {
  it('lists everything that fails at once, each with a way out', async () => {
    const coupon = await makeProvedCoupon(test, shop, { isSealed: false });
    const draft = await changeDraft(test, shop.operator, await draftFromCell(test, shop, coupon), { reason: '', calibrationId: null });
    const checks = await checksOf(draft.id);
    expect(failing(checks)).toEqual(['reason', 'cautions-author', 'basis', 'confirmation', 'calibration']);
    expect(checks).toMatchObject({ maySubmit: false, mayApprove: false, contentHash: draft.contentHash });
    expect(checks.confirmation).toMatchObject({ markCount: 0, neededCount: 3 });
    for (const { detail } of checks.items) expect(detail).not.toBe('');
  });

  it('shows the confirmation in numbers and why a mark does not count', async () => {
    const draft = await draftFromCell(test, shop, await makeProvedCoupon(test, shop));
    const good = await proveAgain(test, shop, draft, { count: 2 });
    const pale = await proveAgain(test, shop, draft, { count: 2, lightness: 29.9, lot: 'L-3' });
    const confirmation = [...good.cells, ...pale.cells].map(({ id }) => id);
    const cited = await cite(test, shop.operator, draft, { basis: draft.evidence.basis.map(({ cellId }) => cellId), confirmation });
    const checks = await checksOf(cited.id);
    expect(checks.confirmation).toMatchObject({
      ...{ markCount: 3, notCountingCount: 1, lots: ['L-2', 'L-3'], dayCount: 1 },
      spreads: [{ quantity: 'lightness', n: 3, lowest: 26, highest: 29.9, mean: expect.closeTo(27.466_666_7, 6) }],
    });
    expect(checks.items.find(({ key }) => key === 'confirmation')?.detail).toContain(`${pale.code} A2: it does not meet every criterion.`);
  });

  it('tells an older reading, a moved reading, a changed machine and an overlapping recipe', async () => {
    const own = await makeRecipeShop(test);
    const given = { scope: FOR_CUSTOMER('Dial works 7') };
    await makeApproved(test, own, given);
    const draft = await makeProvedDraft(test, own, given);
    const old = new Date(Date.now() - 200 * 86_400_000).toISOString().slice(0, 10);
    const reading = { meter: 'Bench meter 3', wavelengthNm: 1064, frequencyKhz: 400, pulseWidthNs: 30 };
    const points = [10, 50, 100].map((percent) => ({ percent, watts: percent * 0.17 }));
    const aged = await created<{ id: string }>(test, own.lead, `/api/machines/${own.machine.id}/calibrations`, {
      ...reading,
      measuredOn: old,
      points,
    });
    const changed = await changeDraft(test, own.operator, draft, { calibrationId: aged.id });
    const physical = { ...own.machine.profile.physical, m2: 1.7 };
    await call(test, own.lead, {
      method: 'PATCH',
      url: `/machines/${own.machine.id}`,
      version: own.machine.version,
      payload: { physical },
    });
    const checks = await checksOf(changed.id, own.operator);
    expect(failing(checks)).toEqual(['cautions-author', 'profile', 'calibration', 'scope']);
    expect(checks.items.find(({ key }) => key === 'power-shift')).toMatchObject({ passes: false, isAdvisory: true });
  });

  it('refuses anonymous callers, trainees and other shops', async () => {
    const draft = await draftFromCell(test, shop, await makeProvedCoupon(test, shop, { isSealed: false }));
    const url = `/revisions/${draft.id}/checks`;
    expectProblem(await call(test, undefined, { url }), 401, 'not-signed-in');
    expectProblem(await call(test, shop.trainee, { url }), 403, 'not-permitted');
    expectProblem(await call(test, elsewhere.owner, { url }), 404, 'not-found');
  });
});

describe('submitting', () => {
  it('is refused with every failing check, for whoever did not write it, and for an older version', async () => {
    const draft = await draftFromCell(test, shop, await makeProvedCoupon(test, shop, { isSealed: false }));
    const { submit } = acts(test, draft.id);
    const problem = expectProblem(await submit(shop.operator, draft, { acknowledgedCautionIds: [] }), 409, 'checks-fail');
    expect(problem).toMatchObject({ checks: [{ key: 'cautions-author' }, { key: 'basis' }, { key: 'confirmation' }] });
    expectProblem(await submit(shop.lead, draft), 403, 'not-permitted');
    expectProblem(await submit(shop.operator, { ...draft, version: 9 }), 412, 'stale-version');
    expectProblem(await submit(shop.trainee, draft), 403, 'not-permitted');
    expectProblem(await submit(elsewhere.operator, draft), 404, 'not-found');
    expect(pointersOf(expectProblem(await submit(shop.operator, draft, { acknowledgedCautionIds: 'all' }), 422, 'invalid-fields'))).toEqual(
      ['#/acknowledgedCautionIds'],
    );
    const url = `/revisions/${draft.id}/submit`;
    expectProblem(await call(test, undefined, { method: 'POST', url, payload: {} }), 401, 'not-signed-in');
    expectProblem(
      await call(test, shop.operator, { method: 'POST', url, payload: { acknowledgedCautionIds: [] } }),
      428,
      'version-required',
    );
  });

  it('weighs the cautions of every material of the covered group, again at the signature', async () => {
    const other = await makeMaterial(test, shop.lead);
    const appliesTo = { materialIds: [other.id] };
    const words = { subject: 'The back sheet.', text: 'It gives off chlorine.', source: 'Data sheet 12' };
    const care = await created<{ id: string }>(test, shop.lead, '/api/cautions', { level: 'care', appliesTo, ...words });
    const group = await created<{ id: string }>(test, shop.lead, '/api/material-groups', { name: randomUUID(), materialIds: [other.id] });
    const draft = await makeProvedDraft(test, shop, { scope: { ...FOR_CUSTOMER(randomUUID()), materialGroupId: group.id } });
    const { submit } = acts(test, draft.id);
    const acknowledgedCautionIds = draft.cautions.map(({ id }) => id).filter((id) => id !== care.id);
    const unread = expectProblem(await submit(shop.operator, draft, { acknowledgedCautionIds }), 409, 'checks-fail');
    expect(unread).toMatchObject({ checks: [{ key: 'cautions-author' }] });
    const submitted = (await submit(shop.operator, draft)).json<RecipeRevisionDto>();
    expect(submitted.cautions).toContainEqual(expect.objectContaining({ id: care.id, isAcknowledged: true }));
    await created(test, shop.lead, '/api/cautions', { level: 'never', appliesTo, ...words });
    const refused = expectProblem(await acts(test, draft.id).approve(shop.lead, submitted), 409, 'checks-fail');
    expect(refused).toMatchObject({ checks: [{ key: 'never', detail: expect.stringContaining('The back sheet. (Data sheet 12)') }] });
  });

  it('is refused where a material of the covered group must never be marked', async () => {
    const vinyl = await makeMaterial(test, shop.lead, { family: 'pvc' });
    const group = await created<{ id: string }>(test, shop.lead, '/api/material-groups', { name: randomUUID(), materialIds: [vinyl.id] });
    const draft = await makeProvedDraft(test, shop, { scope: { ...FOR_CUSTOMER(randomUUID()), materialGroupId: group.id } });
    const problem = expectProblem(await acts(test, draft.id).submit(shop.operator, draft), 409, 'checks-fail');
    expect(problem).toMatchObject({ checks: [{ key: 'never', detail: expect.stringContaining('out of the covered group') }] });
  });

  it('of another route needs a lead’s grounds instead of coupons', async () => {
    const other = await changeDraft(test, shop.operator, await draftFromCell(test, shop, await makeProvedCoupon(test, shop)), {
      route: 'earlier-experience',
    });
    const problem = expectProblem(await acts(test, other.id).submit(shop.operator, other), 409, 'checks-fail');
    expect(problem).toMatchObject({ checks: [{ key: 'grounds' }] });
    const grounded = await changeDraft(test, shop.lead, other, { grounds: 'Run for three years without scrap.' });
    expect((await acts(test, other.id).submit(shop.operator, grounded)).json<RecipeRevisionDto>()).toMatchObject({ state: 'in_review' });
  });
});

describe('recalling and sending back', () => {
  it('end the review; a new draft copies the revision and gets the next number', async () => {
    const submitted = await makeSubmitted(test, shop);
    const one = acts(test, submitted.id);
    expectProblem(await one.recall(shop.lead), 403, 'not-permitted');
    expect((await one.recall(shop.operator)).json<RecipeRevisionDto>()).toMatchObject({
      state: 'returned',
      allowedActions: ['copy', 'transfer'],
    });
    expectProblem(await one.recall(shop.operator), 409, 'revision-state');
    const payload = { basedOnRevisionId: submitted.id };
    const copy = await created<RecipeRevisionDto>(test, shop.operator, `/api/recipes/${submitted.recipe.id}/drafts`, payload);
    const again = await changeDraft(test, shop.operator, copy, { reason: 'Once more.' });
    const second = (await acts(test, copy.id).submit(shop.operator, again)).json<RecipeRevisionDto>();
    expect(second.number).toBe(2);
    const returned = await acts(test, second.id).giveBack(shop.lead, { comment: 'Show one more lot.' });
    expect(returned.json<RecipeRevisionDto>().signOffs.at(-1)).toMatchObject({ meaning: 'returned', comment: 'Show one more lot.' });
    expect((await mailsTo(shop.operator)).at(-1)).toEqual({ kind: 'revision-returned' });
  });

  it('refuse anonymous callers, lower roles, other shops, other states and a missing reason', async () => {
    const submitted = await makeSubmitted(test, shop);
    const one = acts(test, submitted.id);
    for (const act of ['recall', 'return'])
      expectProblem(
        await call(test, undefined, { method: 'POST', url: `/revisions/${submitted.id}/${act}`, payload: {} }),
        401,
        'not-signed-in',
      );
    expectProblem(await one.giveBack(shop.operator), 403, 'not-permitted');
    expectProblem(await one.recall(shop.trainee), 403, 'not-permitted');
    expectProblem(await one.giveBack(elsewhere.lead), 404, 'not-found');
    expectProblem(await one.recall(elsewhere.lead), 404, 'not-found');
    expect(pointersOf(expectProblem(await one.giveBack(shop.lead, { comment: ' ' }), 422, 'invalid-fields'))).toEqual(['#/comment']);
    await one.giveBack(shop.lead);
    expectProblem(await one.giveBack(shop.lead), 409, 'revision-state');
  });
});

describe('GET /api/sign-offs/queue', () => {
  it('shows what waits, oldest first, page by page, with what the caller may do', async () => {
    const own = await makeRecipeShop(test);
    const [first, second] = [await makeSubmitted(test, own), await makeSubmitted(test, { ...own, operator: own.lead })];
    const queue = await read<SignOffQueueDto>(test, own.lead, '/sign-offs/queue?limit=1');
    expect(queue).toMatchObject({
      totalCount: 2,
      items: [{ revision: { id: first.id, number: 1 }, recipe: { code: first.recipe.code }, isOwn: false, hasCurrent: false }],
    });
    expect(queue.items[0]?.allowedActions).toContain('approve');
    const next = await read<SignOffQueueDto>(
      test,
      own.lead,
      `/sign-offs/queue?limit=1&cursor=${encodeURIComponent(queue.nextCursor ?? '')}`,
    );
    expect(next).toMatchObject({ items: [{ revision: { id: second.id }, isOwn: true }], nextCursor: null });
    expect(next.items[0]?.allowedActions).not.toContain('approve');
  });

  it('refuses anonymous callers, trainees and a bad query, and shows nothing of another shop', async () => {
    await makeSubmitted(test, shop);
    expectProblem(await call(test, undefined, { url: '/sign-offs/queue' }), 401, 'not-signed-in');
    expectProblem(await call(test, shop.trainee, { url: '/sign-offs/queue' }), 403, 'not-permitted');
    expectProblem(await call(test, shop.lead, { url: '/sign-offs/queue?limit=0' }), 422, 'invalid-fields');
    expect(await read<SignOffQueueDto>(test, elsewhere.lead, '/sign-offs/queue')).toMatchObject({ items: [], totalCount: 0 });
  });
});

it('gives other leads of the shop the same say', async () => {
  const submitted = await makeSubmitted(test, shop);
  const second = await makeMember(test, shop.shop, 'lead');
  expect((await acts(test, submitted.id).approve(second, submitted)).statusCode).toBe(200);
});
