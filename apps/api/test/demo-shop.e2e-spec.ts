import { type SignIn, seedDemoShop } from '@proofplate/db/seed';
import { passwordFault } from '../src/auth/hashing/password-rules';
import type { CouponDto } from '../src/coupons/dto/coupon.dto';
import type { CraterFitDto } from '../src/coupons/dto/crater-fit.dto';
import type { FinderDto } from '../src/finder/dto/finder.dto';
import type { LedgerVerificationDto } from '../src/ledger/dto/ledger-event.dto';
import type { PhotoDto } from '../src/photos/dto/photo.dto';
import type { RecipeDto } from '../src/recipes/dto/recipe.dto';
import type { RecipeRevisionDto } from '../src/recipes/dto/recipe-revision.dto';
import type { RunSummaryDto } from '../src/runs/dto/run.dto';
import type { ApprovalChecksDto } from '../src/sign-offs/dto/checks.dto';
import { createTestApp, type TestApp } from './support/app';
import { type ObjectStore, startObjectStore } from './support/object-store';

const PICTURE = { widthPx: 320, heightPx: 240 };
const LIMIT_MS = 180_000;
jest.setTimeout(LIMIT_MS);
/** What time alone does to a setting that was approved: it is due for a look, not wrong. */
const AGES = ['calibration', 'power-shift', 'new-confirmation'];

let test: TestApp;
let store: ObjectStore;
let signIns: SignIn[];
const tokens = new Map<string, string>();

beforeAll(async () => {
  store = await startObjectStore();
  test = await createTestApp({ env: { OBJECT_STORE_ENDPOINT: store.endpoint } });
  signIns = await seedDemoShop({
    databaseUrl: test.database.superuser,
    passwordPepper: test.env.PASSWORD_PEPPER,
    passwordCost: test.env.PASSWORD_COST,
    objectStore: {
      endpoint: store.endpoint,
      bucket: test.env.OBJECT_STORE_BUCKET,
      accessKeyId: test.env.OBJECT_STORE_ACCESS_KEY,
      secretAccessKey: test.env.OBJECT_STORE_SECRET_KEY,
    },
    pictureSize: PICTURE,
  });
  for (const { email, password, role } of signIns) {
    const headers = { origin: test.env.PUBLIC_ORIGIN };
    const answer = await test.app.inject({ method: 'POST', url: '/api/auth/sign-in', headers, payload: { email, password } });
    if (answer.statusCode === 200) tokens.set(role, answer.json<{ accessToken: string }>().accessToken);
  }
});

afterAll(async () => {
  await test.close();
  await store.stop();
});

function ask(role: string, url: string, method: 'GET' | 'POST' = 'GET') {
  return test.app.inject({ method, url, headers: { authorization: `Bearer ${tokens.get(role)}` } });
}

async function read<Body>(role: string, url: string): Promise<Body> {
  const answer = await ask(role, url);
  if (answer.statusCode !== 200) throw new Error(`${url}: ${answer.statusCode} ${answer.body}`);
  return answer.json<Body>();
}

async function all<Item>(role: string, path: string): Promise<Item[]> {
  const items: Item[] = [];
  let cursor: string | null = '';
  while (cursor !== null) {
    const page: { items: Item[]; nextCursor: string | null } = await read(
      role,
      `${path}?limit=50${cursor === '' ? '' : `&cursor=${cursor}`}`,
    );
    items.push(...page.items);
    cursor = page.nextCursor;
  }
  return items;
}

/** One after the other: a crowd of calls at once is turned away. */
async function inTurn<Item, Result>(items: readonly Item[], work: (item: Item) => Promise<Result>): Promise<Result[]> {
  const results: Result[] = [];
  for (const item of items) results.push(await work(item));
  return results;
}

describe('the people of the demo shop', () => {
  it('are one per role and sign in with the passwords that the seed tells', () => {
    expect(signIns.map(({ role }) => role)).toEqual(['trainee', 'operator', 'lead', 'owner']);
    expect([...tokens.keys()].sort()).toEqual(['lead', 'operator', 'owner', 'trainee']);
  });

  it('have passwords that a production start refuses', () => {
    for (const { password } of signIns) expect(passwordFault(password)).toMatch(/many people use/i);
  });
});

describe('the ledger of the demo shop', () => {
  it('is one intact chain', async () => {
    const answer = await ask('lead', '/api/ledger/verify', 'POST');
    expect(answer.json<LedgerVerificationDto>()).toMatchObject({ isIntact: true, firstBrokenSeq: null });
    expect(answer.json<LedgerVerificationDto>().eventCount).toBeGreaterThan(700);
  });
});

describe('the finder of the demo shop', () => {
  const answered = async (words: string) => {
    const { matches } = await read<FinderDto>('trainee', `/api/finder?words=${encodeURIComponent(words)}`);
    const [match] = matches;
    return match === undefined ? undefined : read<FinderDto>('trainee', `/api/finder?recipeId=${match.recipeId}`);
  };

  it('answers the trainee with the third revision for black anodised dials, its cautions and its reference cell', async () => {
    const found = await answered('black anodised');
    expect(found?.isForbidden).toBe(false);
    expect(found?.answer).toMatchObject({ revisionNumber: 3, holds: [], signature: { printedName: 'Hanne Voss' } });
    expect(found?.answer?.reference).not.toBeNull();
    expect(found?.cautions.length).toBeGreaterThan(3);
  });

  it('refuses vinyl', async () => {
    const materials = await all<{ id: string; name: string }>('lead', '/api/materials');
    const vinyl = materials.find(({ name }) => name.startsWith('Vinyl'));
    expect(await read<FinderDto>('trainee', `/api/finder?materialId=${vinyl?.id}`)).toMatchObject({ isForbidden: true, answer: null });
  });
});

