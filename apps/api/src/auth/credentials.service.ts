import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { PasswordNotConfirmedError } from '../common/errors/request.errors';
import { PasswordCheck } from '../common/password-check';
import { Env } from '../config/env.validation';
import { UnitOfWork } from '../database/unit-of-work';
import { AccountsRepository, type Person } from './accounts.repository';
import { WrongCredentialsError } from './auth.errors';
import type { Device } from './device.decorator';
import { PasswordHasher } from './hashing/password-hasher';
import { passwordFault } from './hashing/password-rules';
import { ThrottleService } from './throttle.service';

/** Where an act without a request of its own device is noted from. */
const UNKNOWN_ADDRESS = '0.0.0.0';

/** Who somebody is: address and password, or the password alone of somebody who is signed in. */
@Injectable()
export class CredentialsService implements PasswordCheck {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly accounts: AccountsRepository,
    private readonly hasher: PasswordHasher,
    private readonly throttle: ThrottleService,
    private readonly env: Env,
  ) {}

  /**
   * The person with this address and password. Takes the same steps whether the address is known or not.
   *
   * @throws WrongCredentialsError, TooManyError
   */
  async prove(email: string, password: string, device: Device): Promise<Person> {
    await this.throttle.take('address', device.address);
    await this.throttle.take('account', email);
    const person = await this.unitOfWork.outsideShop((db) => this.accounts.findPersonByEmail(db, email));
    const isRight = await this.hasher.verify(password, person?.passwordHash);
    if (person === undefined || !isRight || this.isForDemonstration(password)) {
      await this.noteFailure('sign-in failed', person?.id, device.address);
      throw new WrongCredentialsError();
    }
    await this.throttle.succeeded('account', email);
    await this.throttle.succeeded('address', device.address);
    await this.rehashIfNeeded(person, password);
    return person;
  }

  async confirm(actor: Actor, password: string): Promise<void> {
    await this.throttle.take('signing', actor.personId);
    const person = await this.unitOfWork.outsideShop((db) => this.accounts.findPerson(db, actor.personId));
    if (!(await this.hasher.verify(password, person?.passwordHash))) {
      await this.noteFailure('password not confirmed', actor.personId, UNKNOWN_ADDRESS);
      throw new PasswordNotConfirmedError();
    }
    await this.throttle.succeeded('signing', actor.personId);
  }

  /** Passwords that nobody may choose, such as those of the demo shop, open nothing in production, however they got there. */
  private isForDemonstration(password: string): boolean {
    return this.env.isProduction && passwordFault(password) !== undefined;
  }

  private async noteFailure(kind: string, personId: string | undefined, address: string): Promise<void> {
    await this.unitOfWork.outsideShop((db) =>
      this.accounts.recordEvent(db, { ...(personId === undefined ? {} : { personId }), kind, address }),
    );
  }

  private async rehashIfNeeded(person: Person, password: string): Promise<void> {
    if (!this.hasher.needsRehash(person.passwordHash)) return;
    const hash = await this.hasher.hash(password);
    await this.unitOfWork.outsideShop((db) => this.accounts.rehash(db, person.id, person.passwordHash, hash));
  }
}
