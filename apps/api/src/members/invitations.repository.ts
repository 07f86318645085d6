import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { Role } from '@proofplate/recipe-model';
import { and, desc, eq, lt, sql } from 'drizzle-orm';

const { invitation, member, shop } = schema;

export type InvitationRow = typeof invitation.$inferSelect;
export type ListedInvitation = { readonly row: InvitationRow; readonly invitedBy: string; readonly isExpired: boolean };
export type NewInvitation = {
  readonly shopId: string;
  readonly email: string;
  readonly role: Role;
  readonly tokenHash: string;
  readonly createdBy: string;
  readonly livesHours: number;
};

@Injectable()
export class InvitationsRepository {
  /** An earlier invitation of the same address is taken back: only the newest link works. */
  async replaceOpen(tx: Tx, { livesHours, ...row }: NewInvitation): Promise<InvitationRow> {
    await tx
      .update(invitation)
      .set({ state: 'revoked' })
      .where(
        and(eq(invitation.shopId, row.shopId), eq(sql`lower(${invitation.email})`, row.email.toLowerCase()), eq(invitation.state, 'open')),
      );
    const [stored] = await tx
      .insert(invitation)
      .values({ ...row, expiresAt: sql`now() + make_interval(hours => ${livesHours}::int)` })
      .returning();
    if (stored === undefined) throw new Error('the invitation was not stored');
    return stored;
  }

  async list(tx: Tx, shopId: string, beforeId: string | undefined, limit: number): Promise<ListedInvitation[]> {
    return this.listed(tx)
      .where(and(eq(invitation.shopId, shopId), beforeId === undefined ? undefined : lt(invitation.id, beforeId)))
      .orderBy(desc(invitation.id))
      .limit(limit);
  }

  async find(tx: Tx, shopId: string, id: string): Promise<ListedInvitation | undefined> {
    const [row] = await this.listed(tx).where(and(eq(invitation.shopId, shopId), eq(invitation.id, id)));
    return row;
  }

  /** An invitation that can still be accepted, with the shop's name. */
  async findUsable(tx: Tx, shopId: string, tokenHash: string): Promise<{ row: InvitationRow; shopName: string } | undefined> {
    const [found] = await tx
      .select({ row: invitation, shopName: shop.name })
      .from(invitation)
      .innerJoin(shop, eq(shop.id, invitation.shopId))
      .where(isUsable(shopId, tokenHash));
    return found;
  }

  /** Takes the invitation; undefined when another request took it first. The row lock makes two of them wait for each other. */
  async take(tx: Tx, shopId: string, tokenHash: string): Promise<InvitationRow | undefined> {
    const [row] = await tx
      .update(invitation)
      .set({ state: 'accepted', acceptedAt: sql`now()` })
      .where(isUsable(shopId, tokenHash))
      .returning();
    return row;
  }

  async setAcceptedMember(tx: Tx, shopId: string, id: string, memberId: string): Promise<void> {
    await tx
      .update(invitation)
      .set({ acceptedMemberId: memberId })
      .where(and(eq(invitation.shopId, shopId), eq(invitation.id, id)));
  }

  async revoke(tx: Tx, shopId: string, id: string): Promise<boolean> {
    const rows = await tx
      .update(invitation)
      .set({ state: 'revoked' })
      .where(and(eq(invitation.shopId, shopId), eq(invitation.id, id), eq(invitation.state, 'open')))
      .returning({ id: invitation.id });
    return rows.length > 0;
  }

  private listed(tx: Tx) {
    return tx
      .select({ row: invitation, invitedBy: member.printedName, isExpired: sql<boolean>`${invitation.expiresAt} <= now()` })
      .from(invitation)
      .innerJoin(member, and(eq(member.shopId, invitation.shopId), eq(member.id, invitation.createdBy)));
  }
}

const isUsable = (shopId: string, tokenHash: string) =>
  and(
    eq(invitation.shopId, shopId),
    eq(invitation.tokenHash, tokenHash),
    eq(invitation.state, 'open'),
    sql`${invitation.expiresAt} > now()`,
  );
