import { createHash } from 'node:crypto';
import { canonicalForm } from '@proofplate/recipe-model';

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
export type ChainFault = { readonly seq: number; readonly reason: 'number missing' | 'link broken' | 'content changed' };

/** The hash before the first event. */
export const GENESIS_HASH = '0'.repeat(64);

const sha256 = (text: string) => createHash('sha256').update(text, 'utf8').digest('hex');

/** Continues the chain: hash = SHA-256(previousHash ‖ seq ‖ RFC 8785 form of the body), the parts as text. */
export function linkEvent(body: LedgerBody, head: { readonly seq: number; readonly hash: string }): LinkedEvent {
  const seq = head.seq + 1;
  const canonical = canonicalForm(body);
  return { ...body, seq, previousHash: head.hash, bodyHash: sha256(canonical), hash: sha256(`${head.hash}${seq}${canonical}`) };
}

/** The first fault of a stretch of the chain that should continue `head`; undefined when there is none. */
export function firstFault(events: readonly LinkedEvent[], head: { readonly seq: number; readonly hash: string }): ChainFault | undefined {
  let present = head;
  for (const event of events) {
    const { seq, bodyHash, previousHash, hash, ...body } = event;
    if (seq !== present.seq + 1) return { seq: present.seq + 1, reason: 'number missing' };
    if (previousHash !== present.hash) return { seq, reason: 'link broken' };
    const expected = linkEvent(body, present);
    if (expected.bodyHash !== bodyHash || expected.hash !== hash) return { seq, reason: 'content changed' };
    present = { seq, hash };
  }
  return undefined;
}
