import { randomUUID } from 'node:crypto';
import type { LedgerEventDto } from '../src/ledger/dto/ledger-event.dto';
import type { MachineDto } from '../src/machines/dto/machine.dto';
import type { MachineLensListDto } from '../src/machines/dto/machine-lens.dto';
import type { MachineProfileDto } from '../src/machines/dto/machine-profile.dto';
import { createTestApp, type TestApp } from './support/app';
import { editing, fibreMachine, makeLens, makeMachine } from './support/equipment';
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

const get = (url: string, headers: Record<string, string> = shop.operator.headers) => test.app.inject({ url, headers });
const patch = (machine: MachineDto, payload: object, version = machine.version) =>
  test.app.inject({ method: 'PATCH', url: `/api/machines/${machine.id}`, headers: editing(shop.lead, version), payload });

/** Lenses that the ledger says were put on the machine. */
async function addedLenses(machineId: string) {
  const { items } = (await get('/api/ledger?action=machine-lens.added&limit=100', shop.lead.headers)).json<{ items: LedgerEventDto[] }>();
  const added = items.map(({ after }) => after as { machineId: string; lensId: string });
  return added.filter((pair) => pair.machineId === machineId).map(({ lensId }) => lensId);
}

describe('an address with what is no id', () => {
  it.each(['machines', 'lenses', 'materials', 'finishes', 'effects', 'material-groups', 'photos'])(
    'leads to no thing of %s, as that of an unknown one does',
    async (things) => {
      expectProblem(await get(`/api/${things}/no-id`), 404, 'not-found');
    },
  );
});

describe('POST /api/machines', () => {
  it('adds a machine with its first profile and writes it into the ledger', async () => {
    const machine = await makeMachine(test, shop.lead, { name: 'Bench 1' });
    expect(machine).toMatchObject({
      name: 'Bench 1',
      sourceKind: 'fibre-q-switched',
      mountedLens: null,
      latestCalibrationOn: null,
      profile: { number: 1, physicalNumber: 1, createdByName: shop.lead.printedName },
      version: 1,
    });
    expect(machine.profile.panel.fields.map(({ label }) => label)).toEqual(['POWER', 'SPEED', 'FREQ', 'LINE']);
    const events = (await get(`/api/ledger?subjectId=${machine.id}`, shop.lead.headers)).json<{ items: LedgerEventDto[] }>().items;
    expect(events).toMatchObject([{ action: 'machine.created', actorName: shop.lead.printedName }]);
  });

  it('puts the lens that is mounted on the machine, and writes that into the ledger', async () => {
    const lens = await makeLens(test, shop.lead);
    const machine = await makeMachine(test, shop.lead, { mountedLensId: lens.id });
    const { items } = (await get(`/api/machines/${machine.id}/lenses`)).json<MachineLensListDto>();
    expect(items).toMatchObject([{ lensId: lens.id, isMounted: true, workingDistanceMm: null, measuredSpotUm: null }]);
    expect(await addedLenses(machine.id)).toEqual([lens.id]);
  });

  it('puts a lens on once, however often it is mounted', async () => {
    const lens = await makeLens(test, shop.lead);
    const created = await makeMachine(test, shop.lead);
    const mounted = (await patch(created, { mountedLensId: lens.id })).json<MachineDto>();
    const bare = (await patch(mounted, { mountedLensId: null })).json<MachineDto>();
    await patch(bare, { mountedLensId: lens.id });
    expect((await get(`/api/machines/${created.id}/lenses`)).json<MachineLensListDto>().items).toHaveLength(1);
    expect(await addedLenses(created.id)).toEqual([lens.id]);
  });

  it('refuses a repeated name at its field', async () => {
    await makeMachine(test, shop.lead, { name: 'Bench 2' });
    const answer = await test.app.inject({
      method: 'POST',
      url: '/api/machines',
      headers: { ...shop.lead.headers, ...newKey() },
      payload: fibreMachine({ name: ' Bench 2 ' }),
    });
    expect(pointersOf(expectProblem(answer, 409, 'already-exists'))).toEqual(['#/name']);
  });

  it('names every wrong field, down to the row of the panel', async () => {
    const body = fibreMachine({ name: '  ', warmUpMinutes: 2.5 });
    const payload = {
      ...body,
      physical: { ...body.physical, sourceKind: 'steam', wavelengthNm: -1, m2: 0.5 },
      panel: { fields: [{ parameter: 'powerPercent', label: '', unit: 'furlong', step: 0 }] },
    };
    const answer = await test.app.inject({ method: 'POST', url: '/api/machines', headers: { ...shop.lead.headers, ...newKey() }, payload });
    expect(pointersOf(expectProblem(answer, 422, 'invalid-fields'))).toEqual(
      [
        '#/name',
        '#/warmUpMinutes',
        '#/physical/sourceKind',
        '#/physical/wavelengthNm',
        '#/physical/m2',
        '#/panel/fields/0/label',
        '#/panel/fields/0/unit',
        '#/panel/fields/0/step',
      ].sort(),
    );
  });

  it('refuses a panel that no value could be entered into', async () => {
    const fields = [
      { parameter: 'speedMmPerS', label: 'Speed', unit: 'percentFromZero' },
      { parameter: 'speedMmPerS', label: 'Speed 2', unit: 'mm/s', minimum: 10, maximum: 1 },
    ];
    const answer = await test.app.inject({
      method: 'POST',
      url: '/api/machines',
      headers: { ...shop.lead.headers, ...newKey() },
      payload: fibreMachine({ panel: { fields } }),
    });
    const pointers = ['#/panel/fields/0/rangeHigh', '#/panel/fields/1/maximum', '#/panel/fields/1/parameter'];
    expect(pointersOf(expectProblem(answer, 422, 'invalid-fields'))).toEqual(pointers);
  });

  it('refuses another shop’s lens as the mounted one', async () => {
    const foreign = await makeLens(test, elsewhere.lead);
    const answer = await test.app.inject({
      method: 'POST',
      url: '/api/machines',
      headers: { ...shop.lead.headers, ...newKey() },
      payload: fibreMachine({ mountedLensId: foreign.id }),
    });
    expect(pointersOf(expectProblem(answer, 422, 'invalid-fields'))).toEqual(['#/mountedLensId']);
  });

  it('is for leads and owners', async () => {
    for (const member of [shop.trainee, shop.operator]) {
      const headers = { ...member.headers, ...newKey() };
      expectProblem(
        await test.app.inject({ method: 'POST', url: '/api/machines', headers, payload: fibreMachine() }),
        403,
        'not-permitted',
      );
    }
    await makeMachine(test, shop.owner);
  });
});

