import { sql } from 'drizzle-orm';
import {
  boolean,
  check,
  doublePrecision,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import { authorship, editVersion, moment, shopPolicy, tenantKey } from '../columns';
import { lens, machine, machineProfile, powerCalibration } from './machines';
import { type CriterionRow, effect, finish, material } from './materials';
import { member } from './people';

/** A plate of test cells: planned, marked, inspected, sealed. */
export const coupon = pgTable(
  'coupon',
  {
    ...tenantKey(),
    code: text().notNull(),
    title: text().notNull().default(''),
    purpose: text().notNull().default('exploration'),
    state: text().notNull().default('planned'),
    materialId: uuid().notNull(),
    finishId: uuid().notNull(),
    effectId: uuid().notNull(),
    machineId: uuid().notNull(),
    profileId: uuid().notNull(),
    lensId: uuid().notNull(),
    calibrationId: uuid(),
    /** Draft or revision in review that a confirmation coupon is to prove. */
    confirmsRevisionId: uuid(),
    lot: text().notNull().default(''),
    thicknessMm: doublePrecision(),
    storedAt: text().notNull().default(''),
    ambientNotes: text().notNull().default(''),
    notes: text().notNull().default(''),
    /** A plate burnt before it was logged here; unknown values are absent and listed. */
    isImported: boolean().notNull().default(false),
    unknownFields: jsonb().$type<string[]>().notNull().default([]),
    isInvented: boolean().notNull().default(false),
    sourceNote: text().notNull().default(''),
    criteria: jsonb().$type<CriterionRow[]>(),
    criteriaRecordedAt: moment(),
    acknowledgedCautionIds: jsonb().$type<string[]>().notNull().default([]),
    markingStartedAt: moment(),
    markedAt: moment(),
    markedBy: uuid(),
    inspectedAt: moment(),
    inspectedBy: uuid(),
    sealedAt: moment(),
    sealedBy: uuid(),
    ...authorship(),
    ...editVersion(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    unique('coupon_code_unique').on(t.shopId, t.code),
    foreignKey({ columns: [t.shopId, t.materialId], foreignColumns: [material.shopId, material.id], name: 'coupon_material_fk' }),
    foreignKey({ columns: [t.shopId, t.finishId], foreignColumns: [finish.shopId, finish.id], name: 'coupon_finish_fk' }),
    foreignKey({ columns: [t.shopId, t.effectId], foreignColumns: [effect.shopId, effect.id], name: 'coupon_effect_fk' }),
    foreignKey({ columns: [t.shopId, t.machineId], foreignColumns: [machine.shopId, machine.id], name: 'coupon_machine_fk' }),
    foreignKey({ columns: [t.shopId, t.profileId], foreignColumns: [machineProfile.shopId, machineProfile.id], name: 'coupon_profile_fk' }),
    foreignKey({ columns: [t.shopId, t.lensId], foreignColumns: [lens.shopId, lens.id], name: 'coupon_lens_fk' }),
    foreignKey({
      columns: [t.shopId, t.calibrationId],
      foreignColumns: [powerCalibration.shopId, powerCalibration.id],
      name: 'coupon_calibration_fk',
    }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'coupon_author_fk' }),
    foreignKey({ columns: [t.shopId, t.markedBy], foreignColumns: [member.shopId, member.id], name: 'coupon_marked_by_fk' }),
    foreignKey({ columns: [t.shopId, t.inspectedBy], foreignColumns: [member.shopId, member.id], name: 'coupon_inspected_by_fk' }),
    foreignKey({ columns: [t.shopId, t.sealedBy], foreignColumns: [member.shopId, member.id], name: 'coupon_sealed_by_fk' }),
    check('coupon_state', sql`${t.state} in ('planned','marked','inspected','sealed')`),
    check('coupon_purpose', sql`${t.purpose} in ('exploration','confirmation')`),
    index('coupon_recent').on(t.shopId, t.createdAt),
    index('coupon_material').on(t.shopId, t.materialId, t.state),
    shopPolicy('coupon'),
  ],
);

/** Two factors crossed on a plate. Factor, base setting and label step use the vocabulary of recipe-model. */
export const testGrid = pgTable(
  'test_grid',
  {
    ...tenantKey(),
    couponId: uuid().notNull(),
    number: integer().notNull().default(1),
    rows: integer().notNull(),
    columns: integer().notNull(),
    rowFactor: jsonb().$type<Record<string, unknown>>(),
    columnFactor: jsonb().$type<Record<string, unknown>>(),
    baseSetting: jsonb().$type<Record<string, unknown>>().notNull(),
    labelStep: jsonb().$type<Record<string, unknown>>(),
    cellMm: doublePrecision().notNull(),
    gapMm: doublePrecision().notNull(),
    layoutVersion: text().notNull(),
    runOrderSeed: integer(),
    fillDrawnBy: text().notNull().default('machine'),
    ...authorship(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    unique('test_grid_number_unique').on(t.shopId, t.couponId, t.number),
    foreignKey({ columns: [t.shopId, t.couponId], foreignColumns: [coupon.shopId, coupon.id], name: 'test_grid_coupon_fk' }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'test_grid_author_fk' }),
    check('test_grid_size', sql`${t.rows} between 1 and 26 and ${t.columns} between 1 and 26`),
    check('test_grid_fill_drawn_by', sql`${t.fillDrawnBy} in ('machine','artwork')`),
    shopPolicy('test_grid'),
  ],
);

/** One square: its whole parameter set as planned, the real one only where it differs. */
export const cell = pgTable(
  'cell',
  {
    ...tenantKey(),
    couponId: uuid().notNull(),
    gridId: uuid().notNull(),
    address: text().notNull(),
    rowIndex: integer().notNull(),
    columnIndex: integer().notNull(),
    runOrder: integer().notNull(),
    parameters: jsonb().$type<Record<string, unknown>>().notNull(),
    actualParameters: jsonb().$type<Record<string, unknown>>(),
    markState: text().notNull().default('planned'),
    markNote: text().notNull().default(''),
    markedAt: moment(),
    markedBy: uuid(),
    ...editVersion(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    unique('cell_address_unique').on(t.shopId, t.gridId, t.address),
    unique('cell_coupon_unique').on(t.shopId, t.couponId, t.id),
    foreignKey({ columns: [t.shopId, t.gridId], foreignColumns: [testGrid.shopId, testGrid.id], name: 'cell_grid_fk' }),
    foreignKey({ columns: [t.shopId, t.couponId], foreignColumns: [coupon.shopId, coupon.id], name: 'cell_coupon_fk' }),
    foreignKey({ columns: [t.shopId, t.markedBy], foreignColumns: [member.shopId, member.id], name: 'cell_marked_by_fk' }),
    check('cell_mark_state', sql`${t.markState} in ('planned','marked','differs','skipped')`),
    index('cell_coupon').on(t.shopId, t.couponId),
    shopPolicy('cell'),
  ],
);

/** One person's judgement of a cell. */
export const cellRating = pgTable(
  'cell_rating',
  {
    ...tenantKey(),
    cellId: uuid().notNull(),
    memberId: uuid().notNull(),
    rating: integer(),
    outcome: text(),
    tags: jsonb().$type<string[]>().notNull().default([]),
    note: text().notNull().default(''),
    ratedAt: moment().notNull().defaultNow(),
    ...editVersion(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    unique('cell_rating_person_unique').on(t.shopId, t.cellId, t.memberId),
    foreignKey({ columns: [t.shopId, t.cellId], foreignColumns: [cell.shopId, cell.id], name: 'cell_rating_cell_fk' }),
    foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id], name: 'cell_rating_member_fk' }),
    check('cell_rating_range', sql`${t.rating} between 0 and 5`),
    shopPolicy('cell_rating'),
  ],
);

