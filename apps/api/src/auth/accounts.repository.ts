import { Injectable } from '@nestjs/common';
import { sql } from 'drizzle-orm';
import type { Executor } from '../database/unit-of-work';

export type Person = {
  readonly id: string;
  readonly email: string;
  readonly name: string;
  readonly passwordHash: string;
  readonly sessionVersion: number;
};
export type Membership = {
  readonly shopId: string;
  readonly shopName: string;
  readonly memberId: string;
  readonly role: string;
  readonly printedName: string;
};
export type LiveSession = {
  readonly personId: string;
  readonly email: string;
  readonly personName: string;
  readonly shopId: string;
  readonly memberId: string;
  readonly role: string;
  readonly printedName: string;
};
export type Rotation = {
  readonly outcome: 'rotated' | 'grace' | 'reused' | 'over' | 'unknown';
  readonly sessionId: string;
  readonly personId: string;
  readonly sessionVersion: number;
  readonly sealedSuccessor: string | null;
};
export type OpenSession = {
  readonly id: string;
  readonly shopId: string | null;
  readonly userAgent: string | null;
  /** ISO 8601, as the driver gives times of functions as text. */
  readonly createdAt: string;
  readonly lastSeenAt: string;
  readonly expiresAt: string;
};
export type AccountEvent = {
  readonly personId?: string;
  readonly kind: string;
  readonly address: string;
  readonly detail?: Readonly<Record<string, unknown>>;
};
export type NewSession = {
  readonly sessionId: string;
  readonly personId: string;
  readonly shopId: string;
  readonly memberId: string;
  readonly userAgent: string | undefined;
  readonly tokenHash: string;
  readonly livesHours: number;
  readonly idleHours: number;
};

const hours = (count: number) => sql`make_interval(hours => ${count}::int)`;
const seconds = (count: number) => sql`make_interval(secs => ${count}::int)`;

/** People and sessions, through the narrow functions of the database; the api has no right on the tables. */
@Injectable()
export class AccountsRepository {
  async findPersonByEmail(db: Executor, email: string): Promise<Person | undefined> {
    const [row] = await db.execute<Person>(sql`select id, email, name, password_hash as "passwordHash",
      session_version as "sessionVersion" from account_person_by_email(${email}::text)`);
    return row;
  }

  async findPerson(db: Executor, personId: string): Promise<Person | undefined> {
    const [row] = await db.execute<Person>(sql`select id, email, name, password_hash as "passwordHash",
      session_version as "sessionVersion" from account_person(${personId}::uuid)`);
    return row;
  }

  /** False when the address is taken. */
  async createPerson(db: Executor, person: Omit<Person, 'sessionVersion'>): Promise<boolean> {
    const [row] = await db.execute<{ created: boolean }>(
      sql`select account_create_person(${person.id}::uuid, ${person.email}::text, ${person.name}::text, ${person.passwordHash}::text) as created`,
    );
    return row?.created === true;
  }

  async rehash(db: Executor, personId: string, oldHash: string, newHash: string): Promise<void> {
    await db.execute(sql`select account_rehash(${personId}::uuid, ${oldHash}::text, ${newHash}::text)`);
  }

  async memberships(db: Executor, personId: string): Promise<Membership[]> {
    return [
      ...(await db.execute<Membership>(sql`select shop_id as "shopId", shop_name as "shopName", member_id as "memberId", role,
        printed_name as "printedName" from account_memberships(${personId}::uuid)`)),
    ];
  }

  async openSession(db: Executor, session: NewSession): Promise<void> {
    await db.execute(sql`select account_open_session(${session.sessionId}::uuid, ${session.personId}::uuid, ${session.shopId}::uuid,
      ${session.memberId}::uuid, ${session.userAgent ?? null}::text, ${session.tokenHash}::text,
      ${hours(session.livesHours)}, ${hours(session.idleHours)})`);
  }

