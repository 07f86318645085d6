import type { SWRResponse } from 'swr';
import { type ProblemError, request } from '../../lib/api';
import { type UnitSystem, updateShop } from '../../lib/session';
import { revalidate, useRead } from '../../lib/swr';

export type ShopPolicy = {
  minimumConfirmationMarks: number;
  authorMaySign: boolean;
  reviewEveryDays: number;
  overdueBlocks: boolean;
  photoRequired: boolean;
  calibrationAgeDays: number;
  powerShiftPercent: number;
  secondFactorForSigning: boolean;
};

export type Shop = {
  id: string;
  name: string;
  unitSystem: UnitSystem;
  timeZone: string;
  locale: string;
  policy: ShopPolicy;
  version: number;
  allowedActions: readonly string[];
};

const SHOP = '/api/shop';

export type ShopChange = Partial<Pick<Shop, 'name' | 'unitSystem' | 'timeZone' | 'locale' | 'policy'>> & { password?: string };

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
