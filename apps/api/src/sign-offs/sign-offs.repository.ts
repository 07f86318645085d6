import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { Role } from '@proofplate/recipe-model';
import { and, asc, count, eq, inArray, ne, sql } from 'drizzle-orm';
import type { Recipient } from '../mail/mail-kinds';
import type { SignOffMeaning } from '../recipes/dto/sign-off.dto';
import type { Process } from './sign-offs.policy';

const { signOff, revision, member } = schema;

export type NewSignOff = {
  readonly revisionId: string;
  readonly memberId: string;
  readonly printedName: string;
  readonly role: Role;
  readonly meaning: SignOffMeaning;
  readonly comment: string;
  readonly contentHash: string;
  readonly ledgerHashBefore: string;
  readonly method: 'password' | 'session';
  readonly isByAuthor: boolean;
  readonly checks: unknown;
  readonly acknowledgedCautionIds: readonly string[];
};
export type QueueCursor = { readonly submittedAt: string; readonly id: string };

@Injectable()
export class SignOffsRepository {
  async insert(tx: Tx, shopId: string, { acknowledgedCautionIds, ...values }: NewSignOff): Promise<void> {
    await tx.insert(signOff).values({ shopId, ...values, acknowledgedCautionIds: [...acknowledgedCautionIds] });
  }

  /** Revisions in review, oldest first. */
  async queue(tx: Tx, shopId: string, { limit, after }: { limit: number; after?: QueueCursor }) {
    const isAfter =
      after === undefined
        ? undefined
        : sql`(${revision.submittedAt}, ${revision.id}) > (${after.submittedAt}::timestamptz, ${after.id}::uuid)`;
    return tx
      .select({ id: revision.id, submittedAt: sql<string>`${revision.submittedAt}::text` })
      .from(revision)
      .where(and(eq(revision.shopId, shopId), eq(revision.state, 'in_review'), isAfter))
      .orderBy(asc(revision.submittedAt), asc(revision.id))
      .limit(limit);
  }

  async countInReview(tx: Tx, shopId: string): Promise<number> {
    const [row] = await tx
      .select({ waiting: count() })
      .from(revision)
      .where(and(eq(revision.shopId, shopId), eq(revision.state, 'in_review')));
    return row?.waiting ?? 0;
  }

  /** Processes that a lead may sign for; null: all of them. */
  async signsFor(tx: Tx, shopId: string, memberId: string): Promise<readonly Process[] | null> {
    const [row] = await tx
      .select({ signsFor: member.signsFor })
      .from(member)
      .where(and(eq(member.shopId, shopId), eq(member.id, memberId)));
    return row?.signsFor ?? null;
  }

  /** Names and addresses of active members with one of the roles, but for one who knows already. */
  async recipients(tx: Tx, shopId: string, { roles, exceptId }: { roles: readonly Role[]; exceptId: string }): Promise<Recipient[]> {
    const rows = await tx
      .select({ id: member.id, name: member.printedName })
      .from(member)
      .where(and(eq(member.shopId, shopId), eq(member.state, 'active'), inArray(member.role, [...roles]), ne(member.id, exceptId)))
      .orderBy(asc(member.id));
    return this.addressed(tx, rows);
  }

  /** One member; nobody when the membership has ended. */
  async recipient(tx: Tx, shopId: string, memberId: string): Promise<Recipient[]> {
    const rows = await tx
      .select({ id: member.id, name: member.printedName })
      .from(member)
      .where(and(eq(member.shopId, shopId), eq(member.id, memberId), eq(member.state, 'active')));
    return this.addressed(tx, rows);
  }

  /** Addresses belong to people, not to shops; this function tells those of the transaction's shop. */
  private async addressed(tx: Tx, members: readonly { id: string; name: string }[]): Promise<Recipient[]> {
    const rows = await tx.execute<{ member_id: string; email: string }>(sql`select member_id, email from account_addresses_of_shop()`);
    const addresses = new Map(rows.map((row) => [row.member_id, row.email]));
    return members.flatMap(({ id, name }) => {
      const address = addresses.get(id);
      return address === undefined ? [] : [{ name, address }];
    });
  }
}
