import { randomUUID } from 'node:crypto';
import type { LedgerEventDto } from '../src/ledger/dto/ledger-event.dto';
import type { RunDto, RunPageDto } from '../src/runs/dto/run.dto';
import type { StartSheetDto } from '../src/runs/dto/start-sheet.dto';
import { createTestApp, type TestApp } from './support/app';
import { type ApprovedRecipe, makeRecipe, supersedeRecipe, withdrawRecipe } from './support/approved-recipe';
import { asSuperuser } from './support/database';
import { created, editing, fillStarterContent, makeLens, makeMaterial } from './support/equipment';
import { makeStaffedShop, type TestMember } from './support/factories';
import { newKey } from './support/idempotency';
import { expectProblem, pointersOf } from './support/problem';

type Shop = Awaited<ReturnType<typeof makeStaffedShop>>;
let test: TestApp;
let shop: Shop;
let elsewhere: Shop;
let dial: ApprovedRecipe;

beforeAll(async () => {
  test = await createTestApp();
  [shop, elsewhere] = [await makeStaffedShop(test), await makeStaffedShop(test)];
  for (const one of [shop, elsewhere]) await fillStarterContent(test, one.owner);
  dial = await makeRecipe(test, shop.lead);
});
afterAll(() => test.close());

type Given = Readonly<Record<string, unknown>>;
const startOf = (recipe: ApprovedRecipe, given: Given = {}) => ({
  clientId: randomUUID(),
  kind: 'production',
  revisionId: recipe.revisionId,
  lensFittedId: recipe.lens.id,
  ticks: ['set-up.0'],
  ...given,
});
const post = (url: string, payload: Given, member: TestMember = shop.trainee) =>
  test.app.inject({ method: 'POST', url, headers: { ...member.headers, ...newKey() }, payload });
const start = (recipe: ApprovedRecipe, given: Given = {}, member: TestMember = shop.trainee) =>
  post('/api/runs', startOf(recipe, given), member);
const started = async (recipe: ApprovedRecipe, given: Given = {}, member: TestMember = shop.trainee) => {
  const answer = await start(recipe, given, member);
  expect(answer.statusCode).toBe(201);
  return answer.json<RunDto>();
};
const act = (run: RunDto, name: string, payload: Given, member: TestMember = shop.trainee) =>
  post(`/api/runs/${run.id}/${name}`, payload, member);
const get = (url: string, member: TestMember = shop.trainee) => test.app.inject({ url, headers: member.headers });

