import { randomUUID } from 'node:crypto';
import type { RecipeDto } from '../src/recipes/dto/recipe.dto';
import type { RecipeRevisionDto } from '../src/recipes/dto/recipe-revision.dto';
import type { ApprovalChecksDto } from '../src/sign-offs/dto/checks.dto';
import { createTestApp, type TestApp } from './support/app';
import { asSuperuser } from './support/database';
import { created } from './support/equipment';
import { makeMember, type TestMember } from './support/factories';
import { expectProblem, pointersOf } from './support/problem';
import {
  acts,
  call,
  careIds,
  changeDraft,
  draftFromCell,
  FOR_CUSTOMER,
  makeApproved,
  makeProvedCoupon,
  makeProvedDraft,
  makeRecipeShop,
  makeSubmitted,
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
    expect(submitted.allowedActions).toEqual(['recall', 'return', 'copy', 'transfer', 'start-confirmation']);
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
    expect(withdrawn).toMatchObject({ state: 'withdrawn', withdrawnAt: expect.any(String), allowedActions: ['copy', 'transfer'] });
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
    expect(scheduled).toMatchObject({ state: 'scheduled', allowedActions: ['withdraw', 'copy', 'transfer'] });
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
