import type { RecipeRevisionDto } from '../src/recipes/dto/recipe-revision.dto';
import { createTestApp, type TestApp } from './support/app';
import { asSuperuser } from './support/database';
import { makeMember } from './support/factories';
import { expectProblem } from './support/problem';
import { acts, call, makeApproved, makeRecipeShop, type RecipeShop } from './support/recipes';
import { until } from './support/until';

jest.setTimeout(60_000);

const RACES = 4;

let test: TestApp;
let shop: RecipeShop;

beforeAll(async () => {
  test = await createTestApp();
  shop = await makeRecipeShop(test);
});
afterAll(() => test.close());

const grant = ({ id: revisionId }: RecipeRevisionDto, member = shop.lead) =>
  call(test, member, {
    method: 'POST',
    url: '/deviations',
    payload: { revisionId, description: 'Power 28 % for the thin sheet', reason: 'Old stock', maximumQuantity: 10 },
  });
const eventsOf = (revisionId: string) =>
  asSuperuser(test, async (sql) => {
    const rows = await sql<{ action: string }[]>`select action from ledger_event
      where (action = 'revision.withdrawn' and subject_id = ${revisionId}) or (action = 'deviation.granted' and after ->> 'revisionId' = ${revisionId})
      order by seq`;
    return rows.map(({ action }) => action);
  });

describe('granting a deviation', () => {
  it('waits for a withdrawal that has begun and is then refused', async () => {
    const approved = await makeApproved(test, shop);
    await asSuperuser(test, async (sql) => {
      let answer: ReturnType<typeof grant> | undefined;
      await sql.begin(async (withdrawal) => {
        await withdrawal`update revision set state = 'withdrawn', withdrawn_at = now() where id = ${approved.id}`;
        let hasAnswered = false;
        answer = grant(approved).finally(() => {
          hasAnswered = true;
        });
        await until(async () => {
          const waiting = await withdrawal`select 1 from pg_locks where not granted and pid <> pg_backend_pid()`;
          return hasAnswered || waiting.length > 0;
        });
      });
      if (answer === undefined) throw new Error('nothing was asked');
      expectProblem(await answer, 409, 'not-approved');
    });
    expect(await eventsOf(approved.id)).toEqual([]);
  });

  it('comes before a withdrawal or not at all, however close the two are', async () => {
    for (let race = 0; race < RACES; race += 1) {
      const approved = await makeApproved(test, shop);
      const [granted, withdrawn] = await Promise.all([grant(approved), acts(test, approved.id).withdraw(shop.lead)]);
      expect(withdrawn.statusCode).toBe(200);
      expect(await eventsOf(approved.id)).toEqual(
        granted.statusCode === 201 ? ['deviation.granted', 'revision.withdrawn'] : ['revision.withdrawn'],
      );
      expectProblem(await grant(approved), 409, 'not-approved');
    }
  });

  it('is done by two leads at once, one after the other', async () => {
    const approved = await makeApproved(test, shop);
    const second = await makeMember(test, shop.shop, 'lead');
    const answers = await Promise.all([grant(approved), grant(approved, second)]);
    expect(answers.map(({ statusCode }) => statusCode)).toEqual([201, 201]);
    expect(await eventsOf(approved.id)).toEqual(['deviation.granted', 'deviation.granted']);
  });
});
