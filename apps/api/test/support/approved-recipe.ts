import { randomUUID } from 'node:crypto';
import { schema } from '@proofplate/db';
import type { ParameterSet, RevisionContent, RevisionState, SetUpStep } from '@proofplate/recipe-model';
import { and, eq } from 'drizzle-orm';
import type { LensDto } from '../../src/lenses/dto/lens.dto';
import type { MachineDto } from '../../src/machines/dto/machine.dto';
import type { EffectDto } from '../../src/materials/dto/effect.dto';
import type { FinishDto } from '../../src/materials/dto/finish.dto';
import type { MaterialDto } from '../../src/materials/dto/material.dto';
import type { TestApp } from './app';
import { effectByKey, makeFinish, makeLens, makeMachine, makeMaterial } from './equipment';
import type { TestMember } from './factories';

const { recipe, revision, revisionEvidence, signOff, coupon, testGrid, cell, measurement } = schema;

export type Ground = { machine: MachineDto; lens: LensDto; material: MaterialDto; finish: FinishDto; effect: EffectDto };
export type ApprovedRecipe = Ground & { recipeId: string; revisionId: string; code: string };
export type RecipeGiven = Partial<Ground> & {
  title?: string;
  state?: RevisionState;
  setUpSteps?: SetUpStep[];
  values?: ParameterSet['values'];
  reviewDue?: Date;
  materialGroupId?: string;
  withoutCell?: boolean;
  withdrawnBecause?: string;
};

let lastNumber = 0;
const asSet = (value: number, unit: 'percentFromZero' | 'mm/s' | 'kHz' | 'mm' | 'count' | 'ns', physical = value) => ({
  entered: { value, unit },
  physical,
});

export const parameters = (values: ParameterSet['values'] = {}): ParameterSet => ({
  values: {
    powerPercent: asSet(30, 'percentFromZero'),
    speedMmPerS: asSet(900, 'mm/s'),
    frequencyKhz: asSet(60, 'kHz'),
    lineSpacingUm: asSet(0.03, 'mm', 30),
    passes: asSet(1, 'count'),
    ...values,
  },
  fill: 'both directions',
  assist: 'none',
  power: { watts: 5.8, basis: 'not calibrated' },
});

/** The four steps that the finder's sentence names, made as a lead makes them. The shop needs its starter content. */
export async function makeGround(test: TestApp, lead: TestMember, given: Partial<Ground> = {}): Promise<Ground> {
  return {
    machine: given.machine ?? (await makeMachine(test, lead)),
    lens: given.lens ?? (await makeLens(test, lead)),
    material: given.material ?? (await makeMaterial(test, lead)),
    finish: given.finish ?? (await makeFinish(test, lead)),
    effect: given.effect ?? (await effectByKey(test, lead, 'dark-mark')),
  };
}

/** A recipe whose revision went the whole way in the tables, without the checks of signing, which have tests of their own. */
export async function makeRecipe(test: TestApp, lead: TestMember, given: RecipeGiven = {}): Promise<ApprovedRecipe> {
  const ground = await makeGround(test, lead, given);
  const { shopId, id: memberId } = lead;
  const setUpSteps = given.setUpSteps ?? [{ text: 'Fit the lens, switch the extraction on', mustTick: true }];
  const content: RevisionContent = {
    steps: [{ purpose: 'fill', parameters: parameters(given.values), pauseAfterS: 0 }],
    setUpSteps,
    limits: { notes: 'Flat parts only' },
    scope: given.materialGroupId === undefined ? {} : { materialGroupId: given.materialGroupId },
  };
  lastNumber += 1;
  const code = `R-${String(9000 + lastNumber)}`;
  const keys = {
    materialId: ground.material.id,
    finishId: ground.finish.id,
    effectId: ground.effect.id,
    machineId: ground.machine.id,
    lensId: ground.lens.id,
  };
  return test.unitOfWork.run({ shopId }, async (tx) => {
    const [made] = await tx
      .insert(recipe)
      .values({ shopId, createdBy: memberId, code, title: given.title ?? code, ...keys, materialGroupId: given.materialGroupId ?? null })
      .returning({ id: recipe.id });
    const recipeId = made?.id ?? '';
    const dated = given.state === 'scheduled' ? { effectiveFrom: new Date('2999-01-01T00:00:00Z') } : {};
    const [drafted] = await tx
      .insert(revision)
      .values({
        shopId,
        createdBy: memberId,
        recipeId,
        content,
        profileId: ground.machine.profile.id,
        reviewDue: given.reviewDue ?? null,
        ...dated,
      })
      .returning({ id: revision.id });
    const revisionId = drafted?.id ?? '';
    if (given.withoutCell !== true) await citeCell(tx, { ...keys, shopId, memberId, revisionId, profileId: ground.machine.profile.id });
    for (const state of wayTo(given.state ?? 'approved')) {
      const submitted = state === 'in_review' ? { number: 1, contentHash: randomUUID().replaceAll('-', '') } : {};
      await tx
        .update(revision)
        .set({ state, ...submitted })
        .where(and(eq(revision.shopId, shopId), eq(revision.id, revisionId)));
      const meaning = state === 'approved' || state === 'withdrawn' ? state : undefined;
      if (meaning !== undefined)
        await tx.insert(signOff).values({
          ...{ shopId, revisionId, memberId, meaning, printedName: lead.printedName, role: lead.role, method: 'password' },
          comment: meaning === 'withdrawn' ? (given.withdrawnBecause ?? '') : '',
          contentHash: 'as signed',
          ledgerHashBefore: 'as it was',
        });
    }
    return { ...ground, recipeId, revisionId, code };
  });
}

