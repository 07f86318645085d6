import { createHash } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { TooManyError } from '../common/errors/domain-error';
import { UnitOfWork } from '../database/unit-of-work';
import { ThrottleRepository, type TryLimit } from './throttle.repository';

const NEVER = 1_000_000;
const WINDOW_MINUTES = 15;
/** Waiting time told to somebody who can only reset the password. */
const RESET_ONLY_RETRY_S = 900;

const LIMITS = {
  /** One account: three tries without a pause, ten in a quarter of an hour, a hundred failures in a row. */
  account: { limit: 10, windowMinutes: WINDOW_MINUTES, free: 3, rowLimit: 100 },
  /** One network address, whatever accounts it tries. A workshop shares one, so it is wide. */
  address: { limit: 100, windowMinutes: WINDOW_MINUTES, free: 100, rowLimit: NEVER },
  /** Letters asked for by one address or to one account. */
  letter: { limit: 5, windowMinutes: WINDOW_MINUTES, free: 5, rowLimit: NEVER },
  /** Passwords typed to sign something. */
  signing: { limit: 5, windowMinutes: WINDOW_MINUTES, free: 5, rowLimit: NEVER },
} satisfies Record<string, TryLimit>;

export type ThrottleKind = keyof typeof LIMITS;

/** Limits on tries, kept in the database so that every process counts the same. A try is counted before it is made. */
@Injectable()
export class ThrottleService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly repository: ThrottleRepository,
  ) {}

  /** @throws TooManyError with the time to wait */
  async take(kind: ThrottleKind, name: string): Promise<void> {
    const wait = await this.unitOfWork.outsideShop((db) => this.repository.take(db, subjectOf(kind, name), LIMITS[kind]));
    if (wait < 0) throw new TooManyError('This account had too many failures in a row. Reset the password by mail.', RESET_ONLY_RETRY_S);
    if (wait > 0) throw new TooManyError(`Wait ${wait} ${wait === 1 ? 'second' : 'seconds'}, then try again.`, wait);
  }

  /** The account starts afresh; an address only gets this one try back, or success on one account would hide failures on others. */
  async succeeded(kind: ThrottleKind, name: string): Promise<void> {
    await this.unitOfWork.outsideShop((db) => this.repository.succeeded(db, subjectOf(kind, name), kind !== 'address'));
  }
}

/** Names are hashed, so that the table of tries is no list of mail addresses. */
const subjectOf = (kind: ThrottleKind, name: string) => `${kind}:${createHash('sha256').update(name.toLowerCase()).digest('hex')}`;
