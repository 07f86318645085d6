import { randomUUID } from 'node:crypto';
import type { FinderDto, FoundListDto, SheetCodeDto } from '../src/finder/dto/finder.dto';
import { createTestApp, type TestApp } from './support/app';
import { type ApprovedRecipe, makeRecipe, withdrawRecipe } from './support/approved-recipe';
import {
  created,
  effectByKey,
  fibreMachine,
  fillStarterContent,
  makeFinish,
  makeLens,
  makeMachine,
  makeMaterial,
} from './support/equipment';
import { makeStaffedShop } from './support/factories';
import { expectProblem, pointersOf } from './support/problem';

type Shop = Awaited<ReturnType<typeof makeStaffedShop>>;
let test: TestApp;
let shop: Shop;
let elsewhere: Shop;
/** Black anodised, sealed satin, white mark on Bench 2 with F160. */
let dial: ApprovedRecipe;

beforeAll(async () => {
  test = await createTestApp();
  [shop, elsewhere] = [await makeStaffedShop(test), await makeStaffedShop(test)];
  for (const one of [shop, elsewhere]) await fillStarterContent(test, one.owner);
  dial = await makeRecipe(test, shop.lead, {
    title: 'Dial, white',
    machine: await makeMachine(test, shop.lead, { name: 'Bench 2' }),
    lens: await makeLens(test, shop.lead, { name: 'F160' }),
    material: await makeMaterial(test, shop.lead, { name: 'Black anodised 6061', family: 'aluminium' }),
    finish: await makeFinish(test, shop.lead, { name: 'Sealed satin' }),
    effect: await effectByKey(test, shop.lead, 'white-mark'),
  });
});
afterAll(() => test.close());

const ask = async (query: Record<string, string>, headers: Record<string, string> = shop.trainee.headers) =>
  test.app.inject({ url: `/api/finder?${new URLSearchParams(query)}`, headers });
const found = async (query: Record<string, string>) => (await ask(query)).json<FinderDto>();
const keysOf = ({ machine, lens, material, finish, effect }: ApprovedRecipe) => ({
  machineId: machine.id,
  lensId: lens.id,
  materialId: material.id,
  finishId: finish.id,
  effectId: effect.id,
});

