import { randomUUID } from 'node:crypto';
import type { LedgerEventDto } from '../src/ledger/dto/ledger-event.dto';
import type { HoldDto, HoldPageDto } from '../src/runs/dto/hold.dto';
import { createTestApp, type TestApp } from './support/app';
import { type ApprovedRecipe, makeRecipe } from './support/approved-recipe';
import { asSuperuser } from './support/database';
import { fillStarterContent } from './support/equipment';
import { makeStaffedShop, TEST_PASSWORD, type TestMember } from './support/factories';
import { newKey } from './support/idempotency';
import { expectProblem, pointersOf } from './support/problem';

type Shop = Awaited<ReturnType<typeof makeStaffedShop>>;
let test: TestApp;
let shop: Shop;
let elsewhere: Shop;

beforeAll(async () => {
  test = await createTestApp();
  [shop, elsewhere] = [await makeStaffedShop(test), await makeStaffedShop(test)];
  for (const one of [shop, elsewhere]) await fillStarterContent(test, one.owner);
});
afterAll(() => test.close());

type Given = Readonly<Record<string, unknown>>;
const post = (url: string, payload: Given, member: TestMember = shop.lead) =>
  test.app.inject({ method: 'POST', url, headers: { ...member.headers, ...newKey() }, payload });
const place = (recipe: ApprovedRecipe, given: Given = {}, member: TestMember = shop.lead) =>
  post('/api/holds', { recipeId: recipe.recipeId, reason: 'The mark wipes off', ...given }, member);
const list = async (query = '', member: TestMember = shop.trainee) =>
  (await test.app.inject({ url: `/api/holds${query}`, headers: member.headers })).json<HoldPageDto>().items;
const mails = (subject: string) =>
  asSuperuser(
    test,
    (sql) => sql<{ payload: { to: { address: string }; reason: string } }[]>`
    select payload from outbox where kind = 'hold-placed' and payload ->> 'subject' like ${`${subject}%`}`,
  );

describe('POST /api/holds', () => {
  it('is signed in the ledger, shown to everybody and told to all others by mail', async () => {
    const recipe = await makeRecipe(test, shop.lead);
    const answer = await place(recipe, { password: TEST_PASSWORD });
    expect(answer.statusCode).toBe(201);
    const hold = answer.json<HoldDto>();
    expect(hold).toMatchObject({
      subject: 'recipe',
      subjectId: recipe.recipeId,
      placedBy: shop.lead.printedName,
      allowedActions: ['release'],
    });
    expect(await list()).toMatchObject([{ id: hold.id, reason: 'The mark wipes off', allowedActions: [] }]);
    const events = (
      await test.app.inject({ url: `/api/ledger?subjectId=${recipe.recipeId}&action=hold.placed`, headers: shop.lead.headers })
    ).json<{
      items: LedgerEventDto[];
    }>().items;
    expect(events).toMatchObject([
      { subjectCode: recipe.code, after: { meaning: 'hold placed', method: 'password', reason: 'The mark wipes off' } },
    ]);
    const sent = await mails(recipe.code);
    const others = [shop.trainee, shop.operator, shop.owner].map(({ email }) => email).sort();
    expect(sent.map(({ payload }) => payload.to.address).sort()).toEqual(others);
  });

  it('holds a machine by its name', async () => {
    const { machine } = await makeRecipe(test, shop.lead);
    const answer = await post('/api/holds', { machineId: machine.id, reason: 'Fumes come back' });
    expect(answer.json<HoldDto>()).toMatchObject({ subject: 'machine', subjectName: machine.name });
  });

  it('refuses a wrong password and changes nothing', async () => {
    const recipe = await makeRecipe(test, shop.lead);
    expectProblem(await place(recipe, { password: 'not mine' }), 403, 'password-not-confirmed');
    expect((await list('?limit=100')).some(({ subjectId }) => subjectId === recipe.recipeId)).toBe(false);
  });

  it('places one hold on a thing at a time, also when two leads press at once', async () => {
    const recipe = await makeRecipe(test, shop.lead);
    const answers = await Promise.all([place(recipe), place(recipe, {}, shop.owner)]);
    expect(answers.map(({ statusCode }) => statusCode).sort()).toEqual([201, 409]);
    expectProblem(await place(recipe), 409, 'hold-state');
  });

  it('is for leads and owners of the shop, on one thing, with a reason', async () => {
    const recipe = await makeRecipe(test, shop.lead);
    for (const member of [shop.trainee, shop.operator]) expectProblem(await place(recipe, {}, member), 403, 'not-permitted');
    expectProblem(await place(recipe, {}, elsewhere.owner), 404, 'not-found');
    const anonymous = await test.app.inject({
      method: 'POST',
      url: '/api/holds',
      headers: newKey(),
      payload: { recipeId: recipe.recipeId },
    });
    expectProblem(anonymous, 401, 'not-signed-in');
    const both = await place(recipe, { machineId: recipe.machine.id });
    expect(pointersOf(expectProblem(both, 422, 'invalid-fields'))).toEqual(['#/recipeId']);
    expect(pointersOf(expectProblem(await post('/api/holds', { reason: 'x' }), 422, 'invalid-fields'))).toEqual(['#/recipeId']);
    expect(pointersOf(expectProblem(await place(recipe, { reason: '  ' }), 422, 'invalid-fields'))).toEqual(['#/reason']);
  });
});

