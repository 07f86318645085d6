import { uuidv7 } from 'uuidv7';
import type { Db } from '../../src/client';
import * as schema from '../../src/schema';

/** The smallest shop with everything an approval rests on: a sealed coupon and a submitted revision that cites it. */
export type ProvedShop = Awaited<ReturnType<typeof makeProvedShop>>;

const POLICY = {
  ...{ minimumConfirmationMarks: 3, authorMaySign: false, reviewEveryDays: 365, overdueBlocks: false, photoRequired: true },
  ...{ calibrationAgeDays: 180, powerShiftPercent: 5, secondFactorForSigning: false },
};
const HASH = '0'.repeat(64);

/** Writes as a superuser: triggers and constraints hold, policies do not. */
export async function makeProvedShop(db: Db) {
  const ground = await makeGround(db);
  const sealed = await makeCoupon(db, ground, 'C-0001');
  const open = await makeCoupon(db, ground, 'C-0002');
  const submitted = await makeRevision(db, ground, 'R-0001');
  const { shopId, memberId: createdBy } = ground;
  const evidence = { shopId, revisionId: submitted.revisionId, couponId: sealed.couponId, cellId: sealed.cellId, kind: 'basis', createdBy };
  await db.insert(schema.revisionEvidence).values(evidence);
  return { ...ground, sealed, open, submitted };
}

export async function makeGround(db: Db) {
  const shopId = uuidv7();
  const named = () => ({ id: uuidv7(), shopId });
  const person = { id: uuidv7(), email: `${shopId}@example.com`, name: 'Ann Lee', passwordHash: 'x' };
  const member = { ...named(), personId: person.id, role: 'owner', printedName: 'Ann Lee' };
  const createdBy = member.id;
  const [lens, machine, profile, material, finish, effect] = [named(), named(), named(), named(), named(), named()];
  await db.insert(schema.shop).values({ id: shopId, name: 'Shop', policy: POLICY });
  await db.insert(schema.ledgerHead).values({ shopId, seq: 0, hash: HASH });
  await db.insert(schema.person).values(person);
  await db.insert(schema.member).values(member);
  await db.insert(schema.lens).values({ ...lens, name: 'F160', focalLengthMm: 160, fieldSizeMm: 110, createdBy });
  await db.insert(schema.machine).values({ ...machine, name: 'Fibre 1', sourceKind: 'fibre-q-switched', createdBy });
  await db.insert(schema.machineProfile).values({
    ...{ ...profile, machineId: machine.id, number: 1, physicalNumber: 1, sourceKind: 'fibre-q-switched' },
    ...{ physical: {}, panel: {}, createdBy },
  });
  await db.insert(schema.material).values({ ...material, name: '316L', family: 'stainless-steel', createdBy });
  await db.insert(schema.finish).values({ ...finish, name: 'brushed', createdBy });
  await db.insert(schema.effect).values({ ...effect, name: 'Dark mark', key: 'dark-mark', createdBy });
  const keys = { materialId: material.id, finishId: finish.id, effectId: effect.id, machineId: machine.id, lensId: lens.id };
  return { shopId, personId: person.id, memberId: member.id, profileId: profile.id, keys };
}

type Ground = Awaited<ReturnType<typeof makeGround>>;

/** Still planned, with one of every part. */
export async function makeCoupon(db: Db, { shopId, memberId, profileId, keys }: Ground, code: string) {
  const [couponId, gridId, cellId, ratingId, photoId] = [uuidv7(), uuidv7(), uuidv7(), uuidv7(), uuidv7()];
  const createdBy = memberId;
  await db.insert(schema.coupon).values({ id: couponId, shopId, code, ...keys, profileId, createdBy });
  await db.insert(schema.testGrid).values({
    ...{ id: gridId, shopId, couponId, rows: 1, columns: 1, baseSetting: {}, cellMm: 5, gapMm: 1 },
    ...{ layoutVersion: 'coupon-layout/1', createdBy },
  });
  const place = { address: 'A1', rowIndex: 0, columnIndex: 0, runOrder: 1 };
  await db.insert(schema.cell).values({ id: cellId, shopId, couponId, gridId, ...place, parameters: {} });
  await db.insert(schema.cellRating).values({ id: ratingId, shopId, cellId, memberId, rating: 4 });
  await db.insert(schema.photo).values({
    ...{ id: photoId, shopId, couponId, receivedSha256: HASH, receivedBytes: 1, receivedType: 'image/jpeg', createdBy },
  });
  const quantity = { quantity: 'contrast', value: 0.9, unit: '1', method: 'photo' };
  await db.insert(schema.measurement).values({ shopId, cellId, ...quantity, createdBy });
  await db.insert(schema.couponCorrection).values({ shopId, couponId, text: 'The lot was 7', reason: 'misread', createdBy });
  return { couponId, gridId, cellId, ratingId, photoId };
}

/** A draft on a recipe of its own. */
export async function makeRevision(db: Db, { shopId, memberId, profileId, keys }: Ground, code: string) {
  const [recipeId, revisionId] = [uuidv7(), uuidv7()];
  await db.insert(schema.recipe).values({ id: recipeId, shopId, code, title: 'Dark mark', ...keys, createdBy: memberId });
  await db.insert(schema.revision).values({ id: revisionId, shopId, recipeId, content: { steps: [] }, profileId, createdBy: memberId });
  return { recipeId, revisionId };
}
