import { type BeforeApplicationShutdown, Injectable, Logger } from '@nestjs/common';
import { newOpaqueToken, tokenHash } from '../common/opaque-token';
import { UnitOfWork } from '../database/unit-of-work';
import { OutboxService } from '../mail/outbox.service';
import { AccountsRepository, type Person } from './accounts.repository';
import { ResetNotUsableError } from './auth.errors';
import type { Device } from './device.decorator';
import { ResetPasswordDto } from './dto/reset-password.dto';
import { PasswordHasher } from './hashing/password-hasher';
import { ThrottleService } from './throttle.service';

const RESET_LIVES_MINUTES = 30;

@Injectable()
export class PasswordResetService implements BeforeApplicationShutdown {
  private readonly logger = new Logger(PasswordResetService.name);
  private readonly underWay = new Set<Promise<void>>();

  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly accounts: AccountsRepository,
    private readonly outbox: OutboxService,
    private readonly hasher: PasswordHasher,
    private readonly throttle: ThrottleService,
  ) {}

  /**
   * Sends a link that works once, for 30 minutes. The answer goes out before anybody looks whether the address is known: neither its
   * content nor its time tells.
   */
  async forgot(email: string, device: Device): Promise<void> {
    await this.throttle.take('address', device.address);
    await this.throttle.take('letter', email);
    const sending = this.sendLink(email, device).catch((error: unknown) =>
      this.logger.error({ err: error }, 'a reset link was not written'),
    );
    const tracked: Promise<void> = sending.finally(() => this.underWay.delete(tracked));
    this.underWay.add(tracked);
  }

  /** Sets the password and ends every session. @throws ResetNotUsableError */
  async reset({ token, password }: ResetPasswordDto, device: Device): Promise<void> {
    await this.throttle.take('address', device.address);
    const passwordHash = await this.hasher.hash(password);
    const person = await this.unitOfWork.outsideShop(async (db) => {
      const personId = await this.accounts.resetPassword(db, tokenHash(token), passwordHash);
      if (personId === undefined) throw new ResetNotUsableError();
      await this.accounts.recordEvent(db, { personId, kind: 'password reset', address: device.address });
      return this.accounts.findPerson(db, personId);
    });
    await this.throttle.succeeded('address', device.address);
    if (person !== undefined) await this.throttle.succeeded('account', person.email);
  }

  async beforeApplicationShutdown(): Promise<void> {
    await this.settled();
  }

  /** Resolves when every link asked for so far is written. */
  async settled(): Promise<void> {
    await Promise.all(this.underWay);
  }

  private async sendLink(email: string, device: Device): Promise<void> {
    const person = await this.unitOfWork.outsideShop((db) => this.accounts.findPersonByEmail(db, email));
    if (person === undefined) return;
    const [membership] = await this.unitOfWork.outsideShop((db) => this.accounts.memberships(db, person.id));
    // mail belongs to a shop's outbox; somebody who is in no shop has nothing to sign in to
    if (membership === undefined) return;
    await this.writeLink(person, membership.shopId, device);
  }

  private async writeLink(person: Person, shopId: string, device: Device): Promise<void> {
    const token = newOpaqueToken();
    const expiresAt = new Date(Date.now() + RESET_LIVES_MINUTES * 60_000).toISOString();
    await this.unitOfWork.run({ shopId }, async (tx) => {
      await this.accounts.openReset(tx, tokenHash(token), person.id, RESET_LIVES_MINUTES);
      const to = { name: person.name, address: person.email };
      await this.outbox.add(tx, { shopId, kind: 'password-reset', payload: { to, token, expiresAt } });
      await this.accounts.recordEvent(tx, { personId: person.id, kind: 'reset asked for', address: device.address });
    });
  }
}
