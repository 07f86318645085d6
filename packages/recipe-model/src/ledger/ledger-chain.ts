import { canonicalForm } from '../canonical/canonical-form';

/** What an event says; everything that its hash covers besides the number and the hash before it. */
export type LedgerBody = {
  readonly shopId: string;
  readonly at: string;
  readonly actorMemberId: string | null;
  readonly actorName: string;
  readonly sessionId: string | null;
  readonly action: string;
  readonly subjectType: string;
  readonly subjectId: string;
  readonly subjectCode: string | null;
  readonly before: unknown;
  readonly after: unknown;
};
export type LinkedEvent = LedgerBody & {
  readonly seq: number;
  readonly bodyHash: string;
  readonly previousHash: string;
  readonly hash: string;
};
export type ChainHead = { readonly seq: number; readonly hash: string };
export type ChainFault = { readonly seq: number; readonly reason: 'number missing' | 'link broken' | 'content changed' };
/** SHA-256 of a text's UTF-8 bytes in lower-case hexadecimal. */
export type Sha256 = (text: string) => string;

/** The hash before the first event. */
export const GENESIS_HASH = '0'.repeat(64);

/**
 * Continues the chain.     hash = SHA-256(previousHash ‖ seq ‖ RFC 8785 form of the body), the parts as text
 *
 * @param body   what the event says, plain JSON
 * @param head   number and hash of the event before it; number 0 and GENESIS_HASH at the beginning
 * @param sha256 passed in, since this package knows no Node
 * @returns the event with its number and hashes
 * @throws NotCanonicalError where the body holds what JSON cannot carry
 */
export function linkEvent(body: LedgerBody, head: ChainHead, sha256: Sha256): LinkedEvent {
  const seq = head.seq + 1;
  const canonical = canonicalForm(body);
  return { ...body, seq, previousHash: head.hash, bodyHash: sha256(canonical), hash: sha256(`${head.hash}${seq}${canonical}`) };
}

/**
 * Recomputes a stretch of the chain.
 *
 * @param events in order of their numbers
 * @param head   what the stretch should continue
 * @param sha256 as linkEvent
 * @returns the first fault; undefined when there is none
 */
export function firstFault(events: readonly LinkedEvent[], head: ChainHead, sha256: Sha256): ChainFault | undefined {
  let present = head;
  for (const event of events) {
    const { seq, bodyHash, previousHash, hash, ...body } = event;
    if (seq !== present.seq + 1) return { seq: present.seq + 1, reason: 'number missing' };
    if (previousHash !== present.hash) return { seq, reason: 'link broken' };
    const expected = linkEvent(body, present, sha256);
    if (expected.bodyHash !== bodyHash || expected.hash !== hash) return { seq, reason: 'content changed' };
    present = { seq, hash };
  }
  return undefined;
}
