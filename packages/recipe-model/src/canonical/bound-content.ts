import type { RouteKind } from '../vocabulary/lists';
import type { RevisionContent } from '../vocabulary/revision-content';

/** A revision as its signature is bound to it. */
export type BoundRevision = {
  readonly content: RevisionContent;
  readonly recipeId: string;
  readonly keys: {
    readonly materialId: string;
    readonly finishId: string;
    readonly effectId: string;
    readonly machineId: string;
    readonly lensId: string;
  };
  readonly profileId: string;
  readonly calibrationId: string | null;
  readonly basisCellIds: readonly string[];
  readonly confirmationCellIds: readonly string[];
  readonly route: RouteKind;
  readonly grounds: string;
  readonly groundsBy: string | null;
  readonly reason: string;
  readonly basedOnId: string | null;
  readonly authorId: string;
  readonly effectiveFrom: Date | null;
};

/**
 * What the content hash of a revision covers: the content with scope, the five keys, machine profile, calibration, evidence, and how
 * and why the setting was come by. Dates that the server gives at submit and approval stay outside.
 *
 * @param revision the revision with its evidence; the order of its cells does not count
 * @returns the value for contentHash and contentText
 */
export function boundContent(revision: BoundRevision): RevisionContent & Readonly<Record<string, unknown>> {
  const { content, recipeId, profileId, calibrationId, reason, basedOnId, authorId, route, grounds, groundsBy } = revision;
  const { materialId, finishId, effectId, machineId, lensId } = revision.keys;
  return {
    ...content,
    recipeId,
    keys: { materialId, finishId, effectId, machineId, lensId },
    profileId,
    calibrationId,
    evidence: { basis: [...revision.basisCellIds].sort(), confirmation: [...revision.confirmationCellIds].sort() },
    route: { kind: route, grounds, groundsBy },
    reason,
    basedOnId,
    authorId,
    effectiveFrom: revision.effectiveFrom?.toISOString() ?? null,
  };
}
