import { DEFAULT_SHOP_POLICY } from '../src/shops/shop-policy';
import { createTestApp, type TestApp } from './support/app';
import { makeStaffedShop, TEST_PASSWORD } from './support/factories';
import { expectProblem, pointersOf } from './support/problem';

let test: TestApp;
beforeAll(async () => {
  test = await createTestApp();
});
afterAll(() => test.close());

const get = (headers: Record<string, string>) => test.app.inject({ url: '/api/shop', headers });
const patch = (headers: Record<string, string>, payload: object, version = '"v1"') =>
  test.app.inject({ method: 'PATCH', url: '/api/shop', headers: { 'if-match': version, ...headers }, payload });
const ledgerActions = async (headers: Record<string, string>) =>
  (await test.app.inject({ url: '/api/ledger', headers })).json<{ items: { action: string }[] }>().items.map(({ action }) => action);

describe('GET /api/shop', () => {
  it('shows leads the policy to read and owners what they may change', async () => {
    const { shop, lead, owner } = await makeStaffedShop(test);
    expect((await get(lead.headers)).json()).toMatchObject({ id: shop.id, policy: DEFAULT_SHOP_POLICY, version: 1, allowedActions: [] });
    expect((await get(owner.headers)).json()).toMatchObject({ allowedActions: ['edit', 'changePolicy', 'invite', 'changePeople'] });
  });

  it('refuses lower roles and anonymous calls', async () => {
    const { trainee, operator } = await makeStaffedShop(test);
    for (const member of [trainee, operator]) expectProblem(await get(member.headers), 403, 'not-permitted');
    expectProblem(await get({}), 401, 'not-signed-in');
  });
});

describe('PATCH /api/shop', () => {
  it('changes name and units without a password', async () => {
    const { owner } = await makeStaffedShop(test);
    const answer = await patch(owner.headers, { name: 'New Name', unitSystem: 'inch' });
    expect(answer.json()).toMatchObject({ name: 'New Name', unitSystem: 'inch', version: 2 });
    expect((await ledgerActions(owner.headers))[0]).toBe('shop.changed');
  });

  it('changes the policy by a signed act only', async () => {
    const { owner } = await makeStaffedShop(test);
    const policy = { ...DEFAULT_SHOP_POLICY, minimumConfirmationMarks: 5 };
    expect(pointersOf(expectProblem(await patch(owner.headers, { policy }), 422, 'invalid-fields'))).toEqual(['#/password']);
    const wrong = await patch(owner.headers, { policy, password: 'another kettle on the roof' });
    expect(pointersOf(expectProblem(wrong, 403, 'password-not-confirmed'))).toEqual(['#/password']);
    const answer = await patch(owner.headers, { policy, password: TEST_PASSWORD });
    expect(answer.json()).toMatchObject({ policy, version: 2 });
    expect((await ledgerActions(owner.headers))[0]).toBe('shop.policy-signed');
    expect(answer.body).not.toContain(TEST_PASSWORD);
  });

  it('refuses a policy that asks for a second factor, which accounts do not have yet', async () => {
    const { owner } = await makeStaffedShop(test);
    const policy = { ...DEFAULT_SHOP_POLICY, secondFactorForSigning: true };
    const problem = expectProblem(await patch(owner.headers, { policy, password: TEST_PASSWORD }), 422, 'invalid-fields');
    expect(problem.errors).toEqual([{ pointer: '#/policy/secondFactorForSigning', detail: expect.stringContaining('Leave this off') }]);
    expect((await get(owner.headers)).json()).toMatchObject({ policy: DEFAULT_SHOP_POLICY, version: 1 });
    const word = await patch(owner.headers, { policy: { ...policy, secondFactorForSigning: 'no' }, password: TEST_PASSWORD });
    expect(expectProblem(word, 422, 'invalid-fields').errors).toMatchObject([{ detail: 'Choose yes or no.' }]);
  });

  it('needs no password for a policy that stays as it is', async () => {
    const { owner } = await makeStaffedShop(test);
    expect((await patch(owner.headers, { name: 'Same Rules', policy: DEFAULT_SHOP_POLICY })).statusCode).toBe(200);
  });

  it('makes whoever types five wrong passwords wait', async () => {
    const { owner } = await makeStaffedShop(test);
    const sign = (password: string) => patch(owner.headers, { policy: { ...DEFAULT_SHOP_POLICY, authorMaySign: true }, password });
    for (let attempt = 1; attempt <= 5; attempt += 1)
      expectProblem(await sign('another kettle on the roof'), 403, 'password-not-confirmed');
    expectProblem(await sign(TEST_PASSWORD), 429, 'too-many-tries');
  });

  it('is for owners who know the version', async () => {
    const { trainee, operator, lead, owner } = await makeStaffedShop(test);
    for (const member of [trainee, operator, lead]) expectProblem(await patch(member.headers, { name: 'X' }), 403, 'not-permitted');
    expectProblem(await patch({}, { name: 'X' }), 401, 'not-signed-in');
    expectProblem(await patch(owner.headers, { name: 'X' }, '"v9"'), 412, 'stale-version');
  });

  it('takes null for no value', async () => {
    const { owner } = await makeStaffedShop(test);
    const problem = expectProblem(await patch(owner.headers, { name: null, policy: null, password: null }), 422, 'invalid-fields');
    expect(pointersOf(problem)).toEqual(['#/name', '#/password', '#/policy']);
  });

  it('names every wrong field, nested ones too', async () => {
    const { owner } = await makeStaffedShop(test);
    const policy = { ...DEFAULT_SHOP_POLICY, minimumConfirmationMarks: 0, powerShiftPercent: '5', extra: 1 };
    const problem = expectProblem(
      await patch(owner.headers, { name: '', timeZone: 'Moon/Base', locale: 'x_y', policy }),
      422,
      'invalid-fields',
    );
    expect(pointersOf(problem)).toEqual([
      '#/locale',
      '#/name',
      '#/policy/extra',
      '#/policy/minimumConfirmationMarks',
      '#/policy/powerShiftPercent',
      '#/timeZone',
    ]);
  });
});
