import { createHash } from 'node:crypto';
import * as chain from '@proofplate/recipe-model';

export { type ChainFault, GENESIS_HASH, type LedgerBody, type LinkedEvent } from '@proofplate/recipe-model';

const sha256: chain.Sha256 = (text) => createHash('sha256').update(text, 'utf8').digest('hex');

/** Continues the chain. */
export const linkEvent = (body: chain.LedgerBody, head: chain.ChainHead): chain.LinkedEvent => chain.linkEvent(body, head, sha256);

/** The first fault of a stretch of the chain that should continue `head`; undefined when there is none. */
export const firstFault = (events: readonly chain.LinkedEvent[], head: chain.ChainHead): chain.ChainFault | undefined =>
  chain.firstFault(events, head, sha256);
