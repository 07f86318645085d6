import { emptyPart, type TypedPart } from './typed-part';

const KEY = 'proofplate.part.';

/** What was typed for a setting before its run exists; kept in this tab only. */
export function keptPart(revisionId: string): TypedPart | undefined {
  if (revisionId === '') return undefined;
  try {
    const stored: unknown = JSON.parse(sessionStorage.getItem(KEY + revisionId) ?? 'null');
    return isTypedPart(stored) ? stored : undefined;
  } catch {
    return undefined;
  }
}

export function keepPart(revisionId: string, typed: TypedPart | undefined): void {
  if (revisionId === '') return;
  try {
    if (typed === undefined) sessionStorage.removeItem(KEY + revisionId);
    else sessionStorage.setItem(KEY + revisionId, JSON.stringify(typed));
  } catch {
    // Without storage the part holds until the page is closed.
  }
}

function isTypedPart(stored: unknown): stored is TypedPart {
  return typeof stored === 'object' && stored !== null && Object.keys(emptyPart('mm')).every((field) => field in stored);
}
