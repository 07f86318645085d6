import type { Tx } from '@proofplate/db';

type LastAct = () => Promise<void>;
const lastActs = new WeakMap<Tx, LastAct[]>();

/**
 * Runs `act` as one of the last things of the transaction, after all work of the use case. For rows that everybody in a shop competes
 * for: locked late they are held briefly, and always after everything else, so that no two transactions wait for each other.
 *
 * @throws Error for a transaction that the unit of work did not open, where the act would be lost
 */
export function beforeCommit(tx: Tx, act: LastAct): void {
  const acts = lastActs.get(tx);
  if (acts === undefined) throw new Error('only a transaction of the unit of work has last acts; do not nest transactions');
  acts.push(act);
}

/** The unit of work says that it will run the last acts of this transaction. */
export function expectLastActs(tx: Tx): void {
  lastActs.set(tx, []);
}

/** Runs what `beforeCommit` collected, in order. */
export async function runLastActs(tx: Tx): Promise<void> {
  const acts = lastActs.get(tx) ?? [];
  lastActs.delete(tx);
  for (const act of acts) await act();
}
