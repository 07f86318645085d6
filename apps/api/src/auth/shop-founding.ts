import { Injectable, Optional } from '@nestjs/common';
import type { Actor } from '../common/actor';
import type { Tx } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { MembersService } from '../members/members.service';
import { DEFAULT_SHOP_POLICY } from '../shops/shop-policy';
import { ShopStarterContent } from '../shops/shop-starter-content';
import { ShopsService } from '../shops/shops.service';
import { SignUpDto } from './dto/sign-up.dto';

/** What belongs to a new shop besides its first person. */
@Injectable()
export class ShopFounding {
  constructor(
    private readonly shops: ShopsService,
    private readonly members: MembersService,
    private readonly ledger: LedgerService,
    @Optional() private readonly starterContent?: ShopStarterContent,
  ) {}

  async found(tx: Tx, { shopId, personId, dto }: { shopId: string; personId: string; dto: SignUpDto }): Promise<string> {
    const { shopName, name, unitSystem, timeZone, locale } = dto;
    const shop = { name: shopName, unitSystem, timeZone, locale };
    await this.shops.create(tx, { id: shopId, ...shop, policy: DEFAULT_SHOP_POLICY });
    const member = await this.members.join(tx, { shopId, personId, role: 'owner', printedName: name });
    // the session is opened with the same transaction a moment later, so the first events name no session
    const owner: Omit<Actor, 'sessionId'> = { shopId, memberId: member.id, personId, printedName: name, role: 'owner' };
    await this.ledger.record(tx, { actor: owner, action: 'shop.created', subjectType: 'shop', subjectId: shopId, after: shop });
    await this.starterContent?.fill(tx, owner);
    return member.id;
  }
}
