import type { CouponDto, CouponSummaryDto } from '../src/coupons/dto/coupon.dto';
import type { CouponFacetsDto } from '../src/coupons/dto/list-coupons.query.dto';
import { createTestApp, type TestApp } from './support/app';
import { makeCoupon, makePlanningShop, type PlanningShop, planBody } from './support/coupons';
import { asSuperuser } from './support/database';
import { created, makeMaterial } from './support/equipment';
import { expectProblem, pointersOf } from './support/problem';

let test: TestApp;
let shop: PlanningShop;
let elsewhere: PlanningShop;
let coupons: CouponDto[];

beforeAll(async () => {
  test = await createTestApp();
  [shop, elsewhere] = [await makePlanningShop(test), await makePlanningShop(test)];
  const brass = await makeMaterial(test, shop.lead, { family: 'brass', name: 'Brass 2 mm' });
  coupons = [
    await makeCoupon(test, shop, { title: 'blue tag', lot: 'L-100%' }),
    await makeCoupon(test, shop, { title: '=1+1', lot: 'L-2' }),
    await makeCoupon(test, shop, { title: 'bezel', materialId: brass.id }),
  ];
  await makeCoupon(test, elsewhere, { title: 'not ours' });
});
afterAll(() => test.close());

const get = (url: string, headers: Record<string, string> = shop.operator.headers) => test.app.inject({ url, headers });
const list = async (query = '') => (await get(`/api/coupons${query}`)).json<{ items: CouponSummaryDto[]; nextCursor: string | null }>();
const titles = async (query: string) => (await list(query)).items.map(({ title }) => title);

describe('GET /api/coupons', () => {
  it('gives the newest first, with the face by dose until somebody rated', async () => {
    const { items } = await list();
    expect(items.map(({ title }) => title)).toEqual(['bezel', '=1+1', 'blue tag']);
    expect(items[2]).toMatchObject({ cellCount: 4, ratedCount: 0, bestRating: null, face: { rows: 2, columns: 2, shows: 'dose' } });
    // 20 % and 40 % of 20 W over 200 mm/s and 12 µm
    expect(items[2]?.face?.values.slice(0, 2)).toEqual([expect.closeTo(4 / 2.4, 9), expect.closeTo(8 / 2.4, 9)]);
  });

  it('shows the mean rating as the face once there are ratings', async () => {
    const [coupon] = coupons;
    const cell = coupon?.cells[3];
    await asSuperuser(test, async (sql) => {
      for (const [member, rating] of [
        [shop.operator.id, 5],
        [shop.lead.id, 4],
      ] as const)
        await sql`insert into cell_rating (shop_id, id, cell_id, member_id, rating)
          values (${shop.shop.id}, gen_random_uuid(), ${cell?.id ?? ''}, ${member}, ${rating})`;
    });
    const rated = (await list('?q=tag')).items[0];
    expect(rated).toMatchObject({ ratedCount: 1, bestRating: 5, face: { shows: 'rating', values: [null, null, null, 4.5] } });
  });

  it('shows the newest photo that can be laid flat, and none that has no corners yet or was refused', async () => {
    const titled = async (title: string) => (await list()).items.find((item) => item.title === title)?.face;
    expect((await titled('blue tag'))?.photo).toBeNull();
    await asSuperuser(test, async (sql) => {
      const corners = JSON.stringify([0.1, 0.9, 0.9, 0.1].map((x, index) => ({ x, y: index < 2 ? 0.2 : 0.8 })));
      for (const [number, state, found] of [
        [1, 'ready', corners],
        [2, 'ready', corners],
        [3, 'ready', null],
        [4, 'refused', null],
      ] as const)
        await sql`insert into photo (shop_id, id, coupon_id, state, received_sha256, received_bytes, received_type, master_sha256, large_sha256,
            small_sha256, width_px, height_px, corners, created_by)
          values (${shop.shop.id}, ${`00000000-0000-7000-8000-00000000000${number}`}, ${coupons[0]?.id ?? ''}, ${state}, ${`sent-${number}`}, 1,
            'image/jpeg', 'a', 'b', 'c', 1000, 750, ${found}::text::jsonb, ${shop.operator.id})`;
    });
    expect((await titled('blue tag'))?.photo).toMatchObject({
      id: '00000000-0000-7000-8000-000000000002',
      widthPx: 1000,
      heightPx: 750,
      corners: expect.arrayContaining([{ x: 0.1, y: 0.2 }]),
      urls: { small: expect.stringContaining('/small?') },
    });
    expect((await titled('bezel'))?.photo).toBeNull();
  });

  it('turns pages without losing or doubling a coupon', async () => {
    const first = await list('?limit=2');
    const second = await list(`?limit=2&cursor=${first.nextCursor}`);
    expect([...first.items, ...second.items].map(({ id }) => id)).toEqual(coupons.map(({ id }) => id).reverse());
    expect(second.nextCursor).toBeNull();
  });

  it('finds words in any field, and takes wild cards literally', async () => {
    expect(await titles('?q=bezel')).toEqual(['bezel']);
    expect(await titles('?q=BRASS%20be')).toEqual(['bezel']);
    expect(await titles('?q=100%25')).toEqual(['blue tag']);
    expect(await titles(`?q=${coupons[1]?.code}`)).toEqual(['=1+1']);
  });

  it('narrows by facets, whose counts hold the other choices', async () => {
    const brass = coupons[2]?.material.id ?? '';
    expect(await titles(`?materialId=${brass}`)).toEqual(['bezel']);
    const facets = (await get(`/api/coupons/facets?materialId=${brass}&q=bezel`)).json<CouponFacetsDto>();
    expect(facets).toMatchObject({ matchCount: 1, totalCount: 3, states: [{ value: 'planned', label: 'Planned', count: 1 }] });
    const all = (await get(`/api/coupons/facets?materialId=${brass}`)).json<CouponFacetsDto>();
    expect(all.materials.map(({ count }) => count).sort()).toEqual([1, 2]);
  });

  it('names what a query gets wrong', async () => {
    const answer = await get('/api/coupons?state=lost&materialId=x&limit=0');
    expect(pointersOf(expectProblem(answer, 422, 'invalid-fields'))).toEqual(['#/limit', '#/materialId', '#/state']);
  });

  it('exports what the list shows, formulas made harmless', async () => {
    const answer = await get('/api/coupons/export.csv?q=L-');
    expect(answer.headers['content-type']).toBe('text/csv; charset=utf-8');
    expect(answer.headers['content-disposition']).toBe('attachment; filename="coupons.csv"');
    const lines = answer.body.trimEnd().split('\n');
    expect(lines).toHaveLength(3);
    expect(lines[0]).toContain('code,title,purpose,state');
    expect(answer.body).toContain("'=1+1");
  });
});