/** A picture of a coupon; the stored master is what is measured and what "original" means. */
export const photo = pgTable(
  'photo',
  {
    ...tenantKey(),
    couponId: uuid().notNull(),
    state: text().notNull().default('processing'),
    refusedReason: text(),
    receivedKey: text(),
    receivedSha256: text().notNull(),
    receivedBytes: integer().notNull(),
    receivedType: text().notNull(),
    masterSha256: text(),
    masterBytes: integer(),
    largeSha256: text(),
    smallSha256: text(),
    widthPx: integer(),
    heightPx: integer(),
    colourProfile: text(),
    capturedAt: moment(),
    /** Four corners of the plate, clockwise from the origin mark, as fractions of the upright image. */
    corners: jsonb().$type<{ x: number; y: number }[]>(),
    cornersFoundBy: text(),
    lightNotes: text().notNull().default(''),
    flags: jsonb().$type<string[]>().notNull().default([]),
    processedAt: moment(),
    ...authorship(),
    ...editVersion(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    foreignKey({ columns: [t.shopId, t.couponId], foreignColumns: [coupon.shopId, coupon.id], name: 'photo_coupon_fk' }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'photo_author_fk' }),
    uniqueIndex('photo_bytes_unique').on(t.shopId, t.couponId, t.receivedSha256),
    check('photo_state', sql`${t.state} in ('uploading','processing','ready','refused')`),
    check('photo_corners_found_by', sql`${t.cornersFoundBy} in ('hand','marks','render')`),
    index('photo_coupon').on(t.shopId, t.couponId),
    shopPolicy('photo'),
  ],
);

