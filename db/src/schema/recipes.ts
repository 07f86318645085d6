import { and, eq, getTableColumns, type SQL, sql } from 'drizzle-orm';
import {
  alias,
  boolean,
  check,
  doublePrecision,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  pgView,
  primaryKey,
  QueryBuilder,
  text,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import { authorship, editVersion, moment, shopPolicy, tenantKey } from '../columns';
import { cell, coupon } from './coupons';
import { lens, machine, machineProfile, powerCalibration } from './machines';
import { effect, finish, material, materialGroup } from './materials';
import { member } from './people';

/** One proved way to get one effect on one material and finish with one machine and lens. */
export const recipe = pgTable(
  'recipe',
  {
    ...tenantKey(),
    code: text().notNull(),
    title: text().notNull(),
    materialId: uuid().notNull(),
    finishId: uuid().notNull(),
    effectId: uuid().notNull(),
    machineId: uuid().notNull(),
    lensId: uuid().notNull(),
    /** Limits within which an approval holds; null: not limited. */
    thicknessFromMm: doublePrecision(),
    thicknessToMm: doublePrecision(),
    partDiameterFromMm: doublePrecision(),
    partDiameterToMm: doublePrecision(),
    featureKind: text().notNull().default('filled-area'),
    featureSizeFromMm: doublePrecision(),
    featureSizeToMm: doublePrecision(),
    materialGroupId: uuid(),
    customerSpecification: text().notNull().default(''),
    ...authorship(),
    ...editVersion(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    unique('recipe_code_unique').on(t.shopId, t.code),
    foreignKey({ columns: [t.shopId, t.materialId], foreignColumns: [material.shopId, material.id], name: 'recipe_material_fk' }),
    foreignKey({ columns: [t.shopId, t.finishId], foreignColumns: [finish.shopId, finish.id], name: 'recipe_finish_fk' }),
    foreignKey({ columns: [t.shopId, t.effectId], foreignColumns: [effect.shopId, effect.id], name: 'recipe_effect_fk' }),
    foreignKey({ columns: [t.shopId, t.machineId], foreignColumns: [machine.shopId, machine.id], name: 'recipe_machine_fk' }),
    foreignKey({ columns: [t.shopId, t.lensId], foreignColumns: [lens.shopId, lens.id], name: 'recipe_lens_fk' }),
    foreignKey({
      columns: [t.shopId, t.materialGroupId],
      foreignColumns: [materialGroup.shopId, materialGroup.id],
      name: 'recipe_material_group_fk',
    }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'recipe_author_fk' }),
    check('recipe_feature_kind', sql`${t.featureKind} in ('filled-area','stroke-text','single-line','code')`),
    index('recipe_keys').on(t.shopId, t.materialId, t.finishId, t.effectId, t.machineId, t.lensId),
    index('recipe_recent').on(t.shopId, t.createdAt),
    shopPolicy('recipe'),
  ],
);

const revisionColumns = () => ({
  ...tenantKey(),
  recipeId: uuid().notNull(),
  number: integer(),
  state: text().notNull().default('draft'),
  /** Mark steps, set-up steps and limits of use in the vocabulary of recipe-model. */
  content: jsonb().$type<Record<string, unknown>>().notNull(),
  profileId: uuid().notNull(),
  calibrationId: uuid(),
  reason: text().notNull().default(''),
  basedOnId: uuid(),
  route: text().notNull().default('coupons'),
  grounds: text().notNull().default(''),
  groundsBy: uuid(),
  /** Members other than the author who changed the draft: they do not approve it. */
  editorIds: jsonb().$type<string[]>().notNull().default([]),
  effectiveFrom: moment(),
  reviewDue: moment(),
  contentHash: text(),
  acknowledgedCautionIds: jsonb().$type<string[]>().notNull().default([]),
  submittedAt: moment(),
  approvedAt: moment(),
  withdrawnAt: moment(),
  supersededAt: moment(),
  ...authorship(),
  ...editVersion(),
});

/** One version of a recipe. Numbered at submit; from then on its content never changes. */
export const revision = pgTable('revision', revisionColumns(), (t) => [
  primaryKey({ columns: [t.shopId, t.id] }),
  unique('revision_recipe_unique').on(t.shopId, t.recipeId, t.id),
  unique('revision_number_unique').on(t.shopId, t.recipeId, t.number),
  uniqueIndex('revision_one_approved').on(t.shopId, t.recipeId).where(sql`${t.state} = 'approved'`),
  uniqueIndex('revision_one_scheduled').on(t.shopId, t.recipeId).where(sql`${t.state} = 'scheduled'`),
  foreignKey({ columns: [t.shopId, t.recipeId], foreignColumns: [recipe.shopId, recipe.id], name: 'revision_recipe_fk' }),
  foreignKey({
    columns: [t.shopId, t.profileId],
    foreignColumns: [machineProfile.shopId, machineProfile.id],
    name: 'revision_profile_fk',
  }),
  foreignKey({
    columns: [t.shopId, t.calibrationId],
    foreignColumns: [powerCalibration.shopId, powerCalibration.id],
    name: 'revision_calibration_fk',
  }),
  foreignKey({ columns: [t.shopId, t.basedOnId], foreignColumns: [t.shopId, t.id], name: 'revision_based_on_fk' }),
  foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'revision_author_fk' }),
  foreignKey({ columns: [t.shopId, t.groundsBy], foreignColumns: [member.shopId, member.id], name: 'revision_grounds_by_fk' }),
  check('revision_state', sql`${t.state} in ('draft','in_review','returned','scheduled','approved','superseded','withdrawn')`),
  check('revision_route', sql`${t.route} in ('coupons','earlier-experience','customer-given','transferred')`),
  check('revision_number_from_submit', sql`(${t.state} = 'draft') = (${t.number} is null)`),
  check('revision_hash_from_submit', sql`${t.state} = 'draft' or ${t.contentHash} is not null`),
  index('revision_state_recent').on(t.shopId, t.state, t.submittedAt),
  shopPolicy('revision'),
]);

