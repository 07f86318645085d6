import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { NotFoundError } from '../common/errors/domain-error';
import { UnitOfWork } from '../database/unit-of-work';
import { AccountsRepository, type OpenSession } from './accounts.repository';
import { CredentialsService } from './credentials.service';
import type { Device } from './device.decorator';
import { ChangePasswordDto, OpenSessionDto } from './dto/own-account.dto';
import { PasswordHasher } from './hashing/password-hasher';

/** What signed-in people do with their own account: password and the devices they are signed in on. */
@Injectable()
export class OwnAccountService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly accounts: AccountsRepository,
    private readonly credentials: CredentialsService,
    private readonly hasher: PasswordHasher,
  ) {}

  /** Every other device is signed out at once; this one stays. @throws PasswordNotConfirmedError, TooManyError */
  async changePassword(actor: Actor, { password, newPassword }: ChangePasswordDto, { address }: Device): Promise<void> {
    await this.credentials.confirm(actor, password);
    const passwordHash = await this.hasher.hash(newPassword);
    await this.unitOfWork.outsideShop(async (db) => {
      await this.accounts.changePassword(db, { personId: actor.personId, passwordHash, keptSessionId: actor.sessionId });
      await this.accounts.recordEvent(db, { personId: actor.personId, kind: 'password changed', address });
    });
  }

  async listSessions(actor: Actor): Promise<OpenSessionDto[]> {
    return this.unitOfWork.outsideShop(async (db) => {
      const memberships = await this.accounts.memberships(db, actor.personId);
      const shopNames = new Map(memberships.map(({ shopId, shopName }) => [shopId, shopName]));
      const sessions = await this.accounts.openSessions(db, actor.personId);
      return sessions.map((session) => toOpenSessionDto(session, shopNames, actor.sessionId));
    });
  }

  /** @throws NotFoundError also for a session of somebody else */
  async endSession(actor: Actor, sessionId: string, { address }: Device): Promise<void> {
    await this.unitOfWork.outsideShop(async (db) => {
      const hasEnded = await this.accounts.endOwnSession(db, actor.personId, sessionId, 'ended by the person');
      if (!hasEnded) throw new NotFoundError('This device is signed out already.');
      await this.accounts.recordEvent(db, { personId: actor.personId, kind: 'session ended', address, detail: { sessionId } });
    });
  }
}

function toOpenSessionDto(session: OpenSession, shopNames: ReadonlyMap<string, string>, currentId: string): OpenSessionDto {
  return {
    id: session.id,
    isCurrent: session.id === currentId,
    shopName: shopNames.get(session.shopId ?? '') ?? null,
    userAgent: session.userAgent,
    startedAt: asIso(session.createdAt),
    lastSeenAt: asIso(session.lastSeenAt),
    expiresAt: asIso(session.expiresAt),
  };
}

const asIso = (text: string) => new Date(text).toISOString();
