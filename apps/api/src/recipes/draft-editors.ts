import { canonicalForm } from '@proofplate/recipe-model';
import type { StoredRevision } from './stored-revision';

type Written = Pick<StoredRevision, 'content' | 'calibrationId' | 'reason' | 'route' | 'effectiveFrom' | 'reviewDue'>;

/** Who edited a draft, once this member did. The author is not among them. */
export function withEditor({ editorIds, createdBy }: Pick<StoredRevision, 'editorIds' | 'createdBy'>, memberId: string): string[] {
  return memberId === createdBy || editorIds.includes(memberId) ? [...editorIds] : [...editorIds, memberId];
}

/** True if something else was written than before. The grounds do not count: they are a lead's own word on what somebody else wrote. */
export function isRewritten(before: Written, after: Written): boolean {
  return textOf(before) !== textOf(after);
}

function textOf({ content, calibrationId, reason, route, effectiveFrom, reviewDue }: Written): string {
  const plain: unknown = JSON.parse(JSON.stringify({ content, calibrationId, reason, route, effectiveFrom, reviewDue }));
  return canonicalForm(plain);
}
