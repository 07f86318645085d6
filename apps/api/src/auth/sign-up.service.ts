import { Injectable } from '@nestjs/common';
import { uuidv7 } from 'uuidv7';
import { UnitOfWork } from '../database/unit-of-work';
import type { Device } from './device.decorator';
import { SignUpDto } from './dto/sign-up.dto';
import { PeopleService } from './people.service';
import { SessionsService, type SignedIn } from './sessions.service';
import { ShopFounding } from './shop-founding';
import { ThrottleService } from './throttle.service';

@Injectable()
export class SignUpService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly people: PeopleService,
    private readonly shopFounding: ShopFounding,
    private readonly sessions: SessionsService,
    private readonly throttle: ThrottleService,
  ) {}

  /**
   * A new shop with its first owner. Somebody who has an account already founds a further shop with the password of that account.
   *
   * @throws AddressTakenError when the address has an account with another password
   */
  async signUp(dto: SignUpDto, device: Device): Promise<SignedIn> {
    await this.throttle.take('letter', `sign-up ${device.address}`);
    const ready = await this.people.prepare(dto, device);
    const shopId = uuidv7();
    const { refreshToken, ...key } = await this.unitOfWork.run({ shopId }, async (tx) => {
      const person = await ready.store(tx);
      const memberId = await this.shopFounding.found(tx, { shopId, personId: person.id, dto });
      return this.sessions.open(tx, { personId: person.id, version: person.version, shopId, memberId, device });
    });
    return this.sessions.answer(key, refreshToken);
  }
}
