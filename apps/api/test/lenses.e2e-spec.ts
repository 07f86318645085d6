import type { LensDto } from '../src/lenses/dto/lens.dto';
import type { MachineDto } from '../src/machines/dto/machine.dto';
import type { MachineLensDto } from '../src/machines/dto/machine-lens.dto';
import { createTestApp, type TestApp } from './support/app';
import { created, editing, makeLens, makeMachine } from './support/equipment';
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

const patchLens = (lens: LensDto, payload: object, version = lens.version) =>
  test.app.inject({ method: 'PATCH', url: `/api/lenses/${lens.id}`, headers: editing(shop.lead, version), payload });

describe('lenses', () => {
  it('are added, read by operators and changed by leads', async () => {
    const lens = await makeLens(test, shop.lead, { name: 'F163' });
    const read = await test.app.inject({ url: `/api/lenses/${lens.id}`, headers: shop.operator.headers });
    expect(read.json()).toMatchObject({ name: 'F163', focalLengthMm: 163, fieldSizeMm: 110, notes: '', allowedActions: [] });
    const changed = (await patchLens(lens, { fieldSizeMm: 112.5 })).json<LensDto>();
    expect(changed).toMatchObject({ name: 'F163', focalLengthMm: 163, fieldSizeMm: 112.5, version: 2 });
    expectProblem(await patchLens(lens, { fieldSizeMm: 100 }), 412, 'stale-version');
  });

  it('refuse impossible numbers, unknown fields and a repeated name', async () => {
    const { name } = await makeLens(test, shop.lead);
    const post = (payload: object) =>
      test.app.inject({ method: 'POST', url: '/api/lenses', headers: { ...shop.lead.headers, ...newKey() }, payload });
    const bad = await post({ name: '', focalLengthMm: 'long', fieldSizeMm: 0, colour: 'blue' });
    expect(pointersOf(expectProblem(bad, 422, 'invalid-fields'))).toEqual(['#/colour', '#/fieldSizeMm', '#/focalLengthMm', '#/name']);
    expectProblem(await post({ name, focalLengthMm: 100, fieldSizeMm: 70 }), 409, 'already-exists');
  });

  it('leave the list when archived and come back when restored', async () => {
    const lens = await makeLens(test, shop.lead);
    const act = (verb: string, version: number) =>
      test.app.inject({ method: 'POST', url: `/api/lenses/${lens.id}/${verb}`, headers: editing(shop.lead, version) });
    const listed = async () =>
      (await test.app.inject({ url: '/api/lenses?limit=100', headers: shop.lead.headers })).json<{ items: LensDto[] }>().items;
    expect((await act('archive', 1)).json<LensDto>().allowedActions).toEqual(['restore']);
    expect((await listed()).map(({ id }) => id)).not.toContain(lens.id);
    await act('restore', 2);
    expect((await listed()).map(({ id }) => id)).toContain(lens.id);
  });

  it('refuse the anonymous, the wrong role and another shop', async () => {
    const lens = await makeLens(test, shop.lead);
    const read = (headers: Record<string, string>) => test.app.inject({ url: `/api/lenses/${lens.id}`, headers });
    expectProblem(await read({}), 401, 'not-signed-in');
    expectProblem(await read(shop.trainee.headers), 403, 'not-permitted');
    expectProblem(await read(elsewhere.owner.headers), 404, 'not-found');
    const edit = await test.app.inject({
      method: 'PATCH',
      url: `/api/lenses/${lens.id}`,
      headers: editing(shop.operator, 1),
      payload: { name: 'x' },
    });
    expectProblem(edit, 403, 'not-permitted');
  });
});

