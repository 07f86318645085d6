import type { Role } from '@proofplate/recipe-model';
import type { ShopDto, UnitSystem } from './dto/shop.dto';
import type { ShopPolicy } from './shop-policy';
import { allowedShopActions } from './shops.policy';

type Shop = {
  readonly id: string;
  readonly name: string;
  readonly unitSystem: string;
  readonly timeZone: string;
  readonly locale: string;
  readonly policy: ShopPolicy;
  readonly createdAt: Date;
  readonly version: number;
};

/** What a signed-in page needs to know of the shop. */
export const toShopSummary = (shop: Omit<Shop, 'policy' | 'createdAt' | 'version'>) => ({
  id: shop.id,
  name: shop.name,
  unitSystem: unitSystemOf(shop.unitSystem),
  timeZone: shop.timeZone,
  locale: shop.locale,
});

export const toShopDto = (shop: Shop, role: Role): ShopDto => ({
  ...toShopSummary(shop),
  policy: { ...shop.policy },
  createdAt: shop.createdAt.toISOString(),
  version: shop.version,
  allowedActions: allowedShopActions(role),
});

/** The column holds one of the two, by its CHECK. */
const unitSystemOf = (text: string): UnitSystem => (text === 'inch' ? 'inch' : 'metric');
