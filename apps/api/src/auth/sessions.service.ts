import { Injectable, Logger } from '@nestjs/common';
import { uuidv7 } from 'uuidv7';
import { newOpaqueToken, tokenHash } from '../common/opaque-token';
import { Env } from '../config/env.validation';
import { type Actor, type Executor, UnitOfWork } from '../database/unit-of-work';
import { roleOf } from '../members/members.mapper';
import { toShopSummary } from '../shops/shops.mapper';
import { ShopsService } from '../shops/shops.service';
import { AccessTokens } from './access-tokens';
import { AccountsRepository, type LiveSession } from './accounts.repository';
import { SessionOverError } from './auth.errors';
import type { Device } from './device.decorator';
import { SessionDto, SignedInDto } from './dto/session.dto';
import { openToken, sealToken } from './sealed-token';

/** A session ends after thirty days, or after a week in which nobody used it. */
export const SESSION_LIVES_HOURS = 30 * 24;
const SESSION_IDLE_HOURS = 7 * 24;
/** Two tabs or a double click use one token twice within a moment: both get the same successor. */
export const ROTATION_GRACE_S = 10;

export type SessionKey = { readonly personId: string; readonly sessionId: string; readonly version: number };
/** What the browser gets: the answer's body, and the refresh token for the cookie. */
export type SignedIn = { readonly body: SignedInDto; readonly refreshToken: string };
export type Opening = {
  readonly personId: string;
  readonly version: number;
  readonly shopId: string;
  readonly memberId: string;
  readonly device: Device;
};

@Injectable()
export class SessionsService {
  private readonly logger = new Logger(SessionsService.name);

  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly accounts: AccountsRepository,
    private readonly accessTokens: AccessTokens,
    private readonly shops: ShopsService,
    private readonly env: Env,
  ) {}

  /** Begins a session, in the caller's transaction where there is one. */
  async open(db: Executor, opening: Opening): Promise<SessionKey & { readonly refreshToken: string }> {
    const [sessionId, refreshToken] = [uuidv7(), newOpaqueToken()];
    const { personId, version, shopId, memberId, device } = opening;
    const lives = { livesHours: SESSION_LIVES_HOURS, idleHours: SESSION_IDLE_HOURS };
    const row = { sessionId, personId, shopId, memberId, userAgent: device.userAgent, tokenHash: tokenHash(refreshToken), ...lives };
    await this.accounts.openSession(db, row);
    await this.accounts.recordEvent(db, { personId, kind: 'signed in', address: device.address, detail: { sessionId } });
    return { personId, sessionId, version, refreshToken };
  }

  /** The answer to whoever just signed in or refreshed. */
  async answer(key: SessionKey, refreshToken: string): Promise<SignedIn> {
    const session = await this.describe(key);
    return { body: { ...session, ...(await this.accessTokens.mint(key)) }, refreshToken };
  }

  /** @throws SessionOverError when it ended in the meantime */
  async describe({ sessionId, version }: Pick<SessionKey, 'sessionId' | 'version'>): Promise<SessionDto> {
    const live = await this.unitOfWork.outsideShop((db) => this.accounts.findLiveSession(db, sessionId, version));
    if (live === undefined) throw new SessionOverError();
    return this.toSession(live);
  }

  /** The session of a request that has passed the guard. */
  async describeActor(actor: Actor): Promise<SessionDto> {
    const person = await this.unitOfWork.outsideShop((db) => this.accounts.findPerson(db, actor.personId));
    if (person === undefined) throw new SessionOverError();
    return this.toSession({ ...actor, email: person.email, personName: person.name });
  }

  private async toSession(live: LiveSession): Promise<SessionDto> {
    const [shop, memberships] = await Promise.all([
      this.unitOfWork.read({ shopId: live.shopId }, (tx) => this.shops.getRow(tx, live.shopId)),
      this.unitOfWork.outsideShop((db) => this.accounts.memberships(db, live.personId)),
    ]);
    return {
      person: { id: live.personId, name: live.personName, email: live.email },
      member: { id: live.memberId, role: roleOf(live.role), printedName: live.printedName },
      shop: toShopSummary(shop),
      shops: memberships.map((one) => ({ id: one.shopId, name: one.shopName, role: roleOf(one.role) })),
    };
  }

  /** The member behind an access token, as the database knows them now. @throws SessionOverError */
  async actorOf(accessToken: string): Promise<Actor> {
    const { personId, sessionId, version } = await this.accessTokens.verify(accessToken);
    const live = await this.unitOfWork.outsideShop((db) => this.accounts.findLiveSession(db, sessionId, version));
    if (live === undefined || live.personId !== personId) throw new SessionOverError();
    return toActor(live, sessionId);
  }

  /** Uses a refresh token once. An old one that comes back later means that somebody copied it: the session ends for everybody. */
  async refresh(refreshToken: string, device: Device): Promise<SignedIn> {
    const successor = newOpaqueToken();
    const rotation = await this.unitOfWork.outsideShop((db) =>
      this.accounts.rotate(db, {
        hash: tokenHash(refreshToken),
        newHash: tokenHash(successor),
        sealed: sealToken(successor, refreshToken, this.env.URL_SIGNING_SECRET),
        idleHours: SESSION_IDLE_HOURS,
        graceS: ROTATION_GRACE_S,
      }),
    );
    const key = { personId: rotation.personId, sessionId: rotation.sessionId, version: rotation.sessionVersion };
    if (rotation.outcome === 'rotated') return this.answer(key, successor);
    if (rotation.outcome === 'grace' && rotation.sealedSuccessor !== null)
      return this.answer(key, openToken(rotation.sealedSuccessor, refreshToken, this.env.URL_SIGNING_SECRET));
    if (rotation.outcome === 'reused') await this.noteReuse(key, device);
    throw new SessionOverError();
  }

  async signOut(refreshToken: string, device: Device): Promise<void> {
    await this.unitOfWork.outsideShop(async (db) => {
      const found = await this.accounts.findSessionOfToken(db, tokenHash(refreshToken));
      if (found === undefined) return;
      await this.accounts.endSession(db, found.sessionId, 'signed out');
      await this.accounts.recordEvent(db, { personId: found.personId, kind: 'signed out', address: device.address });
    });
  }

  async signOutEverywhere(actor: Actor, device: Device): Promise<void> {
    await this.unitOfWork.outsideShop(async (db) => {
      await this.accounts.endAllSessions(db, actor.personId, 'signed out everywhere');
      await this.accounts.recordEvent(db, { personId: actor.personId, kind: 'signed out everywhere', address: device.address });
    });
  }

  private async noteReuse({ personId, sessionId }: SessionKey, device: Device): Promise<void> {
    this.logger.warn({ sessionId }, 'a used refresh token came back; the session was ended');
    const event = { personId, kind: 'refresh token reused', address: device.address, detail: { sessionId } };
    await this.unitOfWork.outsideShop((db) => this.accounts.recordEvent(db, event));
  }
}

const toActor = (live: LiveSession, sessionId: string): Actor => ({
  shopId: live.shopId,
  memberId: live.memberId,
  personId: live.personId,
  printedName: live.printedName,
  role: roleOf(live.role),
  sessionId,
});