describe('the coupons of the demo shop', () => {
  it('stand in all states, say that they are invented, and name the source of the one that is not', async () => {
    const summaries = await all<{ id: string; state: string }>('operator', '/api/coupons');
    expect(new Set(summaries.map(({ state }) => state))).toEqual(new Set(['planned', 'marked', 'inspected', 'sealed']));
    const coupons = await inTurn(summaries, ({ id }) => read<CouponDto>('operator', `/api/coupons/${id}`));
    const published = coupons.filter(({ isInvented }) => !isInvented);
    expect(published).toHaveLength(1);
    expect(published[0]?.sourceNote).toContain('MIT licence');
    for (const { sourceNote } of coupons) expect(sourceNote).not.toBe('');
  });

  it('have photos whose three renditions are in the store and whose corners are laid', async () => {
    const sealed = (await all<{ id: string; state: string }>('operator', '/api/coupons')).filter(({ state }) => state === 'sealed');
    expect(sealed.length).toBeGreaterThan(10);
    for (const { id } of sealed) {
      const { items } = await read<{ items: PhotoDto[] }>('operator', `/api/coupons/${id}/photos`);
      const [photo] = items;
      expect(photo).toMatchObject({ state: 'ready', cornersFoundBy: 'render', widthPx: PICTURE.widthPx });
      for (const url of Object.values(photo?.urls ?? {})) {
        const answer = await test.app.inject({ method: 'GET', url: String(url) });
        expect([answer.statusCode, answer.headers['content-type']]).toEqual([200, 'image/jpeg']);
      }
    }
  });
});

describe('the craters of the demo shop', () => {
  it('give back the spot and the incubation that they were drawn with, and the spot can become the measured one', async () => {
    const [plate] = await all<{ id: string; title: string }>('lead', '/api/coupons').then((coupons) =>
      coupons.filter(({ title }) => title.includes('craters')),
    );
    const found = await read<CraterFitDto>('lead', `/api/coupons/${plate?.id}/crater-fit`);
    const { spotRadiusUm = 0, spotRadiusStandardErrorUm = 0 } = found.fit ?? {};
    expect(Math.abs(spotRadiusUm - 19.2)).toBeLessThan(3 * spotRadiusStandardErrorUm);
    expect(found.incubation?.incubationCoefficient).toBeCloseTo(0.88, 1);
    expect(found).toMatchObject({ pointCount: 8, notSavableBecause: null, place: { measuredSpotUm: 36 } });
  });
});

describe('the recipes of the demo shop', () => {
  const revisions = async () => {
    const recipes = await all<{ id: string }>('lead', '/api/recipes');
    const whole = await inTurn(recipes, ({ id }) => read<RecipeDto>('lead', `/api/recipes/${id}`));
    return whole.flatMap(({ revisions: ladder }) => ladder);
  };

  it('have revisions in every state', async () => {
    const states = new Set((await revisions()).map(({ state }) => state));
    expect([...states].sort()).toEqual(['approved', 'draft', 'in_review', 'returned', 'scheduled', 'superseded', 'withdrawn']);
  });

  it('carry the very hash that the api computes from each record', async () => {
    for (const { id, state } of await revisions()) {
      const stored = await read<RecipeRevisionDto>('lead', `/api/revisions/${id}`);
      const { contentHash } = await read<ApprovalChecksDto>('lead', `/api/revisions/${id}/checks`);
      if (state !== 'draft') expect([stored.id, stored.contentHash]).toEqual([id, contentHash]);
    }
  });

  it('pass every check of what was approved, but for what time alone does', async () => {
    for (const { id, state, number } of await revisions()) {
      if (state !== 'approved' && state !== 'scheduled' && state !== 'superseded' && state !== 'in_review') continue;
      const { items } = await read<ApprovalChecksDto>('owner', `/api/revisions/${id}/checks`);
      const failing = items
        .filter(({ passes, key }) => !passes && !AGES.includes(key))
        .map(({ key, detail }) => `${number} ${key}: ${detail}`);
      expect(failing).toEqual([]);
    }
  });
});

describe('the floor of the demo shop', () => {
  it('has two months of runs, one of them open, scrap, a bad result and a run under the deviation', async () => {
    const runs = await all<RunSummaryDto>('lead', '/api/runs');
    expect(runs.length).toBeGreaterThan(40);
    expect(runs.filter(({ state }) => state === 'started')).toHaveLength(1);
    expect(runs.some(({ badResult }) => badResult !== null)).toBe(true);
    const { items } = await read<{ items: { isLive: boolean; usedQuantity: number }[] }>('lead', '/api/deviations');
    expect(items).toEqual([expect.objectContaining({ usedQuantity: 22 })]);
  });

  it('has a recipe on hold and a request that waits', async () => {
    const { items: holds } = await read<{ items: { subject: string }[] }>('lead', '/api/holds?state=open');
    expect(holds.map(({ subject }) => subject)).toEqual(['recipe']);
    const { items: requests } = await read<{ items: unknown[] }>('trainee', '/api/setting-requests?state=open');
    expect(requests).toHaveLength(1);
  });
});
