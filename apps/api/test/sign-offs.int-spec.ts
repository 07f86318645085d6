import { randomUUID } from 'node:crypto';
import { schema } from '@proofplate/db';
import { and, eq } from 'drizzle-orm';
import type { FinderDto } from '../src/finder/dto/finder.dto';
import type { LedgerVerificationDto } from '../src/ledger/dto/ledger-event.dto';
import type { RecipeDto } from '../src/recipes/dto/recipe.dto';
import type { RecipeRevisionDto } from '../src/recipes/dto/recipe-revision.dto';
import { ScheduledRevisionsService } from '../src/recipes/scheduled-revisions.service';
import type { RunDto } from '../src/runs/dto/run.dto';
import type { StartSheetDto } from '../src/runs/dto/start-sheet.dto';
import { createTestApp, type TestApp } from './support/app';
import { asSuperuser } from './support/database';
import { created } from './support/equipment';
import { makeMember, type TestMember } from './support/factories';
import { expectProblem } from './support/problem';
import {
  acts,
  call,
  careIds,
  changeDraft,
  FOR_CUSTOMER,
  makeApproved,
  makeProvedDraft,
  makeRecipeShop,
  makeSubmitted,
  type RecipeShop,
  read,
} from './support/recipes';

const RACES = 6;

let test: TestApp;
let shop: RecipeShop;
let second: TestMember;

beforeAll(async () => {
  test = await createTestApp();
  shop = await makeRecipeShop(test);
  second = await makeMember(test, shop.shop, 'lead');
});
afterAll(() => test.close());

const rows = <Row extends object>(query: (sql: Parameters<Parameters<typeof asSuperuser>[1]>[0]) => Promise<readonly Row[]>) =>
  asSuperuser(test, query);
const approvedCount = async (recipeId: string) => {
  const [row] = await rows(
    (sql) => sql<{ count: number }[]>`select count(*)::int from revision where recipe_id = ${recipeId} and state = 'approved'`,
  );
  return row?.count;
};
/** A change of an approved recipe that needs no new proof, in review. */
const submitChange = async (recipeId: string, as: TestMember, given: object = {}): Promise<RecipeRevisionDto> => {
  const copy = await created<RecipeRevisionDto>(test, as, `/api/recipes/${recipeId}/drafts`, {});
  const draft = await changeDraft(test, as, copy, { reason: 'Checked again.', ...given });
  const answer = await acts(test, draft.id).submit(as, draft);
  if (answer.statusCode !== 200) throw new Error(`submitting answered ${answer.statusCode}: ${answer.body}`);
  return answer.json<RecipeRevisionDto>();
};
/** What no use case does: moves the day of a signed revision, to let it come. */
const letTheDayCome = (id: string) =>
  asSuperuser(test, async (sql) => {
    await sql`alter table revision disable trigger guarded_rows`;
    await sql`update revision set effective_from = now() - interval '1 minute' where id = ${id}`;
    await sql`alter table revision enable trigger guarded_rows`;
  });