describe('POST /api/runs', () => {
  it('starts a run of a trainee with its code, ticks and hash, and writes it into the ledger', async () => {
    const run = await started(dial, {
      ticks: ['set-up.0', 'setting.0.powerPercent'],
      jobReference: ' J-26-0411 ',
      part: 'TD-210',
      lot: 'B14',
    });
    expect(run).toMatchObject({
      code: expect.stringMatching(/^J-\d{4}$/),
      kind: 'production',
      state: 'started',
      recipe: { id: dial.recipeId },
      revision: { number: 1, state: 'approved' },
      lensFitted: { id: dial.lens.id },
      jobReference: 'J-26-0411',
      part: 'TD-210',
      lot: 'B14',
      firstPiece: null,
      startedBy: { id: shop.trainee.id },
      allowedActions: ['tick', 'set-up-part', 'first-piece', 'finish', 'bad-result'],
    });
    expect(Object.keys(run.ticks)).toEqual(['set-up.0', 'setting.0.powerPercent']);
    expect(run.contentHash).not.toBe('');
    const events = (await get(`/api/ledger?subjectId=${run.id}`, shop.operator)).json<{ items: LedgerEventDto[] }>().items;
    expect(events).toMatchObject([{ action: 'run.started', subjectCode: run.code, actorName: shop.trainee.printedName }]);
  });

  it('makes one run of what a device sent twice, whatever the key of the call', async () => {
    const payload = startOf(dial);
    const [first, second] = [await post('/api/runs', payload), await post('/api/runs', payload)];
    expect(second.json<RunDto>().id).toBe(first.json<RunDto>().id);
    expectProblem(await post('/api/runs', { ...payload, kind: 'daily-check' }), 409, 'already-exists');
    expectProblem(await post('/api/runs', payload, shop.operator), 409, 'already-exists');
  });

  it('names the lens that must be fitted and each step that must be ticked', async () => {
    const steps = await makeRecipe(test, shop.lead, {
      setUpSteps: [
        { text: 'Extraction on', mustTick: true },
        { text: 'Compare with the picture', mustTick: false },
        { text: 'Set the height', mustTick: true },
      ],
    });
    const other = await makeLens(test, shop.lead);
    const problem = expectProblem(await start(steps, { lensFittedId: other.id, ticks: [] }), 422, 'not-ready-to-start');
    expect(problem.errors?.map(({ detail }) => detail)).toEqual([
      `Fit ${steps.lens.name}: the setting was proved with it, and another lens makes another mark.`,
      'Do and tick step 1 first: Extraction on',
      'Do and tick step 3 first: Set the height',
    ]);
    await started(steps, { ticks: ['set-up.0', 'set-up.2'] });
  });

  it('refuses ticks of another setting', async () => {
    const problem = expectProblem(await start(dial, { ticks: ['set-up.0', 'set-up.7', 'setting.3.passes'] }), 422, 'not-ready-to-start');
    expect(problem.errors).toHaveLength(2);
  });

  it.each([
    ['draft', 'operator'],
    ['in_review', 'operator'],
    ['returned', 'operator'],
    ['scheduled', 'trainee'],
    ['superseded', 'trainee'],
    ['withdrawn', 'trainee'],
  ] as const)('refuses parts with a revision that is %s', async (state, role) => {
    const recipe = await makeRecipe(test, shop.lead, { state });
    expectProblem(await start(recipe, {}, shop[role]), 409, 'not-approved');
  });

  it('hides drafts from a trainee', async () => {
    const draft = await makeRecipe(test, shop.lead, { state: 'draft' });
    expectProblem(await start(draft), 404, 'not-found');
    expectProblem(await get(`/api/runs/start-sheet/${draft.revisionId}`), 404, 'not-found');
  });

  it('refuses what is on hold with the reason, for the recipe as for the machine', async () => {
    for (const subject of ['recipeId', 'machineId'] as const) {
      const held = await makeRecipe(test, shop.lead);
      const id = subject === 'recipeId' ? held.recipeId : held.machine.id;
      await created(test, shop.lead, '/api/holds', { [subject]: id, reason: 'Marks come off' });
      const problem = expectProblem(await start(held), 409, 'on-hold');
      expect(problem).toMatchObject({ holds: [{ reason: 'Marks come off', placedBy: shop.lead.printedName }] });
    }
  });

  it('refuses a material that must never be marked, with the source', async () => {
    const vinyl = await makeMaterial(test, shop.lead, { family: 'pvc' });
    const never = await makeRecipe(test, shop.lead, { material: vinyl });
    for (const kind of ['production', 'confirmation', 'daily-check']) {
      const problem = expectProblem(await start(never, { kind }, shop.lead), 409, 'never-mark');
      expect(problem).toMatchObject({ cautions: [{ source: expect.any(String) }] });
    }
  });

  it('refuses a recipe that covers such a material by its group, until a lead takes it out', async () => {
    const vinyl = await makeMaterial(test, shop.lead, { family: 'pvc' });
    const group = await created<{ id: string }>(test, shop.lead, '/api/material-groups', { name: randomUUID(), materialIds: [vinyl.id] });
    const covering = await makeRecipe(test, shop.lead, { materialGroupId: group.id });
    const sheet = (await get(`/api/runs/start-sheet/${covering.revisionId}`)).json<StartSheetDto>();
    expect(sheet.cautions[0]).toMatchObject({ level: 'never' });
    const problem = expectProblem(await start(covering), 409, 'never-mark');
    expect(problem).toMatchObject({ detail: expect.stringContaining('out of the group'), cautions: [{ source: expect.any(String) }] });
    const headers = editing(shop.lead, 1);
    await test.app.inject({ method: 'PATCH', url: `/api/material-groups/${group.id}`, headers, payload: { materialIds: [] } });
    await started(covering);
  });

  it('refuses an overdue setting only where the policy says so', async () => {
    const overdue = await makeRecipe(test, shop.lead, { reviewDue: new Date('2020-01-01') });
    await started(overdue);
    const strict = await makeStaffedShop(test, { policy: { overdueBlocks: true } });
    await fillStarterContent(test, strict.owner);
    const blocked = await makeRecipe(test, strict.lead, { reviewDue: new Date('2020-01-01') });
    expectProblem(await start(blocked, {}, strict.trainee), 409, 'review-overdue');
    await started(blocked, { kind: 'daily-check' }, strict.trainee);
  });

  it('lets an operator prove a draft and keeps its steps; a trainee may not', async () => {
    const draft = await makeRecipe(test, shop.lead, { state: 'draft' });
    const run = await started(draft, { kind: 'confirmation' }, shop.operator);
    expect(run).toMatchObject({
      kind: 'confirmation',
      revision: { number: null, state: 'draft' },
      contentHash: expect.stringMatching(/^[0-9a-f]{64}$/),
    });
    expect(run.steps).toHaveLength(1);
    expectProblem(await start(dial, { kind: 'confirmation' }), 403, 'not-permitted');
  });

  it('refuses a stranger, another shop, a call without a key and a body with every field wrong', async () => {
    const payload = startOf(dial);
    expectProblem(await test.app.inject({ method: 'POST', url: '/api/runs', headers: newKey(), payload }), 401, 'not-signed-in');
    expectProblem(await post('/api/runs', payload, elsewhere.owner), 404, 'not-found');
    expectProblem(
      await test.app.inject({ method: 'POST', url: '/api/runs', headers: shop.trainee.headers, payload }),
      400,
      'idempotency-key-required',
    );
    const wrong = await post('/api/runs', {
      clientId: 1,
      kind: 'play',
      revisionId: 'x',
      lensFittedId: null,
      ticks: ['all'],
      part: 5,
      deviationId: '',
    });
    expect(pointersOf(expectProblem(wrong, 422, 'invalid-fields'))).toEqual(
      ['#/clientId', '#/deviationId', '#/kind', '#/lensFittedId', '#/part', '#/revisionId', '#/ticks'].sort(),
    );
  });
});