/**
 * Revisions as they stand at the moment of reading. A scheduled one whose day has come is the approved one, and the one before it is
 * superseded, whether or not the worker has come to write that down. Who reads a revision's state reads it here; who changes it locks the
 * table and writes down first what is due. A migration that makes the view anew grants it anew.
 */
export const revisionNow = pgView('revision_now', revisionColumns()).with({ securityInvoker: true }).as(asOfNow());

function asOfNow(): SQL {
  const due = alias(revision, 'due');
  const isDue = and(
    eq(due.shopId, revision.shopId),
    eq(due.recipeId, revision.recipeId),
    eq(due.state, 'scheduled'),
    sql`${due.effectiveFrom} <= now()`,
  );
  const state = sql`case when ${revision.state} = 'scheduled' and ${revision.effectiveFrom} <= now() then 'approved'
    when ${revision.state} = 'approved' and ${due.id} is not null then 'superseded' else ${revision.state} end`;
  const supersededAt = sql`case when ${revision.state} = 'approved' then ${due.effectiveFrom} else ${revision.supersededAt} end`;
  return new QueryBuilder({ casing: 'snake_case' })
    .select({ ...getTableColumns(revision), state: state.as('state'), supersededAt: supersededAt.as('superseded_at') })
    .from(revision)
    .leftJoin(due, isDue)
    .getSQL();
}

/** Cells that a revision rests on (basis) or that proved it (confirmation). */
export const revisionEvidence = pgTable(
  'revision_evidence',
  {
    shopId: uuid().notNull(),
    revisionId: uuid().notNull(),
    couponId: uuid().notNull(),
    cellId: uuid().notNull(),
    kind: text().notNull(),
    ...authorship(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.revisionId, t.cellId, t.kind] }),
    foreignKey({
      columns: [t.shopId, t.revisionId],
      foreignColumns: [revision.shopId, revision.id],
      name: 'revision_evidence_revision_fk',
    }),
    foreignKey({ columns: [t.shopId, t.couponId], foreignColumns: [coupon.shopId, coupon.id], name: 'revision_evidence_coupon_fk' }),
    foreignKey({
      columns: [t.shopId, t.couponId, t.cellId],
      foreignColumns: [cell.shopId, cell.couponId, cell.id],
      name: 'revision_evidence_cell_fk',
    }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'revision_evidence_author_fk' }),
    check('revision_evidence_kind', sql`${t.kind} in ('basis','confirmation')`),
    index('revision_evidence_cell').on(t.shopId, t.cellId),
    shopPolicy('revision_evidence'),
  ],
);

/** Who said what of a revision, frozen as printed and bound to the content's hash. */
export const signOff = pgTable(
  'sign_off',
  {
    ...tenantKey(),
    revisionId: uuid().notNull(),
    memberId: uuid().notNull(),
    printedName: text().notNull(),
    role: text().notNull(),
    meaning: text().notNull(),
    comment: text().notNull().default(''),
    signedAt: moment().notNull().defaultNow(),
    contentHash: text().notNull(),
    ledgerHashBefore: text().notNull(),
    method: text().notNull(),
    isByAuthor: boolean().notNull().default(false),
    checks: jsonb().$type<unknown>(),
    acknowledgedCautionIds: jsonb().$type<string[]>().notNull().default([]),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    foreignKey({ columns: [t.shopId, t.revisionId], foreignColumns: [revision.shopId, revision.id], name: 'sign_off_revision_fk' }),
    foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id], name: 'sign_off_member_fk' }),
    check(
      'sign_off_meaning',
      sql`${t.meaning} in ('submitted for review','recalled','approved','returned','withdrawn','hold placed','hold released')`,
    ),
    check('sign_off_method', sql`${t.method} in ('password','session')`),
    index('sign_off_revision').on(t.shopId, t.revisionId, t.signedAt),
    shopPolicy('sign_off'),
  ],
);
