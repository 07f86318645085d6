import { randomUUID } from 'node:crypto';
import type { CouponDto } from '../../src/coupons/dto/coupon.dto';
import type { CalibrationDto } from '../../src/machines/dto/calibration.dto';
import type { RecipeRevisionDto } from '../../src/recipes/dto/recipe-revision.dto';
import type { TestApp } from './app';
import { makeCoupon, makePlanningShop, type PlanningShop } from './coupons';
import { created } from './equipment';
import type { TestMember } from './factories';
import { newKey } from './idempotency';
import { inspectionOf, putPhoto } from './inspections';

type Given = Readonly<Record<string, unknown>>;
type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

export const DARK = { quantity: 'lightness', comparison: 'at most', value: 30 };
export type RecipeShop = PlanningShop & { readonly calibration: CalibrationDto };

/** A shop in which a setting can go the whole way: a planning shop with a fresh power calibration. */
export async function makeRecipeShop(test: TestApp): Promise<RecipeShop> {
  const shop = await makePlanningShop(test);
  const calibration = await created<CalibrationDto>(test, shop.lead, `/api/machines/${shop.machine.id}/calibrations`, {
    measuredOn: new Date().toISOString().slice(0, 10),
    meter: 'Bench meter 3',
    wavelengthNm: 1064,
    frequencyKhz: 400,
    pulseWidthNs: 30,
    points: [10, 50, 100].map((percent) => ({ percent, watts: percent * 0.19 })),
  });
  return { ...shop, calibration };
}

/** Calls a route as a member; `version` becomes If-Match, and every POST has a key of its own. */
export async function call(
  test: TestApp,
  member: Pick<TestMember, 'headers'> | undefined,
  { method = 'GET', url, payload, version, key }: { method?: Method; url: string; payload?: object; version?: number; key?: string },
) {
  const headers = {
    ...member?.headers,
    ...(version === undefined ? {} : { 'if-match': `"v${version}"` }),
    ...(method === 'POST' ? newKey() : {}),
    ...(key === undefined ? {} : { 'idempotency-key': key }),
  };
  return test.app.inject({ method, url: `/api${url}`, headers, ...(payload === undefined ? {} : { payload }) });
}

export async function read<Dto>(test: TestApp, member: TestMember, url: string): Promise<Dto> {
  const answer = await call(test, member, { url });
  if (answer.statusCode !== 200) throw new Error(`${url} answered ${answer.statusCode}: ${answer.body}`);
  return answer.json<Dto>();
}

/** Marks every cell of a planned coupon. */
export async function markAll(test: TestApp, member: TestMember, planned: CouponDto): Promise<CouponDto> {
  const post = async (act: string, payload: Given) => {
    const answer = await call(test, member, { method: 'POST', url: `/coupons/${planned.id}/marking/${act}`, payload });
    if (answer.statusCode >= 300) throw new Error(`${act} answered ${answer.statusCode}: ${answer.body}`);
    return answer;
  };
  await post('start', {});
  for (const { id: cellId, version: cellVersion } of planned.cells) await post('cells', { cellId, cellVersion, outcome: 'marked' });
  return (await post('finish', {})).json<CouponDto>();
}

/** Criteria, photo, a reading and a rating of every cell, the inspection, and the seal. */
export async function inspectAndSeal(
  test: TestApp,
  member: TestMember,
  coupon: CouponDto,
  { lightness = 26, criteria = [DARK], isSealed = true }: { lightness?: number; criteria?: readonly Given[]; isSealed?: boolean } = {},
): Promise<CouponDto> {
  const calls = inspectionOf(test, coupon.id, member);
  const okay = async (answer: Promise<{ statusCode: number; body: string }>) => {
    const { statusCode, body } = await answer;
    if (statusCode >= 300) throw new Error(`the inspection answered ${statusCode}: ${body}`);
  };
  await okay(calls.recordCriteria(criteria));
  await okay(calls.rate(coupon.cells.map(({ id: cellId }) => ({ cellId, seenVersion: null, rating: 4 }))));
  await okay(
    calls.measure(
      coupon.cells.map(({ id: cellId }, index) => ({
        ...{ cellId, quantity: 'lightness', value: lightness + index * 0.5, method: 'colorimeter', instrument: 'Colorimeter 2' },
        methodDetail: { illuminant: 'D65', observer: '10°', geometry: '45/0' },
      })),
    ),
  );
  await putPhoto(test, coupon, member, 'ready');
  await okay(calls.inspect());
  if (isSealed) await okay(calls.seal());
  return read<CouponDto>(test, member, `/coupons/${coupon.id}`);
}

/** A marked coupon, two by two cells; sealed unless asked otherwise. */
export async function makeProvedCoupon(
  test: TestApp,
  shop: PlanningShop,
  given: { isSealed?: boolean; plan?: Given } = {},
): Promise<CouponDto> {
  const marked = await markAll(test, shop.operator, await makeCoupon(test, shop, given.plan));
  return inspectAndSeal(test, shop.operator, marked, { isSealed: given.isSealed ?? true });
}

export async function draftFromCell(
  test: TestApp,
  shop: PlanningShop,
  coupon: CouponDto,
  { address = 'B1', as = shop.operator, ...given }: { address?: string; as?: TestMember } & Given = {},
): Promise<RecipeRevisionDto> {
  const cellId = coupon.cells.find((cell) => cell.address === address)?.id;
  return created<RecipeRevisionDto>(test, as, '/api/recipes/from-cell', { couponId: coupon.id, cellId, ...given });
}