describe('GET /api/finder', () => {
  it('answers a trainee with the approved setting: card, steps, mark to match, limits and signature', async () => {
    const { answer, matchCount } = await found({ machineId: dial.machine.id, lensId: dial.lens.id, materialId: dial.material.id });
    expect(matchCount).toBe(1);
    expect(answer).toMatchObject({
      recipeId: dial.recipeId,
      revisionId: dial.revisionId,
      revisionNumber: 1,
      machine: { name: 'Bench 2' },
      isProfilePresent: true,
      holds: [],
      setUpSteps: [{ mustTick: true }],
      limits: { notes: 'Flat parts only' },
      signature: { printedName: shop.lead.printedName, isByAuthor: false },
      holdsUntil: null,
      isOverdue: false,
      blockedBecause: [],
      allowedActions: ['start-run'],
      reference: {
        address: 'B3',
        plate: { rows: 3, columns: 4 },
        lot: 'L-1',
        photo: null,
        measurements: [{ quantity: 'contrast', value: 0.95, criterion: 'at least 0.9' }],
      },
    });
    expect(answer?.panel.fields.map(({ label }) => label)).toEqual(['POWER', 'SPEED', 'FREQ', 'LINE']);
    expect(answer?.steps[0]?.parameters.values.lineSpacingUm).toEqual({ entered: { value: 0.03, unit: 'mm' }, physical: 30 });
  });

  it('answers nothing before the part is named, even when one recipe is left', async () => {
    const { answer, matchCount } = await found({ machineId: dial.machine.id });
    expect({ answer, matchCount }).toEqual({ answer: null, matchCount: 1 });
  });

  it('narrows all slots at once by abbreviated words and by synonyms of the material', async () => {
    for (const words of ['blk anod', 'satin white', 'aluminum bench']) expect((await found({ words })).answer?.code).toBe(dial.code);
    // a grade of the same family is not this one
    expect(await found({ words: 'anod 7075' })).toMatchObject({ answer: null, matchCount: 0 });
    expect(await found({ words: 'titanium' })).toMatchObject({ answer: null, matchCount: 0, nearMisses: [] });
  });

  it('counts each option with the other slots held and says why one has none', async () => {
    const clear = await makeMaterial(test, shop.lead, { name: 'Clear anodised 6061', family: 'aluminium' });
    const unused = await makeMaterial(test, shop.lead, { name: 'Hard anodised 7075', family: 'aluminium' });
    const dark = await effectByKey(test, shop.lead, 'dark-mark');
    await makeRecipe(test, shop.lead, { ...groundOf(dial), material: clear, effect: dark });
    const { slots } = await found({ machineId: dial.machine.id, effectId: dial.effect.id });
    const option = (id: string) => slots.material.options.find((one) => one.id === id);
    expect(option(dial.material.id)).toMatchObject({ count: 1, reason: null });
    expect(option(clear.id)).toMatchObject({ count: 0, reason: 'not for White mark' });
    expect(option(unused.id)).toMatchObject({ count: 0, reason: 'none yet' });
    expect(slots.material.options[0]?.id).toBe(dial.material.id);
    expect(slots.effect.options.filter(({ count }) => count > 0).map(({ name }) => name)).toEqual(['Dark mark', 'White mark']);
    expect(slots.machine).toMatchObject({ chosenId: dial.machine.id, fitCount: 1 });
    expect(slots.finish.settledId).toBe(dial.finish.id);
  });

  it('lists what is left while several fit, and takes one of them by name', async () => {
    const twin = await makeRecipe(test, shop.lead, { ...groundOf(dial), material: dial.material, title: 'Dial, thick' });
    const several = await found(keysOf(dial));
    expect(several.answer).toBeNull();
    expect(several.matches.map(({ recipeId }) => recipeId).sort()).toEqual([dial.recipeId, twin.recipeId].sort());
    expect((await found({ ...keysOf(dial), recipeId: twin.recipeId })).answer?.title).toBe('Dial, thick');
    await withdrawRecipe(test, shop.lead, twin);
  });

  it.each(['draft', 'in_review', 'returned', 'scheduled', 'superseded'] as const)(
    'never answers with a revision that is %s',
    async (state) => {
      const { material, ...rest } = await makeRecipe(test, shop.lead, { state });
      expect(await found(keysOf({ material, ...rest }))).toMatchObject({ answer: null, matchCount: 0, withdrawn: [] });
    },
  );

  it('says at once that a recipe was withdrawn, by whom and why', async () => {
    const gone = await makeRecipe(test, shop.lead, { state: 'withdrawn', withdrawnBecause: 'The tint came off' });
    const { answer, withdrawn } = await found(keysOf(gone));
    expect(answer).toBeNull();
    expect(withdrawn).toMatchObject([{ code: gone.code, by: shop.lead.printedName, reason: 'The tint came off' }]);
  });

  it('says so to whoever comes by a link to the recipe, by id or code, and to whoever types its name', async () => {
    const gone = await makeRecipe(test, shop.lead, { state: 'withdrawn', withdrawnBecause: 'Rims turn brown', title: 'Umbra ring' });
    const ways: Record<string, string>[] = [
      { recipeId: gone.recipeId },
      { recipeId: gone.code },
      { words: 'umbra' },
      { machineId: gone.machine.id },
    ];
    for (const query of ways)
      expect(await found(query)).toMatchObject({ answer: null, withdrawn: [{ code: gone.code, reason: 'Rims turn brown' }] });
    expect((await found({ recipeId: dial.code })).answer?.code).toBe(dial.code);
    expect((await found({})).withdrawn).toEqual([]);
  });

  it('offers the nearest where some of the typed words lead nowhere, and names those words', async () => {
    const { nearMisses, matchCount } = await found({ words: 'satin purple' });
    expect(matchCount).toBe(0);
    expect(nearMisses[0]).toMatchObject({ code: dial.code, missingWords: ['purple'], differs: [] });
  });

  it('shows the cautions of the work, the narrower before the general', async () => {
    const { cautions, isForbidden } = await found(keysOf(dial));
    expect(isForbidden).toBe(false);
    expect(cautions.length).toBeGreaterThan(3);
    expect(cautions.every(({ source, text }) => source !== '' && text !== '')).toBe(true);
    const general = cautions.map(({ isGeneral }) => isGeneral);
    expect(general).toEqual([...general].sort((one, other) => Number(one) - Number(other)));
    expect(general).toContain(true);
  });

  it('hides the setting of a material that must never be marked and says why', async () => {
    const vinyl = await makeMaterial(test, shop.lead, { name: 'Vinyl film', family: 'pvc' });
    const never = await makeRecipe(test, shop.lead, { material: vinyl });
    const { answer, isForbidden, cautions, nearMisses } = await found(keysOf(never));
    expect({ answer, isForbidden, nearMisses }).toEqual({ answer: null, isForbidden: true, nearMisses: [] });
    expect(cautions[0]).toMatchObject({ level: 'never', subject: 'Do not mark PVC, vinyl or artificial leather.' });
  });

  it('flags an overdue review and blocks the start only where the policy says so', async () => {
    const overdue = await makeRecipe(test, shop.lead, { reviewDue: new Date('2020-01-01') });
    expect((await found(keysOf(overdue))).answer).toMatchObject({ isOverdue: true, blockedBecause: [], allowedActions: ['start-run'] });
    const strict = await makeStaffedShop(test, { policy: { overdueBlocks: true } });
    await fillStarterContent(test, strict.owner);
    const blocked = await makeRecipe(test, strict.lead, { reviewDue: new Date('2020-01-01') });
    const answer = (await ask(keysOf(blocked), strict.trainee.headers)).json<FinderDto>().answer;
    expect(answer).toMatchObject({ isOverdue: true, allowedActions: [] });
    expect(answer?.blockedBecause).toHaveLength(1);
  });

  it('says when the machine was changed after the setting was proved', async () => {
    const proved = await makeRecipe(test, shop.lead);
    const body = fibreMachine();
    const answer = await test.app.inject({
      method: 'PATCH',
      url: `/api/machines/${proved.machine.id}`,
      headers: { ...shop.lead.headers, 'if-match': '"v1"' },
      payload: { physical: { ...body.physical, ratedPowerW: 30 } },
    });
    expect(answer.statusCode).toBe(200);
    expect((await found(keysOf(proved))).answer).toMatchObject({ isProfilePresent: false, profileNumber: 1 });
  });

  it('covers each material of the group that the recipe names', async () => {
    const member = await makeMaterial(test, shop.lead, { name: 'Black anodised 5083', family: 'aluminium' });
    const group = await created<{ id: string }>(test, shop.lead, '/api/material-groups', {
      name: 'Black anodised, wrought',
      materialIds: [member.id],
    });
    const covering = await makeRecipe(test, shop.lead, { materialGroupId: group.id });
    expect((await found({ machineId: covering.machine.id, materialId: member.id })).answer?.code).toBe(covering.code);
  });
});