describe('a lens on a machine', () => {
  const spot = { measuredSpotUm: 42, spotMethod: 'knife edge', spotMeasuredOn: '2026-03-02' };

  it('carries working distance, focus method and the measured spot', async () => {
    const [machine, lens] = [await makeMachine(test, shop.lead), await makeLens(test, shop.lead)];
    const url = `/api/machines/${machine.id}/lenses`;
    const body = { lensId: lens.id, workingDistanceMm: 176.5, focusMethod: 'gauge block 176', ...spot };
    const pair = await created<MachineLensDto>(test, shop.lead, url, body);
    expect(pair).toMatchObject({ lensName: lens.name, focalLengthMm: 163, workingDistanceMm: 176.5, ...spot, isMounted: false });
    await test.app.inject({
      method: 'PATCH',
      url: `/api/machines/${machine.id}`,
      headers: editing(shop.lead, machine.version),
      payload: { mountedLensId: lens.id } satisfies Partial<Record<keyof MachineDto | 'mountedLensId', string>>,
    });
    const { items } = (await test.app.inject({ url, headers: shop.operator.headers })).json<{ items: MachineLensDto[] }>();
    expect(items).toMatchObject([{ lensId: lens.id, isMounted: true, allowedActions: [] }]);
  });

  it('forgets what is set to null and keeps what is not named', async () => {
    const [machine, lens] = [await makeMachine(test, shop.lead), await makeLens(test, shop.lead)];
    const url = `/api/machines/${machine.id}/lenses`;
    await created(test, shop.lead, url, { lensId: lens.id, workingDistanceMm: 176.5, focusMethod: 'red dots', ...spot });
    const headers = editing(shop.lead, 1);
    const payload = { measuredSpotUm: null, spotMethod: null, spotMeasuredOn: null };
    const answer = await test.app.inject({ method: 'PATCH', url: `${url}/${lens.id}`, headers, payload });
    expect(answer.json()).toMatchObject({ workingDistanceMm: 176.5, focusMethod: 'red dots', measuredSpotUm: null, version: 2 });
  });

  it('wants a measured spot together with its method and day', async () => {
    const [machine, lens] = [await makeMachine(test, shop.lead), await makeLens(test, shop.lead)];
    const send = (payload: object) =>
      test.app.inject({
        method: 'POST',
        url: `/api/machines/${machine.id}/lenses`,
        headers: { ...shop.lead.headers, ...newKey() },
        payload: { lensId: lens.id, ...payload },
      });
    expect(pointersOf(expectProblem(await send({ measuredSpotUm: 42 }), 422, 'invalid-fields'))).toEqual([
      '#/spotMeasuredOn',
      '#/spotMethod',
    ]);
    expect(pointersOf(expectProblem(await send({ spotMethod: 'knife edge' }), 422, 'invalid-fields'))).toEqual(['#/measuredSpotUm']);
    expect(pointersOf(expectProblem(await send({ ...spot, spotMeasuredOn: '2026-13-02' }), 422, 'invalid-fields'))).toEqual([
      '#/spotMeasuredOn',
    ]);
  });

  it('is there once, and only with a lens of the shop', async () => {
    const [machine, lens, foreign] = [
      await makeMachine(test, shop.lead),
      await makeLens(test, shop.lead),
      await makeLens(test, elsewhere.lead),
    ];
    const url = `/api/machines/${machine.id}/lenses`;
    await created(test, shop.lead, url, { lensId: lens.id });
    const send = (lensId: string) =>
      test.app.inject({ method: 'POST', url, headers: { ...shop.lead.headers, ...newKey() }, payload: { lensId } });
    expectProblem(await send(lens.id), 409, 'conflict');
    expect(pointersOf(expectProblem(await send(foreign.id), 422, 'invalid-fields'))).toEqual(['#/lensId']);
  });

  it('refuses the anonymous, the wrong role and another shop', async () => {
    const url = `/api/machines/${(await makeMachine(test, shop.lead)).id}/lenses`;
    expectProblem(await test.app.inject({ url }), 401, 'not-signed-in');
    expectProblem(await test.app.inject({ url, headers: shop.trainee.headers }), 403, 'not-permitted');
    expectProblem(await test.app.inject({ url, headers: elsewhere.owner.headers }), 404, 'not-found');
  });
});