describe('GET /api/runs/start-sheet/:revisionId', () => {
  it('says what has to be known and done first', async () => {
    const sheet = (await get(`/api/runs/start-sheet/${dial.revisionId}`)).json<StartSheetDto>();
    expect(sheet).toMatchObject({
      lens: { id: dial.lens.id },
      setUpSteps: [{ mustTick: true }],
      holds: [],
      kinds: ['production', 'daily-check'],
    });
    expect(sheet.lenses.map(({ id }) => id)).toContain(dial.lens.id);
    const forOperator = (await get(`/api/runs/start-sheet/${dial.revisionId}`, shop.operator)).json<StartSheetDto>();
    expect(forOperator.kinds).toEqual(['production', 'confirmation', 'daily-check']);
  });

  it.each(['scheduled', 'superseded', 'withdrawn'] as const)('tells a trainee that a revision is %s, not what is in it', async (state) => {
    const { revisionId } = await makeRecipe(test, shop.lead, { state });
    const sheet = (await get(`/api/runs/start-sheet/${revisionId}`)).json<StartSheetDto>();
    expect(sheet).toMatchObject({ revision: { state }, kinds: [], steps: [], setUpSteps: [] });
    const forOperator = (await get(`/api/runs/start-sheet/${revisionId}`, shop.operator)).json<StartSheetDto>();
    expect(forOperator.steps).toHaveLength(1);
  });

  it('refuses a stranger and another shop', async () => {
    const url = `/api/runs/start-sheet/${dial.revisionId}`;
    expectProblem(await test.app.inject({ url }), 401, 'not-signed-in');
    expectProblem(await get(url, elsewhere.owner), 404, 'not-found');
    expectProblem(await get('/api/runs/start-sheet/none'), 404, 'not-found');
  });
});

