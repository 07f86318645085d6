import { sql } from 'drizzle-orm';
import {
  check,
  date,
  doublePrecision,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { authorship, editVersion, moment, shopPolicy, tenantKey } from '../columns';
import { member } from './people';

const SOURCE_KINDS = sql.raw(`('fibre-q-switched','fibre-mopa','co2','uv','green','diode','ultrafast')`);

export const lens = pgTable(
  'lens',
  {
    ...tenantKey(),
    name: text().notNull(),
    focalLengthMm: doublePrecision().notNull(),
    fieldSizeMm: doublePrecision().notNull(),
    notes: text().notNull().default(''),
    archivedAt: moment(),
    ...authorship(),
    ...editVersion(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    unique('lens_name_unique').on(t.shopId, t.name),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'lens_author_fk' }),
    check('lens_lengths', sql`${t.focalLengthMm} > 0 and ${t.fieldSizeMm} > 0`),
    shopPolicy('lens'),
  ],
);

export const machine = pgTable(
  'machine',
  {
    ...tenantKey(),
    name: text().notNull(),
    sourceKind: text().notNull(),
    serialNumber: text().notNull().default(''),
    warmUpMinutes: integer().notNull().default(0),
    mountedLensId: uuid(),
    /** Number of the profile in force; earlier ones stay. */
    profileNumber: integer().notNull().default(1),
    archivedAt: moment(),
    ...authorship(),
    ...editVersion(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    unique('machine_name_unique').on(t.shopId, t.name),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'machine_author_fk' }),
    foreignKey({ columns: [t.shopId, t.mountedLensId], foreignColumns: [lens.shopId, lens.id], name: 'machine_mounted_lens_fk' }),
    check('machine_source_kind', sql`${t.sourceKind} in ${SOURCE_KINDS}`),
    shopPolicy('machine'),
  ],
);

/**
 * What the machine is (physical: counts for evidence) and what its control shows (panel: doesn't). Never changed: an edit adds the
 * next number; physicalNumber rises only when the physical part changed.
 */
export const machineProfile = pgTable(
  'machine_profile',
  {
    ...tenantKey(),
    machineId: uuid().notNull(),
    number: integer().notNull(),
    physicalNumber: integer().notNull(),
    sourceKind: text().notNull(),
    physical: jsonb().$type<Record<string, unknown>>().notNull(),
    panel: jsonb().$type<Record<string, unknown>>().notNull(),
    ...authorship(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    unique('machine_profile_number_unique').on(t.shopId, t.machineId, t.number),
    foreignKey({ columns: [t.shopId, t.machineId], foreignColumns: [machine.shopId, machine.id], name: 'machine_profile_machine_fk' }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'machine_profile_author_fk' }),
    shopPolicy('machine_profile'),
  ],
);

/** A lens on a machine: working distance, how focus is found, the spot where somebody measured one. */
export const machineLens = pgTable(
  'machine_lens',
  {
    ...tenantKey(),
    machineId: uuid().notNull(),
    lensId: uuid().notNull(),
    workingDistanceMm: doublePrecision(),
    focusMethod: text().notNull().default(''),
    measuredSpotUm: doublePrecision(),
    spotMethod: text(),
    spotMeasuredOn: date(),
    ...authorship(),
    ...editVersion(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    unique('machine_lens_pair_unique').on(t.shopId, t.machineId, t.lensId),
    foreignKey({ columns: [t.shopId, t.machineId], foreignColumns: [machine.shopId, machine.id], name: 'machine_lens_machine_fk' }),
    foreignKey({ columns: [t.shopId, t.lensId], foreignColumns: [lens.shopId, lens.id], name: 'machine_lens_lens_fk' }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'machine_lens_author_fk' }),
    shopPolicy('machine_lens'),
  ],
);

/** A dated percent → watt table from a power meter. Never changed: a new reading is a new table. */
export const powerCalibration = pgTable(
  'power_calibration',
  {
    ...tenantKey(),
    machineId: uuid().notNull(),
    measuredOn: date().notNull(),
    meter: text().notNull(),
    meterDueOn: date(),
    wavelengthNm: doublePrecision().notNull(),
    frequencyKhz: doublePrecision(),
    pulseWidthNs: doublePrecision(),
    points: jsonb().$type<{ percent: number; watts: number }[]>().notNull(),
    notes: text().notNull().default(''),
    ...authorship(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    foreignKey({ columns: [t.shopId, t.machineId], foreignColumns: [machine.shopId, machine.id], name: 'power_calibration_machine_fk' }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'power_calibration_author_fk' }),
    index('power_calibration_machine').on(t.shopId, t.machineId, t.measuredOn),
    shopPolicy('power_calibration'),
  ],
);
