import { createHash } from 'node:crypto';
import { boundContent, contentHash } from '@proofplate/recipe-model';
import type { KeyIds, StoredRevision } from './stored-revision';

export type HashedEvidence = { readonly basisCellIds: readonly string[]; readonly confirmationCellIds: readonly string[] };

/** What a signature is bound to: SHA-256 of the canonical form of all that boundContent lists. */
export function hashOfRevision(revision: StoredRevision, keys: KeyIds, evidence: HashedEvidence): string {
  const bound = boundContent({ ...revision, ...evidence, keys, authorId: revision.createdBy });
  return contentHash(bound, (text) => createHash('sha256').update(text, 'utf8').digest('hex'));
}
