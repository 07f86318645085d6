import type { Actor, Tx } from '../database/unit-of-work';

/**
 * Puts the shipped cautions, effects and families into a new shop, in the transaction that creates it. Implemented by a module of a
 * higher row and injected where present.
 */
export abstract class ShopStarterContent {
  abstract fill(tx: Tx, owner: Omit<Actor, 'sessionId'>): Promise<void>;
}
