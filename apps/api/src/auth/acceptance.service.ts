import { Injectable } from '@nestjs/common';
import { UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { InvitationsService } from '../members/invitations.service';
import { roleOf } from '../members/members.mapper';
import { MembersService } from '../members/members.service';
import type { Device } from './device.decorator';
import { AcceptInvitationDto, InvitationPreviewDto } from './dto/accept-invitation.dto';
import { PeopleService } from './people.service';
import { SessionsService, type SignedIn } from './sessions.service';

@Injectable()
export class AcceptanceService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly invitations: InvitationsService,
    private readonly members: MembersService,
    private readonly people: PeopleService,
    private readonly sessions: SessionsService,
    private readonly ledger: LedgerService,
  ) {}

  async preview(token: string): Promise<InvitationPreviewDto> {
    const { email, role, shopName } = await this.invitations.preview(token);
    return { shopName, email, role: roleOf(role), hasAccount: (await this.people.find(email)) !== undefined };
  }

  /** Makes whoever holds the link a member, under the invited address. Of two at once, one gets in. */
  async accept({ token, name, password }: AcceptInvitationDto, device: Device): Promise<SignedIn> {
    const { shopId, email } = await this.invitations.preview(token);
    const ready = await this.people.prepare({ email, password, ...(name === undefined ? {} : { name }) }, device);
    const { refreshToken, ...key } = await this.unitOfWork.run({ shopId }, async (tx) => {
      const invitation = await this.invitations.take(tx, token);
      const person = await ready.store(tx);
      const joining = { shopId, personId: person.id, role: roleOf(invitation.role), printedName: name ?? person.name };
      const member = await this.members.join(tx, joining);
      await this.invitations.noteMember(tx, invitation, member.id);
      const actor = { shopId, memberId: member.id, printedName: member.printedName };
      const after = { role: member.role, printedName: member.printedName, invitationId: invitation.id };
      await this.ledger.record(tx, { actor, action: 'member.joined', subjectType: 'member', subjectId: member.id, after });
      return this.sessions.open(tx, { personId: person.id, version: person.version, shopId, memberId: member.id, device });
    });
    return this.sessions.answer(key, refreshToken);
  }
}
