import { Injectable } from '@nestjs/common';
import { SHIPPED_CAUTIONS, SHIPPED_EFFECTS } from '@proofplate/recipe-model';
import type { Actor, Tx } from '../../database/unit-of-work';
import { LedgerService } from '../../ledger/ledger.service';
import { ShopStarterContent } from '../../shops/shop-starter-content';
import { CautionsRepository } from '../cautions.repository';
import { EffectsRepository } from '../effects.repository';

/** Puts the shipped cautions and effects into a new shop. Running it again adds only what is missing. */
@Injectable()
export class MaterialsStarterContent extends ShopStarterContent {
  constructor(
    private readonly cautions: CautionsRepository,
    private readonly effects: EffectsRepository,
    private readonly ledger: LedgerService,
  ) {
    super();
  }

  override async fill(tx: Tx, owner: Omit<Actor, 'sessionId'>): Promise<void> {
    await this.cautions.insertShipped(tx, owner.shopId, SHIPPED_CAUTIONS);
    await this.effects.insertShipped(tx, owner.shopId, SHIPPED_EFFECTS);
    await this.ledger.record(tx, {
      actor: owner,
      action: 'shop.starter-content-added',
      subjectType: 'shop',
      subjectId: owner.shopId,
      after: { cautions: SHIPPED_CAUTIONS.map(({ shippedKey }) => shippedKey), effects: SHIPPED_EFFECTS.map(({ key }) => key) },
    });
  }
}