  /** Who stands behind a session now; undefined when it is over in any way. */
  async findLiveSession(db: Executor, sessionId: string, version: number): Promise<LiveSession | undefined> {
    const [row] = await db.execute<LiveSession>(sql`select person_id as "personId", email, person_name as "personName",
      shop_id as "shopId", member_id as "memberId", role, printed_name as "printedName"
      from account_session(${sessionId}::uuid, ${version}::int)`);
    return row;
  }

  async rotate(
    db: Executor,
    use: { readonly hash: string; readonly newHash: string; readonly sealed: string; readonly idleHours: number; readonly graceS: number },
  ): Promise<Rotation> {
    const [row] = await db.execute<Rotation>(sql`select outcome, session_id as "sessionId", person_id as "personId",
      session_version as "sessionVersion", sealed_successor as "sealedSuccessor"
      from account_rotate(${use.hash}::text, ${use.newHash}::text, ${use.sealed}::text, ${hours(use.idleHours)}, ${seconds(use.graceS)})`);
    if (row === undefined) throw new Error('the rotation gave no outcome');
    return row;
  }

  async findSessionOfToken(db: Executor, hash: string): Promise<{ sessionId: string; personId: string } | undefined> {
    const [row] = await db.execute<{ sessionId: string; personId: string }>(
      sql`select session_id as "sessionId", person_id as "personId" from account_session_of_token(${hash}::text)`,
    );
    return row;
  }

  async endSession(db: Executor, sessionId: string, because: string): Promise<void> {
    await db.execute(sql`select account_end_session(${sessionId}::uuid, ${because}::text)`);
  }

  async endAllSessions(db: Executor, personId: string, because: string): Promise<void> {
    await db.execute(sql`select account_end_all_sessions(${personId}::uuid, ${because}::text)`);
  }

  /** Where the person is signed in, the latest use first. */
  async openSessions(db: Executor, personId: string): Promise<OpenSession[]> {
    return [
      ...(await db.execute<OpenSession>(sql`select id, shop_id as "shopId", user_agent as "userAgent", created_at as "createdAt",
        last_seen_at as "lastSeenAt", expires_at as "expiresAt" from account_live_sessions(${personId}::uuid)`)),
    ];
  }

  /** False when the person has no such open session. */
  async endOwnSession(db: Executor, personId: string, sessionId: string, because: string): Promise<boolean> {
    const [row] = await db.execute<{ ended: boolean }>(
      sql`select account_end_own_session(${personId}::uuid, ${sessionId}::uuid, ${because}::text) as ended`,
    );
    return row?.ended === true;
  }

  /** Sets the password and ends every session but one. */
  async changePassword(db: Executor, change: { personId: string; passwordHash: string; keptSessionId: string }): Promise<void> {
    await db.execute(
      sql`select account_change_password(${change.personId}::uuid, ${change.passwordHash}::text, ${change.keptSessionId}::uuid)`,
    );
  }

  async openReset(db: Executor, hash: string, personId: string, livesMinutes: number): Promise<void> {
    await db.execute(sql`select account_open_reset(${hash}::text, ${personId}::uuid, make_interval(mins => ${livesMinutes}::int))`);
  }

  /** The person whose password was set; undefined when the link cannot be used. */
  async resetPassword(db: Executor, hash: string, passwordHash: string): Promise<string | undefined> {
    const [row] = await db.execute<{ person: string | null }>(
      sql`select account_reset_password(${hash}::text, ${passwordHash}::text) as person`,
    );
    return row?.person ?? undefined;
  }

  async recordEvent(db: Executor, event: AccountEvent): Promise<void> {
    const detail = event.detail === undefined ? null : JSON.stringify(event.detail);
    await db.execute(
      sql`select account_record_event(${event.personId ?? null}::uuid, ${event.kind}::text, ${plainAddress(event.address)}::text, ${detail}::text::jsonb)`,
    );
  }
}

/** PostgreSQL's inet knows no zone such as %eth0. */
const plainAddress = (address: string) => address.replace(/%.*$/, '');
