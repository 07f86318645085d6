import { schema } from '@proofplate/db';
import { and, eq } from 'drizzle-orm';
import { authored, type Turn } from '../stage/stage';
import { keysOf } from './coupon-planning';
import { WORK } from './coupon-specs';
import type { World } from './coupons';
import { teller } from './shop';

const { hold, settingRequest } = schema;

/** What the floor and the desk say to each other: holds and requests. */
export function writeFloor(world: World): void {
  writeHolds(world);
  writeRequests(world);
}

function writeHolds({ script, cast, made }: World): void {
  const lead = teller(cast.people.lead);
  const { id: machineId } = cast.benches['bench 1'];
  const service: { id?: string } = {};
  const [why, released] = ['The protective glass of F254 has a burnt spot.', 'Glass changed, first marks are even.'];
  script.add(new Date('2026-10-15T10:00:00Z'), lead, async (turn) => {
    service.id = await placeHold(turn, { kind: 'machine', id: machineId }, why);
  });
  script.add(new Date('2026-10-16T08:30:00Z'), lead, async (turn) => {
    const release = { releasedAt: turn.at, releasedBy: lead.memberId, releasedByName: lead.name, releaseReason: released, version: 2 };
    await turn.tx
      .update(hold)
      .set(release)
      .where(and(eq(hold.shopId, turn.shopId), eq(hold.id, service.id ?? '')));
    const subject = { subjectType: 'machine', subjectId: machineId };
    const after = { meaning: 'hold released', reason: released, method: 'password' };
    await turn.tell({ action: 'hold.released', ...subject, before: { reason: why, placedBy: lead.name }, after });
  });
  script.add(new Date('2026-11-12T11:30:00Z'), lead, async (turn) => {
    const { recipeId, recipeCode } = made.revision('slate/1');
    const reason = 'Pale stripes on TW-26-0414: the table is not level. Not to be used until the wedges are replaced.';
    await placeHold(turn, { kind: 'recipe', id: recipeId, code: recipeCode }, reason);
  });
}

type Held = { readonly kind: 'machine' | 'recipe'; readonly id: string; readonly code?: string };

async function placeHold(turn: Turn, { kind, id: subjectId, code }: Held, reason: string): Promise<string> {
  const id = turn.newId();
  const on = kind === 'machine' ? { machineId: subjectId } : { recipeId: subjectId };
  await turn.tx.insert(hold).values({ ...authored(turn), id, ...on, reason, placedByName: turn.by.name });
  const after = { meaning: 'hold placed', kind, id: subjectId, reason, method: 'password' };
  const subject = { subjectType: kind, subjectId, ...(code === undefined ? {} : { subjectCode: code }) };
  await turn.tell({ action: 'hold.placed', ...subject, after });
  return id;
}

function writeRequests({ script, cast }: World): void {
  const trainee = teller(cast.people.trainee);
  const lead = teller(cast.people.lead);
  const asked: { id?: string } = {};
  script.add(new Date('2026-10-02T08:40:00Z'), trainee, async (turn) => {
    const { materialId, finishId, effectId } = keysOf(cast, WORK.black);
    const note = 'The dial is 120 mm wide. Does F160 reach?';
    asked.id = await ask(turn, { materialId, finishId, effectId, jobReference: 'TW-26-0379', neededOn: '2026-10-12', note });
  });
  script.add(new Date('2026-10-05T09:00:00Z'), lead, async (turn) => {
    const answer = 'F160 covers 110 mm. Turn the dial and mark it in two halves with the approved setting.';
    const change = { state: 'answered', answer, answeredBy: lead.memberId, answeredAt: turn.at, version: 2 };
    await turn.tx
      .update(settingRequest)
      .set(change)
      .where(and(eq(settingRequest.shopId, turn.shopId), eq(settingRequest.id, asked.id ?? '')));
    const entry = { action: 'setting-request.answered', subjectType: 'setting-request', subjectId: asked.id ?? '' };
    await turn.tell({ ...entry, before: { state: 'open' }, after: { state: 'answered', answer } });
  });
  script.add(new Date('2026-11-25T15:30:00Z'), trainee, async (turn) => {
    const note = 'Round housings, 25 mm, bead blasted. Only the brushed setting is approved.';
    await ask(turn, { ...keysOf(cast, WORK.blasted), jobReference: 'TW-26-0431', neededOn: '2026-12-14', note });
  });
}

type Asked = Pick<
  typeof settingRequest.$inferInsert,
  'materialId' | 'finishId' | 'effectId' | 'machineId' | 'lensId' | 'jobReference' | 'neededOn' | 'note'
>;

async function ask(turn: Turn, values: Asked): Promise<string> {
  const id = turn.newId();
  await turn.tx.insert(settingRequest).values({ ...authored(turn), id, ...values });
  await turn.tell({ action: 'setting-request.asked', subjectType: 'setting-request', subjectId: id, after: values });
  return id;
}
