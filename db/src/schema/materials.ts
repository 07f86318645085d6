import { sql } from 'drizzle-orm';
import { boolean, check, doublePrecision, foreignKey, index, jsonb, pgTable, primaryKey, text, unique, uuid } from 'drizzle-orm/pg-core';
import { authorship, editVersion, moment, shopPolicy, tenantKey } from '../columns';
import { member } from './people';
import { shop } from './shops';

export const material = pgTable(
  'material',
  {
    ...tenantKey(),
    name: text().notNull(),
    /** Key of the closed list of families; 'unknown' asks for the safety data sheet. */
    family: text().notNull(),
    grade: text().notNull().default(''),
    standardDesignation: text().notNull().default(''),
    supplier: text().notNull().default(''),
    thicknessMm: doublePrecision(),
    /** Conductivity, density, heat capacity, each with its source. */
    properties: jsonb().$type<Record<string, { value: number; unit: string; source: string }>>().notNull().default({}),
    notes: text().notNull().default(''),
    archivedAt: moment(),
    ...authorship(),
    ...editVersion(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    unique('material_name_unique').on(t.shopId, t.name),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'material_author_fk' }),
    index('material_family').on(t.shopId, t.family),
    shopPolicy('material'),
  ],
);

export const finish = pgTable(
  'finish',
  {
    ...tenantKey(),
    name: text().notNull(),
    preparation: text().notNull().default(''),
    treatment: text().notNull().default(''),
    archivedAt: moment(),
    ...authorship(),
    ...editVersion(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    unique('finish_name_unique').on(t.shopId, t.name),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'finish_author_fk' }),
    shopPolicy('finish'),
  ],
);

/** Materials that one approval may cover, named one by one. */
export const materialGroup = pgTable(
  'material_group',
  { ...tenantKey(), name: text().notNull(), ...authorship(), ...editVersion() },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    unique('material_group_name_unique').on(t.shopId, t.name),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'material_group_author_fk' }),
    shopPolicy('material_group'),
  ],
);

export const materialGroupMaterial = pgTable(
  'material_group_material',
  { shopId: uuid().notNull(), materialGroupId: uuid().notNull(), materialId: uuid().notNull() },
  (t) => [
    primaryKey({ columns: [t.shopId, t.materialGroupId, t.materialId] }),
    foreignKey({
      columns: [t.shopId, t.materialGroupId],
      foreignColumns: [materialGroup.shopId, materialGroup.id],
      name: 'material_group_material_group_fk',
    }),
    foreignKey({
      columns: [t.shopId, t.materialId],
      foreignColumns: [material.shopId, material.id],
      name: 'material_group_material_material_fk',
    }),
    shopPolicy('material_group_material'),
  ],
);

export const effect = pgTable(
  'effect',
  {
    ...tenantKey(),
    name: text().notNull(),
    /** Key of a shipped effect, or one of the shop's own; cautions refer to it. */
    key: text().notNull(),
    criteria: jsonb().$type<CriterionRow[]>().notNull().default([]),
    notes: text().notNull().default(''),
    archivedAt: moment(),
    createdAt: moment().notNull().defaultNow(),
    createdBy: uuid(),
    ...editVersion(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    unique('effect_name_unique').on(t.shopId, t.name),
    unique('effect_key_unique').on(t.shopId, t.key),
    foreignKey({ columns: [t.shopId], foreignColumns: [shop.id], name: 'effect_shop_fk' }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'effect_author_fk' }),
    shopPolicy('effect'),
  ],
);

/** A prompt beside a setting, with its source; `never` refuses planning, drafting and running. */
export const caution = pgTable(
  'caution',
  {
    ...tenantKey(),
    level: text().notNull(),
    /** What to do, first; then why. */
    subject: text().notNull(),
    text: text().notNull(),
    source: text().notNull(),
    /** Key of the shipped caution; shipped ones may be tightened, never removed. */
    shippedKey: text(),
    appliesTo: jsonb().$type<CautionScopeRow>().notNull(),
    isActive: boolean().notNull().default(true),
    createdAt: moment().notNull().defaultNow(),
    createdBy: uuid(),
    ...editVersion(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    unique('caution_shipped_key_unique').on(t.shopId, t.shippedKey),
    foreignKey({ columns: [t.shopId], foreignColumns: [shop.id], name: 'caution_shop_fk' }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'caution_author_fk' }),
    check('caution_level', sql`${t.level} in ('never','care')`),
    shopPolicy('caution'),
  ],
);

/** An acceptance criterion; `upper` belongs to 'between'. */
export type CriterionRow = { quantity: string; comparison: string; value: number; upper?: number; unit: string };

/** Every condition that is given must hold; an empty scope holds always. */
export type CautionScopeRow = {
  families?: string[];
  materialIds?: string[];
  finishIds?: string[];
  sourceKinds?: string[];
  effectKeys?: string[];
  roundPart?: boolean;
};