describe('PATCH /api/runs/:id/ticks', () => {
  const patch = (run: RunDto, payload: Given, member: TestMember = shop.trainee) =>
    test.app.inject({ method: 'PATCH', url: `/api/runs/${run.id}/ticks`, headers: member.headers, payload });

  it('ticks and unticks, and keeps the time of what was ticked before', async () => {
    const run = await started(dial);
    const first = (await patch(run, { tick: ['setting.0.passes'], untick: [] })).json<RunDto>();
    const second = (await patch(run, { tick: ['setting.0.passes', 'setting.0.speedMmPerS'], untick: ['set-up.0'] })).json<RunDto>();
    expect(Object.keys(second.ticks).sort()).toEqual(['setting.0.passes', 'setting.0.speedMmPerS']);
    expect(second.ticks['setting.0.passes']).toBe(first.ticks['setting.0.passes']);
  });

  it('refuses what the setting does not have, somebody else’s run, and a finished one', async () => {
    const run = await started(dial, {}, shop.operator);
    expectProblem(await patch(run, { tick: ['set-up.9'], untick: [] }, shop.operator), 422, 'not-ready-to-start');
    expectProblem(await patch(run, { tick: [], untick: [] }, shop.trainee), 404, 'not-found');
    expectProblem(await patch(run, { tick: [], untick: [] }, elsewhere.owner), 404, 'not-found');
    await act(run, 'finish', { good: 0, scrap: 1 }, shop.operator);
    expectProblem(await patch(run, { tick: [], untick: [] }, shop.operator), 409, 'run-finished');
    expect(pointersOf(expectProblem(await patch(run, { tick: 'all' }, shop.operator), 422, 'invalid-fields'))).toEqual([
      '#/tick',
      '#/untick',
    ]);
    const anonymous = await test.app.inject({ method: 'PATCH', url: `/api/runs/${run.id}/ticks`, payload: { tick: [], untick: [] } });
    expectProblem(anonymous, 401, 'not-signed-in');
  });
});