describe('two leads at once', () => {
  it('sign one revision once: the other is told the present state', async () => {
    for (let race = 0; race < RACES; race += 1) {
      const submitted = await makeSubmitted(test, shop);
      const { approve } = acts(test, submitted.id);
      const answers = await Promise.all([approve(shop.lead, submitted), approve(second, submitted)]);
      expect(answers.map(({ statusCode }) => statusCode).sort()).toEqual([200, 409]);
      const loser = answers.find(({ statusCode }) => statusCode === 409);
      expect(loser?.json()).toMatchObject({ code: 'revision-state', current: { state: 'approved' } });
      const signatures = await rows((sql) => sql`select id from sign_off where revision_id = ${submitted.id} and meaning = 'approved'`);
      expect(signatures).toHaveLength(1);
    }
  });

  it('sign two revisions of a recipe one after the other: one is current, one superseded', async () => {
    const first = await makeApproved(test, shop);
    const changes = [await submitChange(first.recipe.id, shop.operator), await submitChange(first.recipe.id, shop.owner)];
    const [one, other] = changes;
    if (one === undefined || other === undefined) throw new Error('there are two changes');
    const answers = await Promise.all([acts(test, one.id).approve(shop.lead, one), acts(test, other.id).approve(second, other)]);
    expect(answers.map(({ statusCode }) => statusCode)).toEqual([200, 200]);
    expect(await approvedCount(first.recipe.id)).toBe(1);
    const ladder = (await read<RecipeDto>(test, shop.lead, `/recipes/${first.recipe.id}`)).revisions;
    expect(ladder.map(({ state }) => state).sort()).toEqual(['approved', 'superseded', 'superseded']);
  });

  it('never approve two recipes that cover the same parts', async () => {
    for (let race = 0; race < RACES; race += 1) {
      const given = { scope: FOR_CUSTOMER(randomUUID()) };
      const [one, other] = [await makeSubmitted(test, shop, given), await makeSubmitted(test, shop, given)];
      const answers = await Promise.all([acts(test, one.id).approve(shop.lead, one), acts(test, other.id).approve(second, other)]);
      expect(answers.map(({ statusCode }) => statusCode).sort()).toEqual([200, 409]);
      expect(answers.find(({ statusCode }) => statusCode === 409)?.json()).toMatchObject({
        code: 'checks-fail',
        checks: [{ key: 'scope' }],
      });
    }
  });

  it('submit and edit one draft: whoever comes second is told so', async () => {
    for (let race = 0; race < RACES; race += 1) {
      const draft = await makeProvedDraft(test, shop);
      const payload = { reason: 'Other words.', scope: FOR_CUSTOMER(randomUUID()) };
      const edit = { method: 'PATCH', url: `/revisions/${draft.id}`, version: draft.version, payload } as const;
      const [submitted, edited] = await Promise.all([acts(test, draft.id).submit(shop.operator, draft), call(test, shop.lead, edit)]);
      expect([
        [200, 409],
        [412, 200],
      ]).toContainEqual([submitted.statusCode, edited.statusCode]);
    }
  });
});

describe('a signing transaction that fails', () => {
  it('leaves nothing: no state, no signature, no event, no mail, and the same key works afterwards', async () => {
    const submitted = await makeSubmitted(test, shop);
    const seen = () =>
      rows(
        (sql) => sql`select (select state from revision where id = ${submitted.id}) as state, (select count(*) from sign_off) as signatures,
          (select count(*) from ledger_event) as events, (select count(*) from outbox) as mails, (select count(*) from idempotency_key) as keys`,
      );
    const before = await seen();
    await asSuperuser(test, async (sql) => {
      await sql`alter table ledger_event add constraint broken check (action <> 'revision.approved') not valid`;
    });
    const payload = { password: shop.lead.password, contentHash: submitted.contentHash, acknowledgedCautionIds: careIds(submitted) };
    const request = { method: 'POST', url: `/revisions/${submitted.id}/approve`, payload, key: randomUUID() } as const;
    const failed = await call(test, shop.lead, request).finally(() =>
      asSuperuser(test, async (sql) => {
        await sql`alter table ledger_event drop constraint broken`;
      }),
    );
    expectProblem(failed, 409, 'conflict');
    expect(await seen()).toEqual(before);
    expect((await call(test, shop.lead, request)).json<RecipeRevisionDto>()).toMatchObject({ state: 'approved' });
  });
});

