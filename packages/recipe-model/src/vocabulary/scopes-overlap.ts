import type { Range, RecipeScope } from './revision-content';

/**
 * True if a part could fall under both scopes. What a scope leaves open covers everything; the ends of a range belong to it.
 * Two approved recipes with the same material, finish, effect, machine and lens must not overlap, or "the approved setting" is not one.
 *
 * @param a scope of one recipe
 * @param b scope of the other
 * @returns false only where at least one statement keeps the two apart
 */
export function scopesOverlap(a: RecipeScope, b: RecipeScope): boolean {
  return (
    rangesOverlap(a.thicknessMm, b.thicknessMm) &&
    rangesOverlap(a.partDiameterMm, b.partDiameterMm) &&
    rangesOverlap(a.featureSizeMm, b.featureSizeMm) &&
    (a.featureKind === undefined || b.featureKind === undefined || a.featureKind === b.featureKind) &&
    // A customer's own specification is asked for by name; without one the general setting answers.
    (a.customerSpecification ?? '') === (b.customerSpecification ?? '')
  );
}

/** True if a value lies in both ranges; an absent range or end is open. */
export function rangesOverlap(a: Range = {}, b: Range = {}): boolean {
  const from = Math.max(a.from ?? Number.NEGATIVE_INFINITY, b.from ?? Number.NEGATIVE_INFINITY);
  const to = Math.min(a.to ?? Number.POSITIVE_INFINITY, b.to ?? Number.POSITIVE_INFINITY);
  return from <= to;
}