describe('PATCH /api/machines/:id', () => {
  it('keeps the profile when neither source nor panel changed', async () => {
    const lens = await makeLens(test, shop.lead);
    const machine = await makeMachine(test, shop.lead);
    const answer = await patch(machine, { name: 'Renamed', warmUpMinutes: 0, mountedLensId: lens.id, panel: machine.profile.panel });
    expect(answer.json<MachineDto>()).toMatchObject({
      name: 'Renamed',
      warmUpMinutes: 0,
      mountedLens: { id: lens.id, name: lens.name },
      profile: { id: machine.profile.id, number: 1 },
      version: 2,
    });
    expect(answer.headers.etag).toBe('"v2"');
  });

  it('makes the next profile of a changed panel and leaves the physical number', async () => {
    const machine = await makeMachine(test, shop.lead);
    const fields = machine.profile.panel.fields.map((field) => ({ ...field, label: field.label.toLowerCase() })).reverse();
    const answer = await patch(machine, { panel: { fields } });
    expect(answer.json<MachineDto>().profile).toMatchObject({ number: 2, physicalNumber: 1, panel: { fields } });
  });

  it('makes the next physical number of a changed source, and earlier profiles stay', async () => {
    const machine = await makeMachine(test, shop.lead);
    const physical = { ...machine.profile.physical, ratedPowerW: 30 };
    const changed = (await patch(machine, { physical })).json<MachineDto>();
    expect(changed.profile).toMatchObject({ number: 2, physicalNumber: 2 });
    const { items } = (await get(`/api/machines/${machine.id}/profiles`)).json<{ items: MachineProfileDto[] }>();
    expect(items.map(({ number, physical }) => [number, physical.ratedPowerW])).toEqual([
      [2, 30],
      [1, 20],
    ]);
  });

  it('refuses an edit of an older version and carries the present one', async () => {
    const machine = await makeMachine(test, shop.lead);
    await patch(machine, { name: 'Moved on' });
    const problem = expectProblem(await patch(machine, { name: 'Too late' }), 412, 'stale-version');
    expect(problem.current).toMatchObject({ name: 'Moved on', version: 2 });
  });

  it('needs the version that was read', async () => {
    const machine = await makeMachine(test, shop.lead);
    const request = { method: 'PATCH', url: `/api/machines/${machine.id}`, headers: shop.lead.headers, payload: { name: 'x' } } as const;
    expectProblem(await test.app.inject(request), 428, 'version-required');
  });

  it('gives exactly one of two edits at once a profile of the next number', async () => {
    const machine = await makeMachine(test, shop.lead);
    const answers = await Promise.all(
      [30, 50].map((ratedPowerW) => patch(machine, { physical: { ...machine.profile.physical, ratedPowerW } })),
    );
    expect(answers.map(({ statusCode }) => statusCode).sort()).toEqual([200, 412]);
    const { items } = (await get(`/api/machines/${machine.id}/profiles`)).json<{ items: MachineProfileDto[] }>();
    expect(items.map(({ number }) => number)).toEqual([2, 1]);
  });
});

