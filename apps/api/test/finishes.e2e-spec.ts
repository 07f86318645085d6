import type { FinishDto } from '../src/materials/dto/finish.dto';
import { createTestApp, type TestApp } from './support/app';
import { editing, makeFinish } from './support/equipment';
import { makeStaffedShop } from './support/factories';
import { newKey } from './support/idempotency';
import { expectProblem, pointersOf } from './support/problem';

let test: TestApp;
let shop: Awaited<ReturnType<typeof makeStaffedShop>>;
let elsewhere: Awaited<ReturnType<typeof makeStaffedShop>>;

beforeAll(async () => {
  test = await createTestApp();
  [shop, elsewhere] = [await makeStaffedShop(test), await makeStaffedShop(test)];
});
afterAll(() => test.close());

describe('finishes', () => {
  it('carry what is done before and after marking', async () => {
    const finish = await makeFinish(test, shop.lead, { name: 'Black anodised', preparation: 'degreased', treatment: 'wipe with alcohol' });
    expect(finish).toMatchObject({ preparation: 'degreased', treatment: 'wipe with alcohol', version: 1 });
    const url = `/api/finishes/${finish.id}`;
    const edit = { method: 'PATCH', url, headers: editing(shop.lead, 1), payload: { treatment: '' } } as const;
    expect((await test.app.inject(edit)).json()).toMatchObject({ preparation: 'degreased', treatment: '', version: 2 });
    expectProblem(await test.app.inject(edit), 412, 'stale-version');
  });

  it('refuse an empty name, an unknown field and a repeated name', async () => {
    const { name } = await makeFinish(test, shop.lead);
    const post = (payload: object) =>
      test.app.inject({ method: 'POST', url: '/api/finishes', headers: { ...shop.lead.headers, ...newKey() }, payload });
    expect(pointersOf(expectProblem(await post({ gloss: 3 }), 422, 'invalid-fields'))).toEqual(['#/gloss', '#/name']);
    expectProblem(await post({ name }), 409, 'already-exists');
  });

  it('are archived and restored', async () => {
    const finish = await makeFinish(test, shop.lead);
    const act = (verb: string, version: number) =>
      test.app.inject({ method: 'POST', url: `/api/finishes/${finish.id}/${verb}`, headers: editing(shop.lead, version) });
    expect((await act('archive', 1)).json<FinishDto>().allowedActions).toEqual(['restore']);
    const archived = await test.app.inject({ url: '/api/finishes?archived=true', headers: shop.operator.headers });
    expect(archived.json<{ items: FinishDto[] }>().items.map(({ id }) => id)).toContain(finish.id);
    expect((await act('restore', 2)).json<FinishDto>().archivedAt).toBeNull();
  });

  it('refuse the anonymous, the wrong role and another shop', async () => {
    const { id } = await makeFinish(test, shop.lead);
    const read = (headers: Record<string, string>) => test.app.inject({ url: `/api/finishes/${id}`, headers });
    expectProblem(await read({}), 401, 'not-signed-in');
    expectProblem(await read(shop.trainee.headers), 403, 'not-permitted');
    expectProblem(await read(elsewhere.owner.headers), 404, 'not-found');
    const post = { method: 'POST', url: '/api/finishes', payload: { name: 'x' } } as const;
    expectProblem(await test.app.inject({ ...post, headers: { ...shop.operator.headers, ...newKey() } }), 403, 'not-permitted');
  });
});