describe('near misses', () => {
  it('come as same on another machine, other finish, other effect, same family, each saying what differs and why', async () => {
    const near = await makeStaffedShop(test);
    await fillStarterContent(test, near.owner);
    const ns = (kind: number) => ({ values: { pulseWidthNs: { entered: { value: kind, unit: 'ns' as const }, physical: kind } } });
    const bench1 = await makeMachine(test, near.lead, { name: 'Bench 1' });
    const mopa = fibreMachine();
    const bench2 = await makeMachine(test, near.lead, {
      name: 'Bench 2',
      physical: { ...mopa.physical, sourceKind: 'fibre-mopa', pulseWidthRangeNs: { from: 2, to: 350 } },
    });
    const lens = await makeLens(test, near.lead, { name: 'F254' });
    const grade2 = await makeMaterial(test, near.lead, { name: 'Titanium grade 2', family: 'titanium' });
    const grade5 = await makeMaterial(test, near.lead, { name: 'Titanium grade 5', family: 'titanium' });
    const [brushed, polished] = [
      await makeFinish(test, near.lead, { name: 'Brushed' }),
      await makeFinish(test, near.lead, { name: 'Polished' }),
    ];
    const [blue, grey] = [await effectByKey(test, near.lead, 'colour-anneal'), await effectByKey(test, near.lead, 'dark-anneal')];
    const asked = { machine: bench1, lens, material: grade2, finish: brushed, effect: blue };
    const family = await makeRecipe(test, near.lead, { ...asked, material: grade5 });
    const otherEffect = await makeRecipe(test, near.lead, { ...asked, effect: grey });
    const otherFinish = await makeRecipe(test, near.lead, { ...asked, finish: polished });
    const elsewhereMade = await makeRecipe(test, near.lead, { ...asked, machine: bench2, ...ns(30) });
    await makeRecipe(test, near.lead, { ...asked, material: await makeMaterial(test, near.lead, { family: 'brass' }) });

    const query = keysOf({ ...elsewhereMade, ...asked });
    const { answer, nearMisses } = (await ask(query, near.trainee.headers)).json<FinderDto>();
    expect(answer).toBeNull();
    expect(nearMisses.map(({ code }) => code)).toEqual([elsewhereMade.code, otherFinish.code, otherEffect.code]);
    expect(nearMisses[0]).toMatchObject({
      differs: [{ slot: 'machine', has: 'Bench 2', wanted: 'Bench 1' }],
      whyNot: 'It needs a pulse width of 30 ns. Bench 1 has one fixed pulse width, so the same mark is not possible there.',
    });
    expect(nearMisses[1]).toMatchObject({ differs: [{ slot: 'finish', has: 'Polished', wanted: 'Brushed' }] });
    await withdrawRecipe(test, near.lead, elsewhereMade);
    await withdrawRecipe(test, near.lead, otherFinish);
    const later = (await ask(query, near.trainee.headers)).json<FinderDto>().nearMisses;
    expect(later.map(({ code }) => code)).toEqual([otherEffect.code, family.code]);
  });
});

