import { createHash } from 'node:crypto';
import { contentHash } from '@proofplate/recipe-model';
import type { KeyIds, StoredRevision } from './stored-revision';

export type HashedEvidence = { readonly basisCellIds: readonly string[]; readonly confirmationCellIds: readonly string[] };

/**
 * What a signature is bound to: SHA-256 of the canonical form of the content with scope, the five keys, machine profile, calibration,
 * evidence, and how and why the setting was come by. Dates that the server gives at submit and approval stay outside.
 */
export function hashOfRevision(revision: StoredRevision, keys: KeyIds, evidence: HashedEvidence): string {
  const { content, recipeId, profileId, calibrationId, reason, basedOnId, route, grounds, groundsBy, effectiveFrom, createdBy } = revision;
  const { materialId, finishId, effectId, machineId, lensId } = keys;
  const bound = {
    ...content,
    recipeId,
    keys: { materialId, finishId, effectId, machineId, lensId },
    profileId,
    calibrationId,
    evidence: { basis: [...evidence.basisCellIds].sort(), confirmation: [...evidence.confirmationCellIds].sort() },
    route: { kind: route, grounds, groundsBy },
    reason,
    basedOnId,
    authorId: createdBy,
    effectiveFrom: effectiveFrom?.toISOString() ?? null,
  };
  return contentHash(bound, (text) => createHash('sha256').update(text, 'utf8').digest('hex'));
}