describe('POST /api/holds/:id/release', () => {
  const placed = async () => (await place(await makeRecipe(test, shop.lead))).json<HoldDto>();
  const release = (hold: HoldDto, given: Given = {}, member: TestMember = shop.lead) =>
    post(`/api/holds/${hold.id}/release`, { reason: 'Ten parts tested', ...given }, member);

  it('keeps who released it and why, once', async () => {
    const hold = await placed();
    const released = (await release(hold, {}, shop.owner)).json<HoldDto>();
    expect(released).toMatchObject({ releasedBy: shop.owner.printedName, releaseReason: 'Ten parts tested', allowedActions: [] });
    expect((await list('?limit=100')).some(({ id }) => id === hold.id)).toBe(false);
    expect((await list('?state=released'))[0]).toMatchObject({ id: hold.id });
    expectProblem(await release(hold), 409, 'hold-state');
  });

  it('lets the same thing be held again afterwards', async () => {
    const recipe = await makeRecipe(test, shop.lead);
    await release((await place(recipe)).json<HoldDto>());
    expect((await place(recipe)).statusCode).toBe(201);
  });

  it('is for leads and owners of the shop, with a reason', async () => {
    const hold = await placed();
    for (const member of [shop.trainee, shop.operator]) expectProblem(await release(hold, {}, member), 403, 'not-permitted');
    expectProblem(await release(hold, {}, elsewhere.owner), 404, 'not-found');
    expectProblem(await post(`/api/holds/${randomUUID()}/release`, { reason: 'x' }), 404, 'not-found');
    expect(pointersOf(expectProblem(await release(hold, { reason: '' }), 422, 'invalid-fields'))).toEqual(['#/reason']);
    const anonymous = await test.app.inject({
      method: 'POST',
      url: `/api/holds/${hold.id}/release`,
      headers: newKey(),
      payload: { reason: 'x' },
    });
    expectProblem(anonymous, 401, 'not-signed-in');
  });
});

describe('GET /api/holds', () => {
  it('keeps shops apart and needs a session', async () => {
    await place(await makeRecipe(test, shop.lead));
    expect(await list('', elsewhere.owner)).toEqual([]);
    expectProblem(await test.app.inject({ url: '/api/holds' }), 401, 'not-signed-in');
    const unknown = await test.app.inject({ url: '/api/holds?state=maybe', headers: shop.trainee.headers });
    expect(pointersOf(expectProblem(unknown, 422, 'invalid-fields'))).toEqual(['#/state']);
  });
});