describe('the database', () => {
  const { revision, revisionEvidence, signOff } = schema;
  /** As the api itself would, past its services. */
  const asApp = (work: Parameters<TestApp['unitOfWork']['run']>[1]) => test.unitOfWork.run({ shopId: shop.shop.id }, work);
  const codeOf = async (attempt: Promise<unknown>) => {
    const error: unknown = await attempt.then(
      () => undefined,
      (reason: unknown) => reason,
    );
    const cause: unknown = error instanceof Error ? error.cause : undefined;
    return typeof cause === 'object' && cause !== null && 'code' in cause ? cause.code : undefined;
  };

  it('refuses every change of what was submitted, by whatever way it comes', async () => {
    const { id } = await makeSubmitted(test, shop);
    const isIt = and(eq(revision.shopId, shop.shop.id), eq(revision.id, id));
    expect(
      await codeOf(
        asApp((tx) =>
          tx
            .update(revision)
            .set({ content: { steps: [] } })
            .where(isIt),
        ),
      ),
    ).toBe('PP001');
    expect(await codeOf(asApp((tx) => tx.update(revision).set({ reason: 'Another one' }).where(isIt)))).toBe('PP001');
    expect(await codeOf(asApp((tx) => tx.update(revision).set({ state: 'draft', number: null }).where(isIt)))).toBe('PP003');
    expect(await codeOf(asApp((tx) => tx.delete(revision).where(isIt)))).toBe('PP001');
    expect(await codeOf(asApp((tx) => tx.delete(revisionEvidence).where(eq(revisionEvidence.revisionId, id))))).toBe('PP001');
    // a signature cannot even be asked for a change: the api has no right to
    expect(await codeOf(asApp((tx) => tx.update(signOff).set({ comment: 'x' }).where(eq(signOff.revisionId, id))))).toBe('42501');
    expect(await codeOf(asApp((tx) => tx.delete(signOff).where(eq(signOff.revisionId, id))))).toBe('42501');
  });

  it('holds an event for each act, in an unbroken chain, and each signature cites the hash before its event', async () => {
    const approved = await makeApproved(test, shop);
    await acts(test, approved.id).withdraw(shop.lead);
    const events = await rows(
      (sql) => sql<{ action: string }[]>`select action, previous_hash from ledger_event where subject_id = ${approved.id} order by seq`,
    );
    expect(events.map(({ action }) => action)).toEqual([
      'revision.drafted',
      'revision.changed',
      'revision.evidence-set',
      'revision.submitted',
      'revision.approved',
      'revision.withdrawn',
    ]);
    const cited = await rows(
      (sql) => sql`select 1 from sign_off s join ledger_event e on e.shop_id = s.shop_id and e.previous_hash = s.ledger_hash_before
        and e.subject_id = s.revision_id where s.revision_id = ${approved.id}`,
    );
    expect(cited).toHaveLength(3);
    const verified = await call(test, shop.lead, { method: 'POST', url: '/ledger/verify', payload: {} });
    expect(verified.json<LedgerVerificationDto>()).toMatchObject({ isIntact: true });
  });
});

describe('a revision with a day of its own', () => {
  it('waits for it beside the approved one, and the worker makes it current', async () => {
    const first = await makeApproved(test, shop);
    const change = await submitChange(first.recipe.id, shop.operator, { effectiveFrom: '2999-01-01T00:00:00Z' });
    const scheduled = (await acts(test, change.id).approve(shop.lead, change)).json<RecipeRevisionDto>();
    expect(scheduled).toMatchObject({
      state: 'scheduled',
      effectiveFrom: '2999-01-01T00:00:00.000Z',
      reviewDue: '3000-01-01T00:00:00.000Z',
    });
    expect(await read<RecipeDto>(test, shop.lead, `/recipes/${first.recipe.id}`)).toMatchObject({
      current: { id: first.id },
      underWay: { id: change.id, state: 'scheduled' },
    });
    const jobs = await rows((sql) => sql`select key from graphile_worker.jobs where task_identifier = 'revisions.take-effect'`);
    expect(jobs).toHaveLength(1);

    const worker = test.app.get(ScheduledRevisionsService, { strict: false });
    const job = { shopId: shop.shop.id, revisionId: change.id, attempt: 1 };
    await worker.takeEffect(job);
    expect((await read<RecipeRevisionDto>(test, shop.lead, `/revisions/${change.id}`)).state).toBe('scheduled');
    await letTheDayCome(change.id);
    await worker.takeEffect(job);
    await worker.takeEffect(job);
    const ladder = (await read<RecipeDto>(test, shop.lead, `/recipes/${first.recipe.id}`)).revisions;
    expect(ladder.map(({ number, state }) => [number, state])).toEqual([
      [2, 'approved'],
      [1, 'superseded'],
    ]);
    const events = await rows(
      (sql) => sql<{ actor_name: string }[]>`select actor_name from ledger_event where action = 'revision.took-effect'`,
    );
    expect(events).toEqual([{ actor_name: 'Proofplate' }]);
  });

  it('is current for whoever looks, even before the worker came to it', async () => {
    const first = await makeApproved(test, shop);
    const change = await submitChange(first.recipe.id, shop.operator, { effectiveFrom: '2999-01-01T00:00:00Z' });
    await acts(test, change.id).approve(shop.lead, change);
    await letTheDayCome(change.id);
    expect(await read<RecipeDto>(test, shop.operator, `/recipes/${first.recipe.id}`)).toMatchObject({
      state: 'approved',
      current: { id: change.id },
      underWay: null,
    });
  });

  it('has no second one beside it', async () => {
    const first = await makeApproved(test, shop);
    const later = { effectiveFrom: '2999-01-01T00:00:00Z' };
    const [one, other] = [
      await submitChange(first.recipe.id, shop.operator, later),
      await submitChange(first.recipe.id, shop.owner, later),
    ];
    expect((await acts(test, one.id).approve(shop.lead, one)).statusCode).toBe(200);
    expectProblem(await acts(test, other.id).approve(shop.lead, other), 409, 'revision-state');
  });
});