describe('first piece and finish', () => {
  it('counts good parts only after the first piece was released', async () => {
    const run = await started(dial);
    expectProblem(await act(run, 'finish', { good: 1, scrap: 0 }), 409, 'first-piece-not-released');
    const refused = (await act(run, 'first-piece', { ok: false, note: 'Too pale' })).json<RunDto>();
    expect(refused.firstPiece).toMatchObject({ ok: false, note: 'Too pale', byName: shop.trainee.printedName });
    expectProblem(await act(run, 'finish', { good: 1, scrap: 0 }), 409, 'first-piece-not-released');
    await act(run, 'first-piece', { ok: true });
    const nothing = expectProblem(await act(run, 'finish', { good: 24, scrap: 2, notes: null, measurements: null }), 422, 'invalid-fields');
    expect(pointersOf(nothing)).toEqual(['#/measurements', '#/notes']);
    const finished = (await act(run, 'finish', { good: 24, scrap: 2, notes: 'Two slipped' })).json<RunDto>();
    expect(finished).toMatchObject({ state: 'finished', good: 24, scrap: 2, notes: 'Two slipped', allowedActions: ['bad-result'] });
    expect(finished.finishedAt).not.toBeNull();
    for (const [name, body] of [
      ['finish', { good: 1, scrap: 0 }],
      ['first-piece', { ok: true }],
    ] as const)
      expectProblem(await act(run, name, body), 409, 'run-finished');
  });

  it('lets a batch that is all scrap end without a released first piece', async () => {
    const run = await started(dial);
    expect((await act(run, 'finish', { good: 0, scrap: 3 })).json<RunDto>()).toMatchObject({ state: 'finished', good: 0, scrap: 3 });
  });

  it('does not release a first piece under a hold, but lets the run end', async () => {
    const held = await makeRecipe(test, shop.lead);
    const run = await started(held);
    await created(test, shop.lead, '/api/holds', { recipeId: held.recipeId, reason: 'Wrong lot' });
    expectProblem(await act(run, 'first-piece', { ok: true }), 409, 'on-hold');
    const seen = (await get(`/api/runs/${run.code}`)).json<RunDto>();
    expect(seen).toMatchObject({ holds: [{ reason: 'Wrong lot' }], allowedActions: ['tick', 'set-up-part', 'finish', 'bad-result'] });
    expect((await act(run, 'finish', { good: 0, scrap: 1 })).statusCode).toBe(200);
  });

  it('does not release a first piece of a revision that was withdrawn meanwhile', async () => {
    const recipe = await makeRecipe(test, shop.lead);
    const run = await started(recipe);
    await withdrawRecipe(test, shop.lead, recipe);
    expectProblem(await act(run, 'first-piece', { ok: true }), 409, 'not-approved');
    const seen = (await get(`/api/runs/${run.code}`)).json<RunDto>();
    expect(seen).toMatchObject({ firstPiece: null, allowedActions: ['tick', 'set-up-part', 'finish', 'bad-result'] });
    expect((await act(run, 'first-piece', { ok: false, note: 'Stopped.' })).statusCode).toBe(200);
    expect((await act(run, 'finish', { good: 0, scrap: 1 })).statusCode).toBe(200);
  });

  it('says of a run under way that its revision was withdrawn, by whom and why, or superseded', async () => {
    const [gone, renewed] = [await makeRecipe(test, shop.lead), await makeRecipe(test, shop.lead)];
    const runs = [await started(gone), await started(renewed)];
    expect(runs.map(({ stop }) => stop)).toEqual([null, null]);
    await withdrawRecipe(test, shop.lead, gone, 'The tint came off');
    await supersedeRecipe(test, shop.lead, renewed);
    const [withdrawn, superseded] = await Promise.all(runs.map(async ({ code }) => (await get(`/api/runs/${code}`)).json<RunDto>()));
    expect(withdrawn?.stop).toEqual({
      ...{ because: 'withdrawn', by: shop.lead.printedName, reason: 'The tint came off' },
      ...{ at: expect.stringMatching(/Z$/), approvedNumber: null },
    });
    expect(superseded).toMatchObject({
      stop: { because: 'superseded', approvedNumber: 2 },
      allowedActions: ['tick', 'set-up-part', 'finish', 'bad-result'],
    });
    expectProblem(await act(runs[1] as RunDto, 'first-piece', { ok: true }), 409, 'not-approved');
    expect((await act(runs[1] as RunDto, 'finish', { good: 0, scrap: 1 })).json<RunDto>().stop).toBeNull();
  });

  it('carries the cautions of its work, those of all work told apart', async () => {
    const ring = await makeRecipe(test, shop.lead);
    const words = { subject: 'Clamp it', text: 'It slips.', source: 'The shop' };
    await created(test, shop.lead, '/api/cautions', { level: 'care', ...words, appliesTo: { materialIds: [ring.material.id] } });
    const { cautions } = await started(ring);
    expect(cautions.filter(({ isGeneral }) => isGeneral).length).toBeGreaterThan(0);
    expect(cautions.filter(({ isGeneral }) => !isGeneral)).toMatchObject([words]);
    const sheet = (await get(`/api/runs/start-sheet/${ring.revisionId}`)).json<StartSheetDto>();
    expect(sheet.cautions).toEqual(cautions);
  });

  it('judges the pieces of a confirmation run by the criteria of the coupon, and needs at least one', async () => {
    const draft = await makeRecipe(test, shop.lead, { state: 'draft' });
    const run = await started(draft, { kind: 'confirmation', lot: 'B15' }, shop.operator);
    const bare = await act(run, 'finish', { good: 2, scrap: 0 }, shop.operator);
    expect(pointersOf(expectProblem(bare, 422, 'invalid-fields'))).toEqual(['#/measurements']);
    const measurements = [
      { piece: 1, quantity: 'contrast', value: 0.95, method: 'photo' },
      { piece: 2, quantity: 'contrast', value: 0.85, method: 'photo' },
      { piece: 2, quantity: 'depth', value: 12, method: 'profilometer' },
    ];
    const finished = (await act(run, 'finish', { good: 2, scrap: 0, measurements }, shop.operator)).json<RunDto>();
    expect(finished.measurements.map(({ piece, unit, meets }) => [piece, unit, meets])).toEqual([
      [1, '1', true],
      [2, '1', false],
      [2, 'µm', null],
    ]);
  });

  it('carries an act out once, however often it is sent with one key', async () => {
    const run = await started(dial);
    const call = {
      method: 'POST',
      url: `/api/runs/${run.id}/finish`,
      headers: { ...shop.trainee.headers, ...newKey() },
      payload: { good: 0, scrap: 1 },
    } as const;
    const [first, again] = [await test.app.inject(call), await test.app.inject(call)];
    expect([first.statusCode, again.statusCode]).toEqual([200, 200]);
    expect(again.headers['idempotency-replayed']).toBe('true');
  });

  it('refuses wrong bodies, unknown photos, strangers and others’ runs', async () => {
    const run = await started(dial);
    expect(
      pointersOf(expectProblem(await act(run, 'finish', { good: -1, scrap: 1.5, measurements: [{ piece: 0 }] }), 422, 'invalid-fields')),
    ).toEqual(
      [
        '#/good',
        '#/measurements/0/method',
        '#/measurements/0/piece',
        '#/measurements/0/quantity',
        '#/measurements/0/value',
        '#/scrap',
      ].sort(),
    );
    expect(pointersOf(expectProblem(await act(run, 'first-piece', { ok: 'yes' }), 422, 'invalid-fields'))).toEqual(['#/ok']);
    expect(pointersOf(expectProblem(await act(run, 'first-piece', { ok: true, photoId: randomUUID() }), 422, 'invalid-fields'))).toEqual([
      '#/photoId',
    ]);
    for (const name of ['finish', 'first-piece', 'bad-result']) {
      const url = `/api/runs/${run.id}/${name}`;
      const payload = { good: 0, scrap: 0, ok: true, outcome: 'faint' };
      const body = name === 'finish' ? { good: 0, scrap: 0 } : name === 'first-piece' ? { ok: true } : { outcome: payload.outcome };
      expectProblem(await test.app.inject({ method: 'POST', url, headers: newKey(), payload: body }), 401, 'not-signed-in');
      expectProblem(await post(url, body, elsewhere.owner), 404, 'not-found');
      expectProblem(await post(`/api/runs/${randomUUID()}/${name}`, body), 404, 'not-found');
    }
  });
});

