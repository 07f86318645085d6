import { randomUUID } from 'node:crypto';
import type { RecipeDto } from '../src/recipes/dto/recipe.dto';
import type { RecipeRevisionDto } from '../src/recipes/dto/recipe-revision.dto';
import type { ApprovalChecksDto } from '../src/sign-offs/dto/checks.dto';
import type { SignOffQueueDto } from '../src/sign-offs/dto/sign-off-queue.dto';
import { createTestApp, type TestApp } from './support/app';
import { typed } from './support/coupons';
import { asSuperuser } from './support/database';
import { created } from './support/equipment';
import { makeMember, type TestMember } from './support/factories';
import { expectProblem, pointersOf } from './support/problem';
import {
  acts,
  call,
  careIds,
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
const setPolicy = (of: RecipeShop, policy: object) =>
  asSuperuser(test, (sql) => sql`update shop set policy = policy || ${JSON.stringify(policy)}::text::jsonb where id = ${of.shop.id}`);
const mailsTo = (member: TestMember) =>
  asSuperuser(
    test,
    (sql) => sql<{ kind: string }[]>`select kind from outbox where payload->'to'->>'address' = ${member.email} order by id`,
  );

describe('the way of a revision', () => {
  it('goes from a cell over proof, submission and signature to the approved setting', async () => {
    const submitted = await makeSubmitted(test, shop);
    expect(submitted).toMatchObject({ number: 1, state: 'in_review', allowedActions: ['recall', 'copy', 'start-confirmation'] });
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
    expect((await one.recall(shop.operator)).json<RecipeRevisionDto>()).toMatchObject({ state: 'returned', allowedActions: ['copy'] });
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

describe('approving', () => {
  it('is refused with a wrong password, and then nothing has changed', async () => {
    const submitted = await makeSubmitted(test, shop);
    expectProblem(
      await acts(test, submitted.id).approve(shop.lead, submitted, { password: 'not this one' }),
      403,
      'password-not-confirmed',
    );
    expect(await read<RecipeRevisionDto>(test, shop.lead, `/revisions/${submitted.id}`)).toMatchObject({
      state: 'in_review',
      signOffs: [{ meaning: 'submitted for review' }],
    });
  });

  it('is refused when the browser showed other content; the answer carries the record', async () => {
    const submitted = await makeSubmitted(test, shop);
    const problem = expectProblem(
      await acts(test, submitted.id).approve(shop.lead, submitted, { contentHash: 'a'.repeat(64) }),
      412,
      'stale-revision',
    );
    expect(problem.current).toMatchObject({ id: submitted.id, contentHash: submitted.contentHash });
  });

  it('is refused where the record is no longer what was submitted', async () => {
    const submitted = await makeSubmitted(test, shop);
    await asSuperuser(test, async (sql) => {
      await sql`alter table revision disable trigger guarded_rows`;
      await sql`update revision set reason = 'another reason' where id = ${submitted.id}`;
      await sql`alter table revision enable trigger guarded_rows`;
    });
    expectProblem(await acts(test, submitted.id).approve(shop.lead, submitted), 412, 'stale-revision');
  });

  it('is refused to the author, unless the policy allows it; then the signature says so', async () => {
    const own = await makeRecipeShop(test);
    const submitted = await makeSubmitted(test, { ...own, operator: own.lead });
    expect(submitted.allowedActions).toEqual(['recall', 'return', 'copy', 'start-confirmation']);
    expectProblem(await acts(test, submitted.id).approve(own.lead, submitted), 403, 'self-approval');
    expect(failing(await checksOf(submitted.id, own.lead))).toEqual(['signer-not-author']);
    await setPolicy(own, { authorMaySign: true });
    const approved = (await acts(test, submitted.id).approve(own.lead, submitted)).json<RecipeRevisionDto>();
    expect(approved.signOffs.at(-1)).toMatchObject({ meaning: 'approved', isByAuthor: true });
  });

  it('is refused to a lead who edited the draft, not to one who only wrote the grounds', async () => {
    const own = await makeRecipeShop(test);
    const second = await makeMember(test, own.shop, 'lead');
    const fromCell = await draftFromCell(test, own, await makeProvedCoupon(test, own));
    const other = await changeDraft(test, own.operator, fromCell, { route: 'earlier-experience' });
    const edited = await changeDraft(test, second, other, { reason: 'As run for three years.' });
    const grounded = await changeDraft(test, own.lead, edited, { grounds: 'Run for three years without scrap.' });
    const submitted = (await acts(test, other.id).submit(own.operator, grounded)).json<RecipeRevisionDto>();
    expectProblem(await acts(test, other.id).approve(second, submitted), 403, 'self-approval');
    expect(failing(await checksOf(other.id, second))).toEqual(['signer-not-author']);
    const needsOf = async (member: TestMember) => (await read<RecipeDto>(test, member, `/recipes/${submitted.recipe.id}`)).needsYou;
    expect([await needsOf(second), await needsOf(own.lead)]).toEqual([null, 'sign']);
    const approved = (await acts(test, other.id).approve(own.lead, submitted)).json<RecipeRevisionDto>();
    expect(approved.signOffs.at(-1)).toMatchObject({ meaning: 'approved', isByAuthor: false });
  });

  it('is refused to a lead who is not named for the process', async () => {
    const submitted = await makeSubmitted(test, shop);
    const second = await makeMember(test, shop.shop, 'lead');
    const other = [{ effectId: randomUUID(), sourceKind: 'co2' }];
    await asSuperuser(test, (sql) => sql`update member set signs_for = ${JSON.stringify(other)}::text::jsonb where id = ${second.id}`);
    expectProblem(await acts(test, submitted.id).approve(second, submitted), 403, 'not-your-process');
    expect(failing(await checksOf(submitted.id, second))).toEqual(['signer-process']);
  });

  it('is refused with every check that fails by now, and without the signer’s own look at the cautions', async () => {
    const own = await makeRecipeShop(test);
    const submitted = await makeSubmitted(test, own);
    expect(careIds(submitted)).not.toEqual([]);
    const { approve } = acts(test, submitted.id);
    const blind = expectProblem(await approve(own.lead, submitted, { acknowledgedCautionIds: [] }), 409, 'checks-fail');
    expect(blind).toMatchObject({ checks: [{ key: 'cautions-signer' }] });
    await setPolicy(own, { minimumConfirmationMarks: 4, calibrationAgeDays: -1 });
    const appliesTo = { materialIds: [own.material.id] };
    await created(test, own.lead, '/api/cautions', {
      level: 'never',
      subject: 'Do not mark',
      text: 'Recalled.',
      source: 'Safety officer',
      appliesTo,
    });
    const late = expectProblem(await approve(own.lead, submitted), 409, 'checks-fail');
    expect(late).toMatchObject({ checks: [{ key: 'never' }, { key: 'confirmation' }, { key: 'calibration' }] });
  });

  it('signs for those cautions only that stand beside the work, each once', async () => {
    const draft = await makeProvedDraft(test, shop);
    const care = careIds(draft);
    const acknowledgedCautionIds = [...care, ...care, randomUUID()];
    const submitted = (await acts(test, draft.id).submit(shop.operator, draft, { acknowledgedCautionIds })).json<RecipeRevisionDto>();
    expect((await acts(test, draft.id).approve(shop.lead, submitted, { acknowledgedCautionIds })).statusCode).toBe(200);
    const kept = await asSuperuser(
      test,
      (sql) => sql<{ ids: string[] }[]>`select acknowledged_caution_ids as ids from sign_off where revision_id = ${draft.id}`,
    );
    expect(kept.map(({ ids }) => [...ids].sort())).toEqual([[...care].sort(), [...care].sort()]);
    expect(care.length).toBeGreaterThan(0);
  });

  it('refuses a second recipe that covers the same parts', async () => {
    const given = { scope: FOR_CUSTOMER('Dial works 7') };
    const [first, second] = [await makeSubmitted(test, shop, given), await makeSubmitted(test, shop, given)];
    expect((await acts(test, first.id).approve(shop.lead, first)).statusCode).toBe(200);
    const problem = expectProblem(await acts(test, second.id).approve(shop.lead, second), 409, 'checks-fail');
    expect(problem).toMatchObject({ checks: [{ key: 'scope' }] });
  });

  it('answers a repeat with the first answer and signs once', async () => {
    const submitted = await makeSubmitted(test, shop);
    const payload = { password: shop.lead.password, contentHash: submitted.contentHash, acknowledgedCautionIds: careIds(submitted) };
    const request = { method: 'POST', url: `/revisions/${submitted.id}/approve`, payload, key: randomUUID() } as const;
    const first = await call(test, shop.lead, request);
    const again = await call(test, shop.lead, request);
    expect(again.headers['idempotency-replayed']).toBe('true');
    expect(again.json<RecipeRevisionDto>()).toEqual(first.json<RecipeRevisionDto>());
  });

  it('refuses anonymous callers, lower roles, other shops, other states and a bad body', async () => {
    const draft = await makeProvedDraft(test, shop);
    const { approve } = acts(test, draft.id);
    expectProblem(
      await call(test, undefined, { method: 'POST', url: `/revisions/${draft.id}/approve`, payload: {} }),
      401,
      'not-signed-in',
    );
    expectProblem(await approve(shop.operator, draft), 403, 'not-permitted');
    expectProblem(await approve(elsewhere.lead, draft), 404, 'not-found');
    expect(expectProblem(await approve(shop.lead, draft), 409, 'revision-state').current).toMatchObject({ state: 'draft' });
    const bad = { password: '', contentHash: 'short', acknowledgedCautionIds: undefined };
    expect(pointersOf(expectProblem(await approve(shop.lead, draft, bad), 422, 'invalid-fields'))).toEqual([
      '#/acknowledgedCautionIds',
      '#/contentHash',
      '#/password',
    ]);
  });
});

describe('withdrawing', () => {
  it('leaves the recipe without an approved setting and tells everybody', async () => {
    const approved = await makeApproved(test, shop);
    const withdrawn = (await acts(test, approved.id).withdraw(shop.lead)).json<RecipeRevisionDto>();
    expect(withdrawn).toMatchObject({ state: 'withdrawn', withdrawnAt: expect.any(String), allowedActions: ['copy'] });
    expect(withdrawn.signOffs.at(-1)).toMatchObject({ meaning: 'withdrawn', method: 'password', comment: 'Rim turned brown.' });
    const recipe = await read<RecipeDto>(test, shop.operator, `/recipes/${approved.recipe.id}`);
    expect(recipe).toMatchObject({ state: 'withdrawn', current: null, currentRevision: null });
    for (const member of [shop.trainee, shop.operator, shop.owner])
      expect((await mailsTo(member)).at(-1)).toEqual({ kind: 'revision-withdrawn' });
  });

  it('stops a revision that is yet to take effect; the present setting stays', async () => {
    const approved = await makeApproved(test, shop);
    const copy = await created<RecipeRevisionDto>(test, shop.operator, `/api/recipes/${approved.recipe.id}/drafts`, {});
    const given = { reason: 'From the new year.', effectiveFrom: '2999-01-01T00:00:00Z' };
    const draft = await changeDraft(test, shop.operator, copy, given);
    const submitted = (await acts(test, draft.id).submit(shop.operator, draft)).json<RecipeRevisionDto>();
    const scheduled = (await acts(test, draft.id).approve(shop.lead, submitted)).json<RecipeRevisionDto>();
    expect(scheduled).toMatchObject({ state: 'scheduled', allowedActions: ['withdraw', 'copy'] });
    expect((await acts(test, draft.id).withdraw(shop.lead)).json<RecipeRevisionDto>()).toMatchObject({ state: 'withdrawn' });
    expect(await read<RecipeDto>(test, shop.operator, `/recipes/${approved.recipe.id}`)).toMatchObject({
      state: 'approved',
      current: { id: approved.id },
      underWay: null,
    });
  });

  it('refuses a wrong password, a missing reason, anonymous callers, lower roles, other shops and other states', async () => {
    const approved = await makeApproved(test, shop);
    const { withdraw } = acts(test, approved.id);
    expectProblem(
      await call(test, undefined, { method: 'POST', url: `/revisions/${approved.id}/withdraw`, payload: {} }),
      401,
      'not-signed-in',
    );
    expectProblem(await withdraw(shop.lead, { password: 'guess' }), 403, 'password-not-confirmed');
    expectProblem(await withdraw(shop.operator), 403, 'not-permitted');
    expectProblem(await withdraw(elsewhere.owner), 404, 'not-found');
    expect(pointersOf(expectProblem(await withdraw(shop.lead, { reason: '' }), 422, 'invalid-fields'))).toEqual(['#/reason']);
    expect((await withdraw(shop.owner)).statusCode).toBe(200);
    expectProblem(await withdraw(shop.lead), 409, 'revision-state');
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