function wayTo(state: RevisionState): RevisionState[] {
  const ways: Record<RevisionState, RevisionState[]> = {
    draft: [],
    in_review: ['in_review'],
    returned: ['in_review', 'returned'],
    scheduled: ['in_review', 'scheduled'],
    approved: ['in_review', 'approved'],
    superseded: ['in_review', 'approved', 'superseded'],
    withdrawn: ['in_review', 'approved', 'withdrawn'],
  };
  return ways[state];
}

type Cited = {
  shopId: string;
  memberId: string;
  revisionId: string;
  profileId: string;
  materialId: string;
  finishId: string;
  effectId: string;
  machineId: string;
  lensId: string;
};

/** A coupon of 3 × 4 cells with one of them, B3, as the cell that the setting comes from. */
async function citeCell(tx: Parameters<Parameters<TestApp['unitOfWork']['run']>[1]>[0], cited: Cited): Promise<void> {
  const { memberId: createdBy, revisionId, ...keys } = cited;
  const { shopId } = cited;
  const contrastAtLeast = { quantity: 'contrast', comparison: 'at least', value: 0.9, unit: '1' };
  const [plate] = await tx
    .insert(coupon)
    .values({ ...keys, createdBy, code: `C-${9000 + lastNumber}`, lot: 'L-1', criteria: [contrastAtLeast] })
    .returning({ id: coupon.id });
  const couponId = plate?.id ?? '';
  const [grid] = await tx
    .insert(testGrid)
    .values({
      shopId,
      createdBy,
      couponId,
      rows: 3,
      columns: 4,
      baseSetting: parameters(),
      cellMm: 5,
      gapMm: 1.2,
      layoutVersion: 'coupon-layout/1',
    })
    .returning({ id: testGrid.id });
  const [square] = await tx
    .insert(cell)
    .values({ shopId, couponId, gridId: grid?.id ?? '', address: 'B3', rowIndex: 1, columnIndex: 2, runOrder: 7, parameters: parameters() })
    .returning({ id: cell.id });
  const cellId = square?.id ?? '';
  await tx.insert(measurement).values({ shopId, createdBy, cellId, quantity: 'contrast', value: 0.95, unit: '1', method: 'photo' });
  await tx.insert(revisionEvidence).values({ shopId, createdBy, revisionId, couponId, cellId, kind: 'basis' });
}

/** Takes an approved recipe out of use, as withdrawing does in the tables. */
export async function withdrawRecipe(test: TestApp, lead: TestMember, { revisionId }: ApprovedRecipe, reason = ''): Promise<void> {
  const { shopId, id: memberId, printedName, role } = lead;
  await test.unitOfWork.run({ shopId }, async (tx) => {
    await tx
      .update(revision)
      .set({ state: 'withdrawn' })
      .where(and(eq(revision.shopId, shopId), eq(revision.id, revisionId)));
    const act = { meaning: 'withdrawn', comment: reason, contentHash: 'as signed', ledgerHashBefore: 'as it was', method: 'password' };
    await tx.insert(signOff).values({ shopId, revisionId, memberId, printedName, role, ...act });
  });
}

/** Puts a second revision with the same content in the place of the approved one. */
export async function supersedeRecipe(test: TestApp, lead: TestMember, { recipeId, revisionId }: ApprovedRecipe): Promise<void> {
  const { shopId, id: createdBy } = lead;
  await test.unitOfWork.run({ shopId }, async (tx) => {
    const become = (id: string, change: Partial<typeof revision.$inferInsert>) =>
      tx
        .update(revision)
        .set(change)
        .where(and(eq(revision.shopId, shopId), eq(revision.id, id)));
    const [old] = await tx
      .select({ content: revision.content, profileId: revision.profileId })
      .from(revision)
      .where(and(eq(revision.shopId, shopId), eq(revision.id, revisionId)));
    if (old === undefined) throw new Error(`no revision ${revisionId}`);
    const [next] = await tx
      .insert(revision)
      .values({ shopId, createdBy, recipeId, ...old })
      .returning({ id: revision.id });
    const nextId = next?.id ?? '';
    await become(nextId, { state: 'in_review', number: 2, contentHash: randomUUID().replaceAll('-', '') });
    await become(revisionId, { state: 'superseded' });
    await become(nextId, { state: 'approved' });
  });
}