describe('POST /api/runs/:id/bad-result', () => {
  it('is told during a run and after it', async () => {
    const run = await started(dial);
    expect((await act(run, 'bad-result', { outcome: 'faint' })).json<RunDto>().badResult).toMatchObject({ outcome: 'faint', note: '' });
    await act(run, 'finish', { good: 0, scrap: 5 });
    const later = (await act(run, 'bad-result', { outcome: 'peeled', note: 'Customer sent one back' }, shop.operator)).json<RunDto>();
    expect(later).toMatchObject({ state: 'finished', scrap: 5, badResult: { outcome: 'peeled', byName: shop.operator.printedName } });
  });

  it('is told to every lead by letter, in the transaction of the act, but not to whoever tells it', async () => {
    const run = await started(dial, { jobReference: 'J-26-0433' });
    await act(run, 'bad-result', { outcome: 'peeled', note: 'Comes off with tape' }, shop.lead);
    const letters = await asSuperuser(
      test,
      (sql) => sql<{ payload: { to: { address: string } } }[]>`
        select payload from outbox where kind = 'bad-result' and payload ->> 'runCode' = ${run.code} and shop_id = ${shop.lead.shopId}`,
    );
    expect(letters.map(({ payload }) => payload)).toEqual([
      expect.objectContaining({
        to: expect.objectContaining({ address: shop.owner.email }),
        ...{ outcome: 'Peeled', note: 'Comes off with tape', jobReference: 'J-26-0433', by: shop.lead.printedName },
      }),
    ]);
  });

  it('takes no good news', async () => {
    const run = await started(dial);
    expect(pointersOf(expectProblem(await act(run, 'bad-result', { outcome: 'good' }), 422, 'invalid-fields'))).toEqual(['#/outcome']);
  });
});

