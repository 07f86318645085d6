import { createTestApp, type TestApp } from './support/app';
import { editing, effectByKey, fillStarterContent } from './support/equipment';
import { makeMember, makeShop, makeStaffedShop } from './support/factories';
import { expectProblem, pointersOf } from './support/problem';

let test: TestApp;
let staff: Awaited<ReturnType<typeof makeStaffedShop>>;
let foreign: Awaited<ReturnType<typeof makeStaffedShop>>;
beforeAll(async () => {
  test = await createTestApp();
  staff = await makeStaffedShop(test);
  foreign = await makeStaffedShop(test);
});
afterAll(() => test.close());

const call = (method: 'GET' | 'PATCH' | 'DELETE', url: string, headers: Record<string, string> = {}, payload?: object) =>
  test.app.inject({ method, url, headers, ...(payload === undefined ? {} : { payload }) });

describe('GET /api/members', () => {
  it('lists the people of the own shop by name, a page at a time', async () => {
    const first = await call('GET', '/api/members?limit=3', staff.lead.headers);
    const { items, nextCursor } = first.json<{ items: { id: string; printedName: string }[]; nextCursor: string }>();
    const rest = await call('GET', `/api/members?limit=3&cursor=${nextCursor}`, staff.lead.headers);
    const all = [...items, ...rest.json<{ items: { id: string; printedName: string }[] }>().items];
    expect(all.map(({ id }) => id).sort()).toEqual([staff.trainee, staff.operator, staff.lead, staff.owner].map(({ id }) => id).sort());
    expect(all.map(({ printedName }) => printedName)).toEqual(all.map(({ printedName }) => printedName).sort());
    expect(rest.json()).toMatchObject({ nextCursor: null });
  });

  it('shows owners what they may do, and leads that they may only read', async () => {
    const actionsOf = async (headers: Record<string, string>) =>
      (await call('GET', `/api/members/${staff.operator.id}`, headers)).json<{ allowedActions: string[] }>().allowedActions;
    expect(await actionsOf(staff.owner.headers)).toEqual(['edit', 'remove']);
    expect(await actionsOf(staff.lead.headers)).toEqual([]);
  });

  it('refuses anonymous calls and lower roles', async () => {
    expectProblem(await call('GET', '/api/members'), 401, 'not-signed-in');
    for (const member of [staff.trainee, staff.operator]) {
      expectProblem(await call('GET', '/api/members', member.headers), 403, 'not-permitted');
      expectProblem(await call('GET', `/api/members/${staff.owner.id}`, member.headers), 403, 'not-permitted');
    }
  });

  it('refuses a page size and a cursor that make no sense', async () => {
    const answer = await call('GET', '/api/members?limit=101&state=gone', staff.lead.headers);
    expect(pointersOf(expectProblem(answer, 422, 'invalid-fields'))).toEqual(['#/limit', '#/state']);
    expectProblem(await call('GET', '/api/members?cursor=x', staff.lead.headers), 422, 'invalid-fields');
  });
});

describe('one member', () => {
  it('carries a strong ETag', async () => {
    expect((await call('GET', `/api/members/${staff.operator.id}`, staff.owner.headers)).headers.etag).toBe('"v1"');
  });

  it.each(['no-id', '00000000-0000-7000-8000-000000000000'])('does not exist under %s', async (id) => {
    expectProblem(await call('GET', `/api/members/${id}`, staff.owner.headers), 404, 'not-found');
  });

  it('of another shop does not exist, for any call', async () => {
    const url = `/api/members/${foreign.operator.id}`;
    expectProblem(await call('GET', url, staff.owner.headers), 404, 'not-found');
    expectProblem(await call('PATCH', url, { ...staff.owner.headers, 'if-match': '"v1"' }, { role: 'lead' }), 404, 'not-found');
    expectProblem(await call('DELETE', url, editing(staff.owner, 1)), 404, 'not-found');
  });
});

describe('PATCH /api/members/:id', () => {
  it('changes role and name; the role holds from the next request on', async () => {
    const member = await makeMember(test, staff.shop, 'operator');
    const url = `/api/members/${member.id}`;
    const answer = await call('PATCH', url, { ...staff.owner.headers, 'if-match': '"v1"' }, { role: 'lead', printedName: 'Noor Adeyemi' });
    expect(answer.json()).toMatchObject({ role: 'lead', printedName: 'Noor Adeyemi', version: 2 });
    expect(answer.headers.etag).toBe('"v2"');
    expect((await call('GET', '/api/members', member.headers)).statusCode).toBe(200);
  });

  it('needs to know which version is changed, and carries the present state to whoever was late', async () => {
    const member = await makeMember(test, staff.shop, 'operator');
    const url = `/api/members/${member.id}`;
    const change = (headers: Record<string, string>) => call('PATCH', url, { ...staff.owner.headers, ...headers }, { role: 'trainee' });
    expectProblem(await change({}), 428, 'version-required');
    expectProblem(await change({ 'if-match': 'W/"v1"' }), 400, 'bad-request');
    expectProblem(await change({ 'if-match': '*' }), 400, 'bad-request');
    expect((await change({ 'if-match': '"v1"' })).statusCode).toBe(200);
    expect(expectProblem(await change({ 'if-match': '"v1"' }), 412, 'stale-version').current).toMatchObject({
      role: 'trainee',
      version: 2,
    });
  });

  it('is for owners', async () => {
    const url = `/api/members/${staff.trainee.id}`;
    for (const member of [staff.trainee, staff.operator, staff.lead])
      expectProblem(await call('PATCH', url, { ...member.headers, 'if-match': '"v1"' }, { role: 'owner' }), 403, 'not-permitted');
    expectProblem(await call('PATCH', url, { 'if-match': '"v1"' }, { role: 'owner' }), 401, 'not-signed-in');
  });

  it('names every wrong field', async () => {
    const body = { role: 'boss', printedName: '', shopId: foreign.shop.id, version: 7 };
    const answer = await call('PATCH', `/api/members/${staff.trainee.id}`, { ...staff.owner.headers, 'if-match': '"v1"' }, body);
    expect(pointersOf(expectProblem(answer, 422, 'invalid-fields'))).toEqual(['#/printedName', '#/role', '#/shopId', '#/version']);
  });

  it('keeps the last owner an owner', async () => {
    const answer = await call('PATCH', `/api/members/${staff.owner.id}`, { ...staff.owner.headers, 'if-match': '"v1"' }, { role: 'lead' });
    expectProblem(answer, 409, 'last-owner');
  });
});