describe('archiving a machine', () => {
  it('takes it out of the list, refuses edits, and can be undone', async () => {
    const machine = await makeMachine(test, shop.lead);
    const act = (verb: string, version: number) =>
      test.app.inject({ method: 'POST', url: `/api/machines/${machine.id}/${verb}`, headers: editing(shop.lead, version) });
    const archived = (await act('archive', 1)).json<MachineDto>();
    expect(archived).toMatchObject({ archivedAt: expect.any(String), allowedActions: ['restore'] });
    const names = async (query: string) =>
      (await get(`/api/machines?limit=100${query}`)).json<{ items: MachineDto[] }>().items.map(({ name }) => name);
    expect(await names('')).not.toContain(machine.name);
    expect(await names('&archived=true')).toContain(machine.name);
    expectProblem(await patch(machine, { name: 'x' }, archived.version), 409, 'conflict');
    expect((await act('restore', archived.version)).json<MachineDto>().archivedAt).toBeNull();
  });
});

describe('GET /api/machines', () => {
  it('pages by name without losing or repeating one', async () => {
    const fresh = await makeStaffedShop(test);
    for (const name of ['C', 'A', 'B']) await makeMachine(test, fresh.lead, { name });
    const first = (await get('/api/machines?limit=2', fresh.operator.headers)).json<{ items: MachineDto[]; nextCursor: string }>();
    const rest = (await get(`/api/machines?limit=2&cursor=${first.nextCursor}`, fresh.operator.headers)).json<typeof first>();
    expect([...first.items, ...rest.items].map(({ name }) => name)).toEqual(['A', 'B', 'C']);
    expect(rest.nextCursor).toBeNull();
  });

  it('lets operators read and only leads act', async () => {
    const { id } = await makeMachine(test, shop.lead);
    expect((await get(`/api/machines/${id}`)).json<MachineDto>().allowedActions).toEqual([]);
    const seen = (await get(`/api/machines/${id}`, shop.lead.headers)).json<MachineDto>();
    expect(seen.allowedActions).toEqual(['edit', 'archive', 'add-lens', 'add-calibration']);
  });
});

describe('every machine route', () => {
  const routes = (id: string) =>
    [
      ['GET', `/api/machines/${id}`],
      ['GET', `/api/machines/${id}/profiles`],
      ['PATCH', `/api/machines/${id}`],
      ['POST', `/api/machines/${id}/archive`],
      ['POST', `/api/machines/${id}/restore`],
    ] as const;
  const call = ([method, url]: readonly ['GET' | 'PATCH' | 'POST', string], headers: Record<string, string>) =>
    test.app.inject({
      method,
      url,
      headers: { ...headers, 'if-match': '"v1"' },
      ...(method === 'PATCH' ? { payload: { name: 'x' } } : {}),
    });

  it('answers 404 for another shop’s machine and for one that never was', async () => {
    const foreign = await makeMachine(test, elsewhere.lead);
    for (const id of [foreign.id, randomUUID()]) {
      for (const route of routes(id)) expectProblem(await call(route, shop.owner.headers), 404, 'not-found');
    }
  });

  it('refuses the anonymous, and trainees', async () => {
    const { id } = await makeMachine(test, shop.lead);
    for (const route of [['GET', '/api/machines'] as const, ...routes(id)]) {
      expectProblem(await call(route, {}), 401, 'not-signed-in');
      expectProblem(await call(route, shop.trainee.headers), 403, 'not-permitted');
    }
  });
});
