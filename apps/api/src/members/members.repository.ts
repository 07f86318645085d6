import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { Role } from '@proofplate/recipe-model';
import { and, eq, sql } from 'drizzle-orm';

const { effect, member } = schema;

export type MemberRow = typeof member.$inferSelect;
export type MemberChange = {
  readonly role?: Role;
  readonly printedName?: string;
  readonly signsFor?: { effectId: string; sourceKind: string }[] | null;
};
export type NewMember = {
  readonly id: string;
  readonly shopId: string;
  readonly personId: string;
  readonly role: Role;
  readonly printedName: string;
};

@Injectable()
export class MembersRepository {
  /** A removed member who comes back keeps the id, so that earlier signatures stay theirs. */
  async insertOrRestore(tx: Tx, row: NewMember): Promise<MemberRow | undefined> {
    const [stored] = await tx
      .insert(member)
      .values(row)
      .onConflictDoUpdate({
        target: [member.shopId, member.personId],
        set: { role: row.role, printedName: row.printedName, state: 'active', removedAt: null, version: sql`${member.version} + 1` },
        setWhere: eq(member.state, 'removed'),
      })
      .returning();
    return stored;
  }

  async find(tx: Tx, shopId: string, id: string): Promise<MemberRow | undefined> {
    const [row] = await tx
      .select()
      .from(member)
      .where(and(eq(member.shopId, shopId), eq(member.id, id)));
    return row;
  }

  /** Locks every active owner, in one order, so that two owners cannot remove each other at the same moment. */
  async lockOwners(tx: Tx, shopId: string): Promise<string[]> {
    const rows = await tx
      .select({ id: member.id })
      .from(member)
      .where(and(eq(member.shopId, shopId), eq(member.role, 'owner'), eq(member.state, 'active')))
      .orderBy(member.id)
      .for('update');
    return rows.map((row) => row.id);
  }

  async list(tx: Tx, shopId: string, page: { readonly state: string; readonly after?: readonly [string, string] }, limit: number) {
    const name = sql<string>`lower(${member.printedName})`;
    const [afterName, afterId] = page.after ?? [];
    const isAfter = afterName === undefined ? undefined : sql`(${name}, ${member.id}) > (${afterName}, ${afterId}::uuid)`;
    return tx
      .select({ row: member, sortName: name })
      .from(member)
      .where(and(eq(member.shopId, shopId), eq(member.state, page.state), isAfter))
      .orderBy(name, member.id)
      .limit(limit);
  }

  async listActive(tx: Tx, shopId: string): Promise<MemberRow[]> {
    return tx
      .select()
      .from(member)
      .where(and(eq(member.shopId, shopId), eq(member.state, 'active')))
      .orderBy(member.id);
  }

  /** Undefined when the version is no longer the present one. */
  async update(tx: Tx, key: { readonly shopId: string; readonly id: string; readonly version: number }, change: MemberChange) {
    const [row] = await tx
      .update(member)
      .set({ ...change, version: sql`${member.version} + 1` })
      .where(and(eq(member.shopId, key.shopId), eq(member.id, key.id), eq(member.version, key.version), eq(member.state, 'active')))
      .returning();
    return row;
  }

  /** False when the version is no longer the present one. */
  async markRemoved(tx: Tx, key: { readonly shopId: string; readonly id: string; readonly version: number }): Promise<boolean> {
    const rows = await tx
      .update(member)
      .set({ state: 'removed', removedAt: sql`now()`, version: sql`${member.version} + 1` })
      .where(and(eq(member.shopId, key.shopId), eq(member.id, key.id), eq(member.version, key.version), eq(member.state, 'active')))
      .returning({ id: member.id });
    return rows.length > 0;
  }

  /** Addresses of the people of the shop, by member. */
  async addresses(tx: Tx): Promise<ReadonlyMap<string, string>> {
    const rows = await tx.execute<{ member_id: string; email: string }>(sql`select member_id, email from account_addresses_of_shop()`);
    return new Map(rows.map((row) => [row.member_id, row.email]));
  }

  /** Effects of the shop by id, archived ones included: somebody may still be named for them. */
  async effectNames(tx: Tx, shopId: string): Promise<ReadonlyMap<string, string>> {
    const rows = await tx.select({ id: effect.id, name: effect.name }).from(effect).where(eq(effect.shopId, shopId));
    return new Map(rows.map(({ id, name }) => [id, name]));
  }

  async endSessions(tx: Tx, memberId: string, because: string): Promise<void> {
    await tx.execute(sql`select account_end_member_sessions(${memberId}::uuid, ${because}::text)`);
  }
}
