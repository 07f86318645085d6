import { Injectable } from '@nestjs/common';
import { NotFoundError } from '../common/errors/domain-error';
import { newShopToken, shopOfToken, tokenHash } from '../common/opaque-token';
import { decodeCursor, type Page, PageQuery, pageOf } from '../common/pagination/page';
import { type Actor, type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { OutboxService } from '../mail/outbox.service';
import { ShopsService } from '../shops/shops.service';
import { CreateInvitationDto } from './dto/create-invitation.dto';
import { InvitationDto } from './dto/invitation.dto';
import { type InvitationRow, InvitationsRepository } from './invitations.repository';
import { AlreadyMemberError, InvitationNotUsableError } from './members.errors';
import { toInvitationDto } from './members.mapper';
import { MembersService } from './members.service';

export const INVITATION_LIVES_HOURS = 72;

@Injectable()
export class InvitationsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly repository: InvitationsRepository,
    private readonly members: MembersService,
    private readonly shops: ShopsService,
    private readonly ledger: LedgerService,
    private readonly outbox: OutboxService,
  ) {}

  /** Sends a link that works once, for 72 hours, for this address, shop and role. Inviting again makes earlier links useless. */
  async create(actor: Actor, { email, role }: CreateInvitationDto): Promise<InvitationDto> {
    const token = newShopToken(actor.shopId);
    return this.unitOfWork.run(actor, async (tx) => {
      if (await this.members.hasAddress(tx, actor.shopId, email)) throw new AlreadyMemberError();
      const { name: shopName } = await this.shops.getRow(tx, actor.shopId);
      const bound = { shopId: actor.shopId, email, role, createdBy: actor.memberId };
      const row = await this.repository.replaceOpen(tx, { ...bound, tokenHash: tokenHash(token), livesHours: INVITATION_LIVES_HOURS });
      const letter = { shopName, invitedBy: actor.printedName, role, token, expiresAt: row.expiresAt.toISOString() };
      await this.outbox.add(tx, { shopId: actor.shopId, kind: 'invitation', payload: { to: { name: '', address: email }, ...letter } });
      await this.ledger.record(tx, { actor, action: 'invitation.sent', ...subject(row), after: { email, role } });
      return toInvitationDto(row, { invitedBy: actor.printedName, isExpired: false }, actor);
    });
  }

  async list(actor: Actor, query: PageQuery): Promise<Page<InvitationDto>> {
    const [beforeId] = decodeCursor(query.cursor, ['id']) ?? [];
    const from = typeof beforeId === 'string' ? beforeId : undefined;
    const rows = await this.unitOfWork.read(actor, (tx) => this.repository.list(tx, actor.shopId, from, query.limit + 1));
    return pageOf(rows, query.limit, { item: ({ row, ...more }) => toInvitationDto(row, more, actor), cursor: ({ row }) => [row.id] });
  }

  async revoke(actor: Actor, id: string): Promise<void> {
    await this.unitOfWork.run(actor, async (tx) => {
      const found = await this.repository.find(tx, actor.shopId, id);
      if (found === undefined) throw new NotFoundError();
      if (!(await this.repository.revoke(tx, actor.shopId, id))) throw new InvitationNotUsableError();
      await this.ledger.record(tx, { actor, action: 'invitation.revoked', ...subject(found.row), before: { state: 'open' } });
    });
  }

  /** What the page shows before acceptance. @throws InvitationNotUsableError */
  async preview(
    token: string,
  ): Promise<{ readonly shopId: string; readonly email: string; readonly role: string; readonly shopName: string }> {
    const shopId = requireShop(token);
    const found = await this.unitOfWork.read({ shopId }, (tx) => this.repository.findUsable(tx, shopId, tokenHash(token)));
    if (found === undefined) throw new InvitationNotUsableError();
    return { shopId, email: found.row.email, role: found.row.role, shopName: found.shopName };
  }

  /** Takes the invitation in the caller's transaction; of two that come at once, one gets it. */
  async take(tx: Tx, token: string): Promise<InvitationRow> {
    const row = await this.repository.take(tx, requireShop(token), tokenHash(token));
    if (row === undefined) throw new InvitationNotUsableError();
    return row;
  }

  async noteMember(tx: Tx, invitation: InvitationRow, memberId: string): Promise<void> {
    await this.repository.setAcceptedMember(tx, invitation.shopId, invitation.id, memberId);
  }
}

function requireShop(token: string): string {
  const shopId = shopOfToken(token);
  if (shopId === undefined) throw new InvitationNotUsableError();
  return shopId;
}

const subject = (row: InvitationRow) => ({ subjectType: 'invitation', subjectId: row.id });