describe('a run at the machine', () => {
  const startRun = ({ id: revisionId, recipe }: RecipeRevisionDto) =>
    call(test, shop.trainee, {
      method: 'POST',
      url: '/runs',
      payload: { clientId: randomUUID(), kind: 'production', revisionId, lensFittedId: recipe.lens.id, ticks: ['set-up.0'] },
    });

  it('never starts after a withdrawal, however close the two are', async () => {
    for (let race = 0; race < RACES; race += 1) {
      const approved = await makeApproved(test, shop);
      const [start, withdrawal] = await Promise.all([startRun(approved), acts(test, approved.id).withdraw(shop.lead)]);
      expect(withdrawal.statusCode).toBe(200);
      const events = await rows(
        (sql) => sql<{ action: string }[]>`select action from ledger_event where action in ('run.started', 'revision.withdrawn')
          and (subject_id = ${approved.id} or after ->> 'revisionId' = ${approved.id}) order by seq`,
      );
      const told = events.map(({ action }) => action);
      if (start.statusCode === 201) expect(told).toEqual(['run.started', 'revision.withdrawn']);
      else {
        expectProblem(start, 409, 'not-approved');
        expect(told).toEqual(['revision.withdrawn']);
      }
      expectProblem(await startRun(approved), 409, 'not-approved');
    }
  });

  it('starts with the revision whose day has come and refuses the one before it, even before the worker came to it', async () => {
    const first = await makeApproved(test, shop);
    const change = await submitChange(first.recipe.id, shop.operator, { effectiveFrom: '2999-01-01T00:00:00Z' });
    await acts(test, change.id).approve(shop.lead, change);
    expectProblem(await startRun(change), 409, 'not-approved');
    await letTheDayCome(change.id);
    const found = await read<FinderDto>(test, shop.trainee, `/finder?recipeId=${first.recipe.id}`);
    expect(found.answer).toMatchObject({ revisionId: change.id });
    expect((await read<StartSheetDto>(test, shop.trainee, `/runs/start-sheet/${change.id}`)).kinds).toContain('production');
    expect((await read<StartSheetDto>(test, shop.trainee, `/runs/start-sheet/${first.id}`)).kinds).toEqual([]);
    expectProblem(await startRun(first), 409, 'not-approved');
    expect((await startRun(change)).json<RunDto>()).toMatchObject({ revision: { number: 2, state: 'approved' } });
    expect((await read<RecipeRevisionDto>(test, shop.lead, `/revisions/${first.id}`)).state).toBe('superseded');
  });
});