describe('the finder refuses', () => {
  it('a stranger', async () => {
    expectProblem(await ask({}, {}), 401, 'not-signed-in');
  });

  it('things of another shop as things that are not there', async () => {
    expectProblem(await ask({ machineId: dial.machine.id }, elsewhere.owner.headers), 404, 'not-found');
    expectProblem(await ask({ materialId: randomUUID() }), 404, 'not-found');
    expect((await ask({}, elsewhere.owner.headers)).json<FinderDto>().matchCount).toBe(0);
  });

  it('what is no id and too many words', async () => {
    const answer = await ask({ machineId: 'bench', words: 'x'.repeat(200) });
    expect(pointersOf(expectProblem(answer, 422, 'invalid-fields'))).toEqual(['#/machineId', '#/words']);
  });
});

describe('GET /api/finder/sheet-code', () => {
  const code = (query: string, headers: Record<string, string> = shop.trainee.headers) =>
    test.app.inject({ url: `/api/finder/sheet-code${query}`, headers });

  it('carries the address at the machine that shows what holds now', async () => {
    const { url, modules } = (await code(`?recipeId=${dial.recipeId}`)).json<SheetCodeDto>();
    expect(url).toMatch(new RegExp(`/machine\\?recipe=${dial.recipeId}$`));
    expect(modules[0]).toMatch(/^1111111/);
  });

  it('needs a session and a recipe', async () => {
    expectProblem(await code(`?recipeId=${dial.recipeId}`, {}), 401, 'not-signed-in');
    expect(pointersOf(expectProblem(await code(''), 422, 'invalid-fields'))).toEqual(['#/recipeId']);
  });
});

describe('GET /api/find', () => {
  const find = async (q: string, headers: Record<string, string> = shop.operator.headers) =>
    test.app.inject({ url: `/api/find?${new URLSearchParams({ q })}`, headers });

  it('finds records by code or name, the code first', async () => {
    const { items } = (await find(dial.code)).json<FoundListDto>();
    expect(items[0]).toEqual({ kind: 'recipe', id: dial.recipeId, code: dial.code, name: 'Dial, white' });
    const kinds = (await find('bench')).json<FoundListDto>().items.map(({ kind }) => kind);
    expect(kinds).toContain('machine');
    expect((await find('anodised 6061')).json<FoundListDto>().items).toEqual(
      expect.arrayContaining([expect.objectContaining({ kind: 'material', name: 'Black anodised 6061' })]),
    );
  });

  it('shows a trainee approved recipes only', async () => {
    const draft = await makeRecipe(test, shop.lead, { state: 'draft', title: 'Unsigned plan' });
    expect((await find('Unsigned plan')).json<FoundListDto>().items).toMatchObject([{ id: draft.recipeId }]);
    expect((await find('Unsigned plan', shop.trainee.headers)).json<FoundListDto>().items).toEqual([]);
    const seen = (await find('9', shop.trainee.headers)).json<FoundListDto>().items;
    expect(new Set(seen.map(({ kind }) => kind))).toEqual(new Set(['recipe']));
  });

  it('takes signs of patterns literally, keeps shops apart, and needs a word and a session', async () => {
    expect((await find('%')).json<FoundListDto>().items).toEqual([]);
    expect((await find(dial.code, elsewhere.owner.headers)).json<FoundListDto>().items).toEqual([]);
    expect(pointersOf(expectProblem(await find(' '), 422, 'invalid-fields'))).toEqual(['#/q']);
    expectProblem(await find('x', {}), 401, 'not-signed-in');
  });
});

describe('a hold', () => {
  it('stands before everything else and takes Start a run away', async () => {
    const held = await makeRecipe(test, shop.lead);
    await created(test, shop.lead, '/api/holds', { machineId: held.machine.id, reason: 'Fumes come back' });
    const { answer } = await found(keysOf(held));
    expect(answer).toMatchObject({ holds: [{ subject: 'machine', reason: 'Fumes come back' }], allowedActions: [] });
    const forLead = (await ask(keysOf(held), shop.lead.headers)).json<FinderDto>().answer;
    expect(forLead?.allowedActions).toEqual(['place-hold', 'release-hold', 'grant-deviation']);
  });
});

const groundOf = ({ machine, lens, material, finish, effect }: ApprovedRecipe) => ({ machine, lens, material, finish, effect });
