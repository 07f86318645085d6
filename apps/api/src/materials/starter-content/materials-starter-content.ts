import { Injectable } from '@nestjs/common';
import type { Actor, Tx } from '../../database/unit-of-work';
import { LedgerService } from '../../ledger/ledger.service';
import { ShopStarterContent } from '../../shops/shop-starter-content';
import { CautionsRepository } from '../cautions.repository';
import { EffectsRepository } from '../effects.repository';
import { GENERAL_CAUTIONS } from './general-cautions';
import { METAL_CAUTIONS } from './metal-cautions';
import { NEVER_CAUTIONS } from './never-cautions';
import { OTHER_MATERIAL_CAUTIONS } from './other-material-cautions';
import type { ShippedCaution } from './shipped-caution';
import { SHIPPED_EFFECTS } from './shipped-effects';

export const SHIPPED_CAUTIONS: readonly ShippedCaution[] = [
  ...NEVER_CAUTIONS,
  ...METAL_CAUTIONS,
  ...OTHER_MATERIAL_CAUTIONS,
  ...GENERAL_CAUTIONS,
];

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
