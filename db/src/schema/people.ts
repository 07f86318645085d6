import { sql } from 'drizzle-orm';
import { check, foreignKey, index, inet, integer, jsonb, pgTable, primaryKey, text, unique, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import { uuidv7 } from 'uuidv7';
import { authorship, editVersion, moment, shopPolicy, tenantKey } from '../columns';
import { shop } from './shops';

const ROLES = sql.raw(`('trainee','operator','lead','owner')`);

/** Somebody who signs in. Known before any shop is; ids and addresses are never reused. */
export const person = pgTable(
  'person',
  {
    id: uuid()
      .primaryKey()
      .$defaultFn(() => uuidv7()),
    email: text().notNull(),
    name: text().notNull(),
    passwordHash: text().notNull(),
    passwordChangedAt: moment().notNull().defaultNow(),
    /** Raised to end every session at once. */
    sessionVersion: integer().notNull().default(1),
    createdAt: moment().notNull().defaultNow(),
  },
  (t) => [uniqueIndex('person_email_unique').on(sql`lower(${t.email})`)],
);

/** A signed-in device: one family of refresh tokens. */
export const session = pgTable(
  'session',
  {
    id: uuid()
      .primaryKey()
      .$defaultFn(() => uuidv7()),
    personId: uuid()
      .notNull()
      .references(() => person.id),
    shopId: uuid(),
    memberId: uuid(),
    userAgent: text(),
    createdAt: moment().notNull().defaultNow(),
    lastSeenAt: moment().notNull().defaultNow(),
    expiresAt: moment().notNull(),
    endedAt: moment(),
    endedBecause: text(),
  },
  (t) => [index('session_person').on(t.personId)],
);

/** SHA-256 of an opaque refresh token; each use makes the successor. */
export const refreshToken = pgTable(
  'refresh_token',
  {
    tokenHash: text().primaryKey(),
    sessionId: uuid()
      .notNull()
      .references(() => session.id),
    /** Encrypted successor, kept for the grace time only, so that two tabs get the same one. */
    successor: text(),
    usedAt: moment(),
    createdAt: moment().notNull().defaultNow(),
    expiresAt: moment().notNull(),
  },
  (t) => [index('refresh_token_session').on(t.sessionId)],
);

export const passwordReset = pgTable('password_reset', {
  tokenHash: text().primaryKey(),
  personId: uuid()
    .notNull()
    .references(() => person.id),
  createdAt: moment().notNull().defaultNow(),
  expiresAt: moment().notNull(),
  usedAt: moment(),
});

/** Failed tries per account or address, shared by all replicas. */
export const signInThrottle = pgTable('sign_in_throttle', {
  subject: text().primaryKey(),
  failures: integer().notNull().default(0),
  consecutiveFailures: integer().notNull().default(0),
  windowStartedAt: moment().notNull().defaultNow(),
  blockedUntil: moment(),
});

/** Account events (failed sign-in, reset, reuse of a token): append-only, before any shop is known. */
export const accountEvent = pgTable(
  'account_event',
  {
    id: uuid()
      .primaryKey()
      .$defaultFn(() => uuidv7()),
    at: moment().notNull().defaultNow(),
    personId: uuid(),
    kind: text().notNull(),
    address: inet(),
    detail: jsonb().$type<Record<string, unknown>>(),
  },
  (t) => [index('account_event_person').on(t.personId, t.at)],
);

/** A person in a shop, with one role. */
export const member = pgTable(
  'member',
  {
    ...tenantKey(),
    personId: uuid()
      .notNull()
      .references(() => person.id),
    role: text().notNull(),
    printedName: text().notNull(),
    state: text().notNull().default('active'),
    /** Processes (effect × source kind) that this lead may sign for; null: all of them. */
    signsFor: jsonb().$type<{ effectId: string; sourceKind: string }[] | null>(),
    createdAt: moment().notNull().defaultNow(),
    removedAt: moment(),
    ...editVersion(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    foreignKey({ columns: [t.shopId], foreignColumns: [shop.id], name: 'member_shop_fk' }),
    unique('member_person_unique').on(t.shopId, t.personId),
    check('member_role', sql`${t.role} in ${ROLES}`),
    check('member_state', sql`${t.state} in ('active','removed')`),
    index('member_person').on(t.personId),
    shopPolicy('member'),
  ],
);

/** What a member was taught, by whom, until when. */
export const trainingRecord = pgTable(
  'training_record',
  {
    ...tenantKey(),
    memberId: uuid().notNull(),
    subject: text().notNull(),
    taughtBy: text().notNull(),
    taughtOn: moment().notNull(),
    expiresOn: moment(),
    ...authorship(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    foreignKey({ columns: [t.shopId, t.memberId], foreignColumns: [member.shopId, member.id], name: 'training_record_member_fk' }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'training_record_author_fk' }),
    shopPolicy('training_record'),
  ],
);

/** An invitation by mail, bound to an address, a shop and a role. Only the token's hash is kept. */
export const invitation = pgTable(
  'invitation',
  {
    ...tenantKey(),
    email: text().notNull(),
    role: text().notNull(),
    tokenHash: text().notNull(),
    state: text().notNull().default('open'),
    expiresAt: moment().notNull(),
    ...authorship(),
    acceptedAt: moment(),
    acceptedMemberId: uuid(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'invitation_author_fk' }),
    unique('invitation_token_unique').on(t.shopId, t.tokenHash),
    uniqueIndex('invitation_open_unique').on(t.shopId, sql`lower(${t.email})`).where(sql`${t.state} = 'open'`),
    index('invitation_token').on(t.tokenHash),
    check('invitation_role', sql`${t.role} in ${ROLES}`),
    check('invitation_state', sql`${t.state} in ('open','accepted','revoked')`),
    shopPolicy('invitation'),
  ],
);
