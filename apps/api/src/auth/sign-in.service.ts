import { Injectable } from '@nestjs/common';
import { UnitOfWork } from '../database/unit-of-work';
import { AccountsRepository, type Membership } from './accounts.repository';
import { NoShopError } from './auth.errors';
import { CredentialsService } from './credentials.service';
import type { Device } from './device.decorator';
import { SignInDto } from './dto/sign-in.dto';
import { SessionsService, type SignedIn } from './sessions.service';

@Injectable()
export class SignInService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly accounts: AccountsRepository,
    private readonly credentials: CredentialsService,
    private readonly sessions: SessionsService,
  ) {}

  /** Opens a new session in the shop asked for, or in the first by name. */
  async signIn({ email, password, shopId }: SignInDto, device: Device): Promise<SignedIn> {
    const person = await this.credentials.prove(email, password, device);
    const memberships = await this.unitOfWork.outsideShop((db) => this.accounts.memberships(db, person.id));
    const chosen = chosenShop(memberships, shopId);
    if (chosen === undefined) throw new NoShopError();
    const opening = { personId: person.id, version: person.sessionVersion, shopId: chosen.shopId, memberId: chosen.memberId, device };
    const { refreshToken, ...key } = await this.unitOfWork.outsideShop((db) => this.sessions.open(db, opening));
    return this.sessions.answer(key, refreshToken);
  }
}

const chosenShop = (memberships: readonly Membership[], shopId: string | undefined) =>
  shopId === undefined ? memberships[0] : memberships.find((one) => one.shopId === shopId);
