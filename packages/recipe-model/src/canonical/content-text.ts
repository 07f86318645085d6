import type { RevisionContent } from '../vocabulary/revision-content';
import { canonicalForm } from './canonical-form';

/** Version of what a content hash covers; it stands in the text, so that a later rule can never give an old hash a new meaning. */
export const CONTENT_FORMAT = 'proofplate.revision.1';

/**
 * The text whose SHA-256 is a revision's content hash.
 *
 * @param content what a signature covers, and whatever else the record wants bound to it (keys, criteria, evidence)
 * @returns canonical text with the format's name
 * @throws NotCanonicalError as canonicalForm
 * Source: RFC 8785; docs/science/canonical-form.md
 */
export function contentText(content: RevisionContent & Readonly<Record<string, unknown>>): string {
  return canonicalForm({ content, format: CONTENT_FORMAT });
}

/**
 * The content hash by a digest that is passed in, since the browser's is asynchronous and the server's is not.
 *
 * @param content what a signature covers
 * @param sha256  SHA-256 of a text's UTF-8 bytes, in whatever form the caller stores
 * @returns what sha256 returns
 */
export function contentHash<Digest>(
  content: RevisionContent & Readonly<Record<string, unknown>>,
  sha256: (text: string) => Digest,
): Digest {
  return sha256(contentText(content));
}