describe('GET /api/runs', () => {
  it('shows a trainee the own runs, others everybody’s, by job reference and by words', async () => {
    const own = await started(dial, { jobReference: 'J-26-0500', part: 'Bezel' });
    const other = await started(dial, { jobReference: 'J-26-0500' }, shop.operator);
    const list = async (query: string, member: TestMember) =>
      (await get(`/api/runs?${query}`, member)).json<RunPageDto>().items.map(({ id }) => id);
    expect(await list('jobReference=J-26-0500', shop.trainee)).toEqual([own.id]);
    expect(await list('jobReference=J-26-0500', shop.operator)).toEqual([other.id, own.id]);
    expect(await list('q=bezel 0500', shop.lead)).toEqual([own.id]);
    expect(await list('state=finished&jobReference=J-26-0500', shop.lead)).toEqual([]);
    expect(await list(`recipeId=${dial.recipeId}&kind=production&machineId=${dial.machine.id}&q=0500`, shop.lead)).toEqual([
      other.id,
      own.id,
    ]);
    expect(await list('jobReference=J-26-0500', elsewhere.owner)).toEqual([]);
  });

  it('goes through all pages without a gap or a repeat', async () => {
    const jobReference = `pages-${randomUUID()}`;
    const made = [];
    for (let index = 0; index < 3; index += 1) made.push((await started(dial, { jobReference })).id);
    const first = (await get(`/api/runs?limit=2&jobReference=${jobReference}`)).json<RunPageDto>();
    const rest = (await get(`/api/runs?limit=2&jobReference=${jobReference}&cursor=${first.nextCursor}`)).json<RunPageDto>();
    expect([...first.items, ...rest.items].map(({ id }) => id)).toEqual(made.reverse());
    expect(rest.nextCursor).toBeNull();
  });

  it('gives one by id or code; a trainee somebody else’s as not there', async () => {
    const run = await started(dial, {}, shop.operator);
    expect((await get(`/api/runs/${run.code}`, shop.lead)).json<RunDto>().id).toBe(run.id);
    expect((await get(`/api/runs/${run.id}`, shop.operator)).headers.etag).toBe('"v1"');
    for (const key of [run.id, run.code]) {
      expectProblem(await get(`/api/runs/${key}`), 404, 'not-found');
      expectProblem(await get(`/api/runs/${key}`, elsewhere.owner), 404, 'not-found');
    }
    expectProblem(await get('/api/runs/nothing'), 404, 'not-found');
  });

  it('exports what the caller may read, with formulas disarmed', async () => {
    await started(dial, { jobReference: '=1+1', part: 'Tag' });
    const csv = await get('/api/runs/export.csv?q=tag');
    expect(csv.headers['content-type']).toContain('text/csv');
    expect(csv.body).toContain("'=1+1");
    expect(csv.body.trim().split('\n')).toHaveLength(2);
    const unknown = await get('/api/runs?kind=play&limit=0');
    expect(pointersOf(expectProblem(unknown, 422, 'invalid-fields'))).toEqual(['#/kind', '#/limit']);
    for (const url of ['/api/runs', '/api/runs/export.csv', '/api/runs/J-0001'])
      expectProblem(await test.app.inject({ url }), 401, 'not-signed-in');
  });
});

