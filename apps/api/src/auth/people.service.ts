import { Injectable } from '@nestjs/common';
import { uuidv7 } from 'uuidv7';
import { InvalidError } from '../common/errors/domain-error';
import { type Executor, UnitOfWork } from '../database/unit-of-work';
import { AccountsRepository, type Person } from './accounts.repository';
import { AddressTakenError, WrongCredentialsError } from './auth.errors';
import { CredentialsService } from './credentials.service';
import type { Device } from './device.decorator';
import { PasswordHasher } from './hashing/password-hasher';
import { passwordFault } from './hashing/password-rules';

export type StoredPerson = { readonly id: string; readonly version: number; readonly name: string };
/** A person whose password is hashed or proved already, so that storing takes no time inside the transaction. */
export type ReadyPerson = { readonly store: (db: Executor) => Promise<StoredPerson> };

const FIRST_SESSION_VERSION = 1;

@Injectable()
export class PeopleService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly accounts: AccountsRepository,
    private readonly credentials: CredentialsService,
    private readonly hasher: PasswordHasher,
  ) {}

  async find(email: string): Promise<Person | undefined> {
    return this.unitOfWork.outsideShop((db) => this.accounts.findPersonByEmail(db, email));
  }

  /** The person of an address: an existing one who proves the password, or a new one. @throws AddressTakenError */
  async prepare(
    given: { readonly email: string; readonly password: string; readonly name?: string },
    device: Device,
  ): Promise<ReadyPerson> {
    const existing = await this.find(given.email);
    if (existing !== undefined) return this.prove(given, device);
    const refusal = newPersonFaults(given);
    if (refusal !== undefined) throw refusal;
    const person = { id: uuidv7(), email: given.email, name: given.name ?? '', passwordHash: await this.hasher.hash(given.password) };
    return {
      store: async (db) => {
        if (!(await this.accounts.createPerson(db, person))) throw new AddressTakenError();
        return { id: person.id, version: FIRST_SESSION_VERSION, name: person.name };
      },
    };
  }

  private async prove(given: { readonly email: string; readonly password: string }, device: Device): Promise<ReadyPerson> {
    const person = await this.credentials.prove(given.email, given.password, device).catch((error: unknown) => {
      throw error instanceof WrongCredentialsError ? new AddressTakenError() : error;
    });
    return { store: async () => ({ id: person.id, version: person.sessionVersion, name: person.name }) };
  }
}

/** An invitation's request may be meant for an existing account, so its class cannot ask for a name and a new password. */
function newPersonFaults({ name, password }: { readonly name?: string; readonly password: string }): InvalidError | undefined {
  const fault = passwordFault(password);
  const errors = [
    ...(name === undefined ? [{ pointer: '#/name', detail: 'This is needed.' }] : []),
    ...(fault === undefined ? [] : [{ pointer: '#/password', detail: fault }]),
  ];
  return errors.length === 0 ? undefined : new InvalidError('Some fields need another look.', errors);
}
