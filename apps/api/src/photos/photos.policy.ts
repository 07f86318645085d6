import { roleAtLeast } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';

export type PhotoAction = 'set-corners' | 'retry';

/** A photo that is still being processed after this time may be pushed. */
export const STUCK_AFTER_MS = 2 * 60 * 1000;

export type PhotoFacts = { readonly state: string; readonly createdAt: Date; readonly couponState: string };

/** What the member may do with a photo. */
export function photoActions(actor: Pick<Actor, 'role'>, photo: PhotoFacts, now: Date): PhotoAction[] {
  if (!roleAtLeast(actor.role, 'operator') || photo.couponState === 'sealed') return [];
  if (photo.state === 'ready') return ['set-corners'];
  return isStuck(photo, now) ? ['retry'] : [];
}

export function isStuck(photo: Pick<PhotoFacts, 'state' | 'createdAt'>, now: Date): boolean {
  return photo.state === 'processing' && now.getTime() - photo.createdAt.getTime() > STUCK_AFTER_MS;
}
