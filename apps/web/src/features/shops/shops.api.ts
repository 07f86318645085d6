import type { components } from '@proofplate/api-client';
import type { SWRResponse } from 'swr';
import { type ProblemError, request } from '../../lib/api';
import { updateShop } from '../../lib/session';
import { revalidate, useRead } from '../../lib/swr';

type Schemas = components['schemas'];

export type ShopPolicy = Schemas['ShopPolicyDto'];
export type Shop = Schemas['ShopDto'];
export type ShopChange = Schemas['UpdateShopDto'];

const SHOP = '/api/shop';

export function useShop(): SWRResponse<Shop, ProblemError> {
  // Never in the background: a form must start from the version it shows, or a save would hide somebody else's change.
  return useRead<Shop>(SHOP, undefined, { revalidateOnFocus: false, revalidateOnReconnect: false });
}

/** Saves against the version that was read, so that two owners never overwrite each other unseen. */
export async function changeShop({ version }: Shop, body: ShopChange): Promise<void> {
  const shop = await request<Shop>('patch', SHOP, { body, version });
  updateShop(shop);
  await revalidate(SHOP);
}