describe('the processes that a lead signs for', () => {
  const sign = (member: { id: string; headers: Record<string, string> }, version: number, signsFor: unknown) =>
    call('PATCH', `/api/members/${member.id}`, { ...staff.owner.headers, 'if-match': `"v${version}"` }, { signsFor });

  it('are named by an owner, kept in the ledger, and null again means all of them', async () => {
    const lead = await makeMember(test, staff.shop, 'lead');
    await fillStarterContent(test, staff.owner);
    const effect = await effectByKey(test, staff.owner, 'dark-anneal');
    const process = { effectId: effect.id, sourceKind: 'fibre-mopa' };
    expect((await call('GET', `/api/members/${lead.id}`, staff.owner.headers)).json()).toMatchObject({ signsFor: null });
    expect((await sign(lead, 1, [process])).json()).toMatchObject({ signsFor: [{ ...process, effectName: effect.name }], version: 2 });
    const events = await call('GET', `/api/ledger?subjectId=${lead.id}&limit=1`, staff.owner.headers);
    expect(events.json()).toMatchObject({ items: [{ before: { signsFor: null }, after: { signsFor: [process] } }] });
    expect((await sign(lead, 2, null)).json()).toMatchObject({ signsFor: null });
  });

  it('are effects and sources that exist here', async () => {
    const lead = await makeMember(test, staff.shop, 'lead');
    const unknown = await sign(lead, 1, [{ effectId: staff.owner.id, sourceKind: 'co2' }]);
    expect(pointersOf(expectProblem(unknown, 422, 'invalid-fields'))).toEqual(['#/signsFor/0/effectId']);
    const noSource = await sign(lead, 1, [{ effectId: staff.owner.id, sourceKind: 'steam' }]);
    expect(pointersOf(expectProblem(noSource, 422, 'invalid-fields'))).toEqual(['#/signsFor/0/sourceKind']);
  });
});

describe('DELETE /api/members/:id', () => {
  it('ends the sessions of the member at once and keeps the record', async () => {
    const member = await makeMember(test, staff.shop, 'operator');
    expect((await call('GET', '/api/session', member.headers)).statusCode).toBe(200);
    expect((await call('DELETE', `/api/members/${member.id}`, editing(staff.owner, 1))).statusCode).toBe(204);
    expectProblem(await call('GET', '/api/session', member.headers), 401, 'session-over');
    const removed = await call('GET', `/api/members/${member.id}`, staff.owner.headers);
    expect(removed.json()).toMatchObject({ state: 'removed', email: null, allowedActions: [] });
    expectProblem(await call('DELETE', `/api/members/${member.id}`, editing(staff.owner, 2)), 404, 'not-found');
  });

  it('needs to know who is removed: not somebody whose role was changed meanwhile', async () => {
    const member = await makeMember(test, staff.shop, 'operator');
    const url = `/api/members/${member.id}`;
    await call('PATCH', url, editing(staff.owner, 1), { role: 'lead' });
    expectProblem(await call('DELETE', url, staff.owner.headers), 428, 'version-required');
    const late = expectProblem(await call('DELETE', url, editing(staff.owner, 1)), 412, 'stale-version');
    expect(late.current).toMatchObject({ role: 'lead', version: 2 });
    expect((await call('GET', '/api/session', member.headers)).statusCode).toBe(200);
    expect((await call('DELETE', url, editing(staff.owner, 2))).statusCode).toBe(204);
  });

  it('is for owners, and not for the last one of them', async () => {
    for (const member of [staff.trainee, staff.operator, staff.lead])
      expectProblem(await call('DELETE', `/api/members/${staff.trainee.id}`, editing(member, 1)), 403, 'not-permitted');
    expectProblem(await call('DELETE', `/api/members/${staff.trainee.id}`, { 'if-match': '"v1"' }), 401, 'not-signed-in');
    expectProblem(await call('DELETE', `/api/members/${staff.owner.id}`, editing(staff.owner, 1)), 409, 'last-owner');
  });

  it('leaves one of two owners who remove each other at the same moment', async () => {
    const shop = await makeShop(test);
    const [one, other] = [await makeMember(test, shop, 'owner'), await makeMember(test, shop, 'owner')];
    const answers = await Promise.all([
      call('DELETE', `/api/members/${other.id}`, editing(one, 1)),
      call('DELETE', `/api/members/${one.id}`, editing(other, 1)),
    ]);
    expect(answers.map(({ statusCode }) => statusCode).filter((status) => status === 204)).toHaveLength(1);
  });
});