/** A sealed coupon of equal cells with exactly the draft's parameters. */
export async function proveAgain(
  test: TestApp,
  shop: PlanningShop,
  draft: RecipeRevisionDto,
  { count = 3, lightness = 26, lot = 'L-2' }: { count?: number; lightness?: number; lot?: string } = {},
): Promise<CouponDto> {
  const planned = await created<CouponDto>(test, shop.operator, '/api/coupons/confirmation', { revisionId: draft.id, count, lot });
  return inspectAndSeal(test, shop.operator, await markAll(test, shop.operator, planned), { lightness });
}

export async function cite(
  test: TestApp,
  member: TestMember,
  draft: RecipeRevisionDto,
  evidence: { basis: readonly string[]; confirmation: readonly string[] },
): Promise<RecipeRevisionDto> {
  const payload = { basisCellIds: evidence.basis, confirmationCellIds: evidence.confirmation };
  const answer = await call(test, member, { method: 'PUT', url: `/revisions/${draft.id}/evidence`, version: draft.version, payload });
  if (answer.statusCode !== 200) throw new Error(`citing answered ${answer.statusCode}: ${answer.body}`);
  return answer.json<RecipeRevisionDto>();
}

export async function changeDraft(test: TestApp, member: TestMember, draft: RecipeRevisionDto, payload: Given): Promise<RecipeRevisionDto> {
  const answer = await call(test, member, { method: 'PATCH', url: `/revisions/${draft.id}`, version: draft.version, payload });
  if (answer.statusCode !== 200) throw new Error(`changing answered ${answer.statusCode}: ${answer.body}`);
  return answer.json<RecipeRevisionDto>();
}

type DraftGiven = { readonly title?: string; readonly scope?: Given };
export const FOR_CUSTOMER = (name: string) => ({ featureKind: 'filled-area', customerSpecification: name });

type Proof = { readonly coupon: CouponDto; readonly proofCellIds: readonly string[] };
const proofs = new Map<string, Proof>();

/** One coupon to draft from and one that proves its cell B1 again, made once for a shop: many drafts may cite them. */
async function proofOf(test: TestApp, shop: PlanningShop): Promise<Proof> {
  const known = proofs.get(shop.shop.id);
  if (known !== undefined) return known;
  const coupon = await makeProvedCoupon(test, shop);
  const proof = await proveAgain(test, shop, await draftFromCell(test, shop, coupon));
  const made = { coupon, proofCellIds: proof.cells.map(({ id }) => id) };
  proofs.set(shop.shop.id, made);
  return made;
}

/** A draft from a cell of a sealed coupon, proved again on a later one: nothing is missing. Each covers parts of its own unless a scope is given. */
export async function makeProvedDraft(test: TestApp, shop: PlanningShop, given: DraftGiven = {}): Promise<RecipeRevisionDto> {
  const { scope = FOR_CUSTOMER(randomUUID()), ...first } = given;
  const { coupon, proofCellIds } = await proofOf(test, shop);
  const draft = await changeDraft(test, shop.operator, await draftFromCell(test, shop, coupon, first), { scope });
  const basis = draft.evidence.basis.map(({ cellId }) => cellId);
  return cite(test, shop.operator, draft, { basis, confirmation: proofCellIds });
}

export const careIds = ({ cautions }: RecipeRevisionDto) => cautions.filter(({ level }) => level === 'care').map(({ id }) => id);

/** The acts on a revision, each by whom it is handed. */
export function acts(test: TestApp, id: string) {
  const post = (act: string, member: Pick<TestMember, 'headers'> | undefined, payload: object, version?: number) =>
    call(test, member, { method: 'POST', url: `/revisions/${id}/${act}`, payload, ...(version === undefined ? {} : { version }) });
  return {
    submit: (member: TestMember, revision: RecipeRevisionDto, payload: Given = {}) =>
      post('submit', member, { acknowledgedCautionIds: careIds(revision), ...payload }, revision.version),
    recall: (member: TestMember, payload: Given = {}) => post('recall', member, payload),
    giveBack: (member: TestMember, payload: Given = { comment: 'Mark one more.' }) => post('return', member, payload),
    approve: (member: TestMember, revision: RecipeRevisionDto, payload: Given = {}) =>
      post('approve', member, {
        ...{ password: member.password, contentHash: revision.contentHash, acknowledgedCautionIds: careIds(revision) },
        ...payload,
      }),
    withdraw: (member: TestMember, payload: Given = {}) =>
      post('withdraw', member, { password: member.password, reason: 'Rim turned brown.', ...payload }),
  };
}

/** In review, with nothing missing. */
export async function makeSubmitted(test: TestApp, shop: PlanningShop, given: DraftGiven = {}): Promise<RecipeRevisionDto> {
  const draft = await makeProvedDraft(test, shop, given);
  const answer = await acts(test, draft.id).submit(shop.operator, draft);
  if (answer.statusCode !== 200) throw new Error(`submitting answered ${answer.statusCode}: ${answer.body}`);
  return answer.json<RecipeRevisionDto>();
}

/** Approved by the shop's lead. */
export async function makeApproved(test: TestApp, shop: PlanningShop, given: DraftGiven = {}): Promise<RecipeRevisionDto> {
  const submitted = await makeSubmitted(test, shop, given);
  const answer = await acts(test, submitted.id).approve(shop.lead, submitted);
  if (answer.statusCode !== 200) throw new Error(`approving answered ${answer.statusCode}: ${answer.body}`);
  return answer.json<RecipeRevisionDto>();
}