describe('deviations', () => {
  const grant = (recipe: ApprovedRecipe, given: Given, member: TestMember = shop.lead) =>
    post(
      '/api/deviations',
      { revisionId: recipe.revisionId, description: 'Power 28 % for the thin sheet', reason: 'Old stock', ...given },
      member,
    );

  it('covers as many parts as was granted, then ends by itself', async () => {
    const recipe = await makeRecipe(test, shop.lead);
    const { id } = (await grant(recipe, { maximumQuantity: 10 })).json<{ id: string }>();
    const run = await started(recipe, { deviationId: id });
    expect(run.deviation).toEqual({
      id,
      description: 'Power 28 % for the thin sheet',
      grantedBy: shop.lead.printedName,
      endsAt: null,
      maximumQuantity: 10,
    });
    await act(run, 'first-piece', { ok: true });
    expectProblem(await act(run, 'finish', { good: 9, scrap: 2 }), 409, 'deviation-over');
    expect((await act(run, 'finish', { good: 9, scrap: 1 })).statusCode).toBe(200);
    expectProblem(await start(recipe, { deviationId: id }), 409, 'deviation-over');
    const sheet = (await get(`/api/runs/start-sheet/${recipe.revisionId}`)).json<StartSheetDto>();
    expect(sheet.deviations).toEqual([]);
    const listed = (await get(`/api/deviations?revisionId=${recipe.revisionId}`, shop.operator)).json<{ items: object[] }>().items;
    expect(listed).toMatchObject([{ id, usedQuantity: 10, isLive: false, grantedBy: shop.lead.printedName }]);
  });

  it('is for the revision it was granted for', async () => {
    const recipe = await makeRecipe(test, shop.lead);
    const { id } = (await grant(recipe, { endsAt: '2099-01-01T00:00:00Z' })).json<{ id: string }>();
    expect(pointersOf(expectProblem(await start(dial, { deviationId: id }), 422, 'invalid-fields'))).toEqual(['#/deviationId']);
    await started(recipe, { deviationId: id });
  });

  it('is limited, granted by a lead, and departs from an approved revision of the shop', async () => {
    expect(pointersOf(expectProblem(await grant(dial, {}), 422, 'invalid-fields'))).toEqual(['#/endsAt']);
    expect(pointersOf(expectProblem(await grant(dial, { endsAt: '2020-01-01T00:00:00Z' }), 422, 'invalid-fields'))).toEqual(['#/endsAt']);
    expect(
      pointersOf(expectProblem(await grant(dial, { description: ' ', reason: '', maximumQuantity: 0 }), 422, 'invalid-fields')),
    ).toEqual(['#/description', '#/maximumQuantity', '#/reason']);
    for (const member of [shop.trainee, shop.operator])
      expectProblem(await grant(dial, { maximumQuantity: 1 }, member), 403, 'not-permitted');
    expectProblem(await grant(dial, { maximumQuantity: 1 }, elsewhere.owner), 404, 'not-found');
    const draft = await makeRecipe(test, shop.lead, { state: 'draft' });
    expectProblem(await grant(draft, { maximumQuantity: 1 }), 409, 'not-approved');
    expectProblem(await get('/api/deviations'), 403, 'not-permitted');
    for (const method of ['GET', 'POST'] as const)
      expectProblem(
        await test.app.inject({ method, url: '/api/deviations', headers: newKey(), ...(method === 'POST' ? { payload: {} } : {}) }),
        401,
        'not-signed-in',
      );
  });
});

it('a withdrawn recipe stops the next run at once', async () => {
  const recipe = await makeRecipe(test, shop.lead);
  await started(recipe);
  await withdrawRecipe(test, shop.lead, recipe);
  expectProblem(await start(recipe), 409, 'not-approved');
});
