import { createHmac, randomBytes } from 'node:crypto';
import { Injectable, type OnApplicationShutdown, type OnModuleInit } from '@nestjs/common';
import { Env } from '../../config/env.validation';
import { HashPool } from './hash-pool';

/**
 * bcrypt over base64(HMAC-SHA-384(pepper, NFKC(password))). bcrypt alone looks at 72 bytes only; the keyed pre-hash makes every
 * character count, and without the pepper a stolen table cannot be tried at all.
 */
@Injectable()
export class PasswordHasher implements OnModuleInit, OnApplicationShutdown {
  private readonly pool = new HashPool();
  private dummy: Promise<string> | undefined;

  constructor(private readonly env: Env) {}

  async hash(password: string): Promise<string> {
    return String(await this.pool.run({ kind: 'hash', secret: this.secretOf(password), cost: this.env.PASSWORD_COST }));
  }

  /** Costs the same for somebody unknown (no hash), so that the time tells nothing. */
  async verify(password: string, hash: string | undefined): Promise<boolean> {
    const isRight = await this.pool.run({ kind: 'compare', secret: this.secretOf(password), hash: hash ?? (await this.dummyHash()) });
    return isRight === true && hash !== undefined;
  }

  /** True when the hash was made with another cost than the configured one. */
  needsRehash(hash: string): boolean {
    return Number(/^\$2[aby]\$(\d\d)\$/.exec(hash)?.[1]) !== this.env.PASSWORD_COST;
  }

  /** Threads that did the work so far. */
  get threadIds(): ReadonlySet<number> {
    return this.pool.answeringThreadIds;
  }

  /** Made once, at start: the first unknown person must not take longer than the others. */
  dummyHash(): Promise<string> {
    this.dummy ??= this.hash(randomBytes(32).toString('base64'));
    return this.dummy;
  }

  async onModuleInit(): Promise<void> {
    await this.dummyHash();
  }

  async onApplicationShutdown(): Promise<void> {
    await this.pool.close();
  }

  private secretOf(password: string): string {
    return createHmac('sha384', this.env.PASSWORD_PEPPER).update(password.normalize('NFKC'), 'utf8').digest('base64');
  }
}
