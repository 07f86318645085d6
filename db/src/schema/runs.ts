import { sql } from 'drizzle-orm';
import { check, date, foreignKey, index, integer, jsonb, pgTable, primaryKey, text, unique, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import { authorship, editVersion, moment, shopPolicy, tenantKey } from '../columns';
import { lens, machine } from './machines';
import { effect, finish, material } from './materials';
import { member } from './people';
import { recipe, revision } from './recipes';

/** One use of a revision at the machine. */
export const run = pgTable(
  'run',
  {
    ...tenantKey(),
    code: text().notNull(),
    kind: text().notNull(),
    state: text().notNull().default('started'),
    recipeId: uuid().notNull(),
    revisionId: uuid().notNull(),
    machineId: uuid().notNull(),
    /** Hash of the content that was dialled in; a confirmation run also keeps the steps. */
    contentHash: text().notNull(),
    steps: jsonb().$type<unknown>(),
    jobReference: text().notNull().default(''),
    part: text().notNull().default(''),
    lot: text().notNull().default(''),
    lensFittedId: uuid(),
    ticks: jsonb().$type<Record<string, string>>().notNull().default({}),
    firstPiece: jsonb().$type<{ ok: boolean; by: string; byName: string; at: string; note: string; photoId?: string }>(),
    goodCount: integer().notNull().default(0),
    scrapCount: integer().notNull().default(0),
    measurements: jsonb()
      .$type<{ piece: number; quantity: string; value: number; unit: string; method: string; meets?: boolean }[]>()
      .notNull()
      .default([]),
    badResult: jsonb().$type<{ outcome: string; note: string; at: string; byName: string }>(),
    deviationId: uuid(),
    notes: text().notNull().default(''),
    /** Made by the device, so that a run sent twice is one run. */
    clientId: uuid().notNull(),
    startedAt: moment().notNull().defaultNow(),
    finishedAt: moment(),
    ...authorship(),
    ...editVersion(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    unique('run_code_unique').on(t.shopId, t.code),
    unique('run_client_unique').on(t.shopId, t.clientId),
    foreignKey({
      columns: [t.shopId, t.recipeId, t.revisionId],
      foreignColumns: [revision.shopId, revision.recipeId, revision.id],
      name: 'run_revision_fk',
    }),
    foreignKey({ columns: [t.shopId, t.machineId], foreignColumns: [machine.shopId, machine.id], name: 'run_machine_fk' }),
    foreignKey({ columns: [t.shopId, t.lensFittedId], foreignColumns: [lens.shopId, lens.id], name: 'run_lens_fk' }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'run_author_fk' }),
    foreignKey({ columns: [t.shopId, t.deviationId], foreignColumns: [deviation.shopId, deviation.id], name: 'run_deviation_fk' }),
    check('run_kind', sql`${t.kind} in ('production','confirmation','daily-check')`),
    check('run_state', sql`${t.state} in ('started','finished','abandoned')`),
    check('run_counts', sql`${t.goodCount} >= 0 and ${t.scrapCount} >= 0`),
    index('run_recent').on(t.shopId, t.startedAt),
    index('run_revision').on(t.shopId, t.revisionId),
    index('run_job').on(t.shopId, t.jobReference),
    shopPolicy('run'),
  ],
);

/**
 * A round part as it was set up for a run: what was typed, the machine's beam and lens at that time, and the numbers that followed.
 * Never changed: another save adds the next number, until the run is finished.
 */
export const partSetUp = pgTable(
  'part_set_up',
  {
    ...tenantKey(),
    runId: uuid().notNull(),
    number: integer().notNull(),
    lensId: uuid().notNull(),
    entered: jsonb().$type<Record<string, unknown>>().notNull(),
    ground: jsonb().$type<Record<string, unknown>>().notNull(),
    results: jsonb().$type<Record<string, unknown>>().notNull(),
    savedByName: text().notNull(),
    ...authorship(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    unique('part_set_up_number_unique').on(t.shopId, t.runId, t.number),
    foreignKey({ columns: [t.shopId, t.runId], foreignColumns: [run.shopId, run.id], name: 'part_set_up_run_fk' }),
    foreignKey({ columns: [t.shopId, t.lensId], foreignColumns: [lens.shopId, lens.id], name: 'part_set_up_lens_fk' }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'part_set_up_author_fk' }),
    check('part_set_up_number', sql`${t.number} >= 1`),
    shopPolicy('part_set_up'),
  ],
);

/** "Stop use": on a recipe or a machine, until a lead releases it. */
export const hold = pgTable(
  'hold',
  {
    ...tenantKey(),
    recipeId: uuid(),
    machineId: uuid(),
    reason: text().notNull(),
    placedByName: text().notNull(),
    releasedAt: moment(),
    releasedBy: uuid(),
    releasedByName: text(),
    releaseReason: text(),
    ...authorship(),
    ...editVersion(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    foreignKey({ columns: [t.shopId, t.recipeId], foreignColumns: [recipe.shopId, recipe.id], name: 'hold_recipe_fk' }),
    foreignKey({ columns: [t.shopId, t.machineId], foreignColumns: [machine.shopId, machine.id], name: 'hold_machine_fk' }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'hold_author_fk' }),
    foreignKey({ columns: [t.shopId, t.releasedBy], foreignColumns: [member.shopId, member.id], name: 'hold_released_by_fk' }),
    check('hold_one_subject', sql`(${t.recipeId} is null) <> (${t.machineId} is null)`),
    uniqueIndex('hold_open_recipe').on(t.shopId, t.recipeId).where(sql`${t.releasedAt} is null and ${t.recipeId} is not null`),
    uniqueIndex('hold_open_machine').on(t.shopId, t.machineId).where(sql`${t.releasedAt} is null and ${t.machineId} is not null`),
    shopPolicy('hold'),
  ],
);

/** "Ask for this setting": a need that no approved recipe answers yet. */
export const settingRequest = pgTable(
  'setting_request',
  {
    ...tenantKey(),
    machineId: uuid(),
    lensId: uuid(),
    materialId: uuid(),
    finishId: uuid(),
    effectId: uuid(),
    /** Job that the setting is for, as the shop calls it. */
    jobReference: text().notNull().default(''),
    neededOn: date(),
    note: text().notNull().default(''),
    state: text().notNull().default('open'),
    answer: text(),
    answeredBy: uuid(),
    answeredAt: moment(),
    ...authorship(),
    ...editVersion(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    foreignKey({ columns: [t.shopId, t.machineId], foreignColumns: [machine.shopId, machine.id], name: 'setting_request_machine_fk' }),
    foreignKey({ columns: [t.shopId, t.lensId], foreignColumns: [lens.shopId, lens.id], name: 'setting_request_lens_fk' }),
    foreignKey({ columns: [t.shopId, t.materialId], foreignColumns: [material.shopId, material.id], name: 'setting_request_material_fk' }),
    foreignKey({ columns: [t.shopId, t.finishId], foreignColumns: [finish.shopId, finish.id], name: 'setting_request_finish_fk' }),
    foreignKey({ columns: [t.shopId, t.effectId], foreignColumns: [effect.shopId, effect.id], name: 'setting_request_effect_fk' }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'setting_request_author_fk' }),
    foreignKey({ columns: [t.shopId, t.answeredBy], foreignColumns: [member.shopId, member.id], name: 'setting_request_answered_by_fk' }),
    check('setting_request_state', sql`${t.state} in ('open','answered','closed')`),
    index('setting_request_recent').on(t.shopId, t.state, t.createdAt),
    shopPolicy('setting_request'),
  ],
);

/** A permitted departure from a revision, limited by time or quantity; ends by itself. */
export const deviation = pgTable(
  'deviation',
  {
    ...tenantKey(),
    revisionId: uuid().notNull(),
    description: text().notNull(),
    reason: text().notNull(),
    endsAt: moment(),
    maximumQuantity: integer(),
    grantedByName: text().notNull(),
    ...authorship(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    foreignKey({ columns: [t.shopId, t.revisionId], foreignColumns: [revision.shopId, revision.id], name: 'deviation_revision_fk' }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'deviation_author_fk' }),
    check('deviation_is_limited', sql`${t.endsAt} is not null or ${t.maximumQuantity} is not null`),
    shopPolicy('deviation'),
  ],
);