describe('GET /api/coupons/:id', () => {
  it('answers with an ETag, names and allowed actions', async () => {
    const answer = await get(`/api/coupons/${coupons[0]?.id}`);
    expect(answer.headers.etag).toBe('"v1"');
    expect(answer.json<CouponDto>()).toMatchObject({
      material: { name: shop.material.name },
      machine: { name: shop.machine.name, sourceKind: 'fibre-mopa' },
      lens: { name: 'F160', fieldSizeMm: 110 },
      createdBy: shop.operator.printedName,
      grids: [{ rows: 2, columns: 2, plate: { widthMm: 60, heightMm: 37.6 } }],
      allowedActions: ['mark', 'record-criteria', 'plan-next'],
    });
  });
});

describe('GET /api/coupons/:code', () => {
  it('finds the coupon of the caller’s own shop by its code', async () => {
    const [coupon] = coupons;
    expect((await get(`/api/coupons/${coupon?.code.toLowerCase()}`)).json<CouponDto>().id).toBe(coupon?.id);
    const theirs = (await get(`/api/coupons/${coupon?.code}`, elsewhere.operator.headers)).json<CouponDto>();
    expect(theirs).toMatchObject({ code: coupon?.code, title: 'not ours' });
  });
});

describe('downloads of a coupon', () => {
  it('gives the artwork in millimetres with one group per cell in run order', async () => {
    const coupon = await created<CouponDto>(test, shop.operator, '/api/coupons', planBody(shop));
    const answer = await get(`/api/coupons/${coupon.id}/artwork.svg`);
    expect(answer.headers).toMatchObject({
      'content-type': 'image/svg+xml; charset=utf-8',
      'content-disposition': `attachment; filename="${coupon.code}.svg"`,
    });
    expect(answer.body).toContain('width="84.8mm" height="74.8mm" viewBox="0 0 84.8 74.8"');
    const orders = [...answer.body.matchAll(/id="cell-([A-Z]\d+)" data-run-order="(\d+)"/g)].map(([, address, order]) => [
      address,
      Number(order),
    ]);
    const inOrder = [...coupon.cells].sort((a, b) => a.runOrder - b.runOrder).map(({ address, runOrder }) => [address, runOrder]);
    expect(orders).toEqual(inOrder);
    expect(answer.body).toContain(`reference ${coupon.code}.${coupon.id.replaceAll('-', '').slice(-8)}; dark on bright`);
    const inverse = await get(`/api/coupons/${coupon.id}/artwork.svg?polarity=bright%20on%20dark`);
    expect(inverse.body).toContain('; bright on dark');
    const wrong = await get(`/api/coupons/${coupon.id}/artwork.svg?polarity=grey`);
    expect(pointersOf(expectProblem(wrong, 422, 'invalid-fields'))).toEqual(['#/polarity']);
  });

  it('gives the cells as CSV in run order with what the panel shows', async () => {
    const [coupon] = coupons;
    const answer = await get(`/api/coupons/${coupon?.id}/cells.csv`);
    const [header, ...lines] = answer.body.replace('\uFEFF', '').trimEnd().split('\n');
    expect(header).toBe(
      'run order,cell,Power,unit,Speed,unit,Frequency,unit,Pulse width,unit,Line spacing,unit,Passes,unit,fill,power at the work W,dose J/mm2,mark,note',
    );
    expect(lines.map((line) => line.split(',')[0])).toEqual(['1', '2', '3', '4']);
    expect(lines.find((line) => line.includes(',A1,'))).toContain(',A1,20,%,200,mm/s,400,kHz,30,ns,0.012,mm,1,×,Both directions,4,1.66666');
  });
});

describe('rights', () => {
  const urls = () => {
    const one = `/api/coupons/${coupons[0]?.id}`;
    return ['/api/coupons', '/api/coupons/facets', '/api/coupons/export.csv', one, `${one}/artwork.svg`, `${one}/cells.csv`];
  };

  it('refuse anonymous callers and trainees everywhere', async () => {
    for (const url of urls()) {
      expectProblem(await get(url, {}), 401, 'not-signed-in');
      expectProblem(await get(url, shop.trainee.headers), 403, 'not-permitted');
    }
  });

  it('show another shop nothing', async () => {
    for (const url of urls().slice(3)) expectProblem(await get(url, elsewhere.operator.headers), 404, 'not-found');
    expectProblem(await get('/api/coupons/C-9999'), 404, 'not-found');
    expectProblem(await get('/api/coupons/nothing'), 404, 'not-found');
  });
});