/** A measured quantity of a cell with its method; corrected by a later row that supersedes it, never edited. */
export const measurement = pgTable(
  'measurement',
  {
    ...tenantKey(),
    cellId: uuid().notNull(),
    quantity: text().notNull(),
    value: doublePrecision(),
    grade: text(),
    unit: text().notNull(),
    method: text().notNull(),
    methodDetail: jsonb().$type<Record<string, unknown>>().notNull().default({}),
    instrument: text().notNull().default(''),
    photoId: uuid(),
    uncertainty: doublePrecision(),
    measuredAt: moment().notNull().defaultNow(),
    supersedesId: uuid(),
    reason: text().notNull().default(''),
    ...authorship(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    foreignKey({ columns: [t.shopId, t.cellId], foreignColumns: [cell.shopId, cell.id], name: 'measurement_cell_fk' }),
    foreignKey({ columns: [t.shopId, t.photoId], foreignColumns: [photo.shopId, photo.id], name: 'measurement_photo_fk' }),
    foreignKey({ columns: [t.shopId, t.supersedesId], foreignColumns: [t.shopId, t.id], name: 'measurement_supersedes_fk' }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'measurement_author_fk' }),
    uniqueIndex('measurement_superseded_once').on(t.shopId, t.supersedesId),
    check('measurement_method', sql`${t.method} in ('photo','colorimeter','profilometer','microscope','verifier','calliper','manual')`),
    check('measurement_has_result', sql`${t.value} is not null or ${t.grade} is not null`),
    index('measurement_cell').on(t.shopId, t.cellId),
    shopPolicy('measurement'),
  ],
);

/** What was found wrong with a sealed coupon, beside it, with a reason. */
export const couponCorrection = pgTable(
  'coupon_correction',
  { ...tenantKey(), couponId: uuid().notNull(), cellId: uuid(), text: text().notNull(), reason: text().notNull(), ...authorship() },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    foreignKey({ columns: [t.shopId, t.couponId], foreignColumns: [coupon.shopId, coupon.id], name: 'coupon_correction_coupon_fk' }),
    foreignKey({
      columns: [t.shopId, t.couponId, t.cellId],
      foreignColumns: [cell.shopId, cell.couponId, cell.id],
      name: 'coupon_correction_cell_fk',
    }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'coupon_correction_author_fk' }),
    shopPolicy('coupon_correction'),
  ],
);
