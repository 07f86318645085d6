import { randomUUID } from 'node:crypto';
import type { CouponDto } from '../../src/coupons/dto/coupon.dto';
import type { InspectionDto, SavedRatingsDto } from '../../src/coupons/dto/inspection.dto';
import type { TestApp } from './app';
import { makeCoupon, type PlanningShop } from './coupons';
import { asSuperuser } from './database';
import { editing } from './equipment';
import type { TestMember } from './factories';
import { newKey } from './idempotency';

type Given = Readonly<Record<string, unknown>>;

/** Calls on one coupon’s inspection, as a member who may be changed call by call. */
export function inspectionOf(test: TestApp, couponId: string, member: TestMember) {
  const url = `/api/coupons/${couponId}`;
  const read = async (as = member) => (await test.app.inject({ url: `${url}/inspection`, headers: as.headers })).json<InspectionDto>();
  const edit = async (as: TestMember) => ({ ...editing(as, (await read()).version), ...newKey() });
  return {
    read,
    recordCriteria: async (criteria: readonly Given[], as = member) =>
      test.app.inject({ method: 'PUT', url: `${url}/criteria`, headers: await edit(as), payload: { criteria } }),
    rate: (ratings: readonly Given[], as = member) =>
      test.app.inject({ method: 'PUT', url: `${url}/ratings`, headers: as.headers, payload: { ratings } }),
    measure: (measurements: readonly Given[], as = member) =>
      test.app.inject({ method: 'POST', url: `${url}/measurements`, headers: { ...as.headers, ...newKey() }, payload: { measurements } }),
    inspect: async (payload: Given = {}, as = member) =>
      test.app.inject({ method: 'POST', url: `${url}/inspect`, headers: await edit(as), payload }),
    seal: async (as = member) => test.app.inject({ method: 'POST', url: `${url}/seal`, headers: await edit(as) }),
    correct: (payload: Given, as = member) =>
      test.app.inject({ method: 'POST', url: `${url}/corrections`, headers: { ...as.headers, ...newKey() }, payload }),
  };
}

/** Two by two cells; A2 skipped, the others marked. */
export async function makeMarkedCoupon(test: TestApp, shop: PlanningShop): Promise<CouponDto> {
  const planned = await makeCoupon(test, shop);
  const url = `/api/coupons/${planned.id}/marking`;
  const post = async (act: string, payload: Given) => {
    const answer = await test.app.inject({
      method: 'POST',
      url: `${url}/${act}`,
      headers: { ...shop.operator.headers, ...newKey() },
      payload,
    });
    if (answer.statusCode >= 300) throw new Error(`${act} answered ${answer.statusCode}: ${answer.body}`);
    return answer;
  };
  await post('start', {});
  for (const { id: cellId, version: cellVersion, address } of planned.cells) {
    const outcome = address === 'A2' ? { outcome: 'skipped', note: 'clamp in the way' } : { outcome: 'marked' };
    await post('cells', { cellId, cellVersion, ...outcome });
  }
  return (await post('finish', {})).json<CouponDto>();
}

/** A photo row in any state; its bytes have tests of their own. */
export async function putPhoto(
  test: TestApp,
  coupon: CouponDto,
  member: TestMember,
  state: 'processing' | 'ready' | 'refused',
): Promise<string> {
  const id = randomUUID();
  await asSuperuser(
    test,
    (sql) => sql`insert into photo (shop_id, id, coupon_id, state, received_sha256, received_bytes, received_type, created_by)
      values (${member.shopId}, ${id}, ${coupon.id}, ${state}, ${id.replaceAll('-', '').repeat(2)}, 10, 'image/jpeg', ${member.id})`,
  );
  return id;
}

export async function setPhotoState(test: TestApp, id: string, state: string): Promise<void> {
  await asSuperuser(test, (sql) => sql`update photo set state = ${state} where id = ${id}`);
}

/** Criteria on record, every marked cell rated 4. */
export async function rateAll(test: TestApp, coupon: CouponDto, member: TestMember): Promise<SavedRatingsDto> {
  const calls = inspectionOf(test, coupon.id, member);
  await calls.recordCriteria([]);
  const marked = coupon.cells.filter(({ markState }) => markState !== 'skipped');
  const answer = await calls.rate(marked.map(({ id: cellId }) => ({ cellId, seenVersion: null, rating: 4 })));
  if (answer.statusCode !== 200) throw new Error(`rating answered ${answer.statusCode}: ${answer.body}`);
  return answer.json<SavedRatingsDto>();
}
