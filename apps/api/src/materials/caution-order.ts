import { type Caution, type CautionScope, type CautionSubject, cautionsFor } from '@proofplate/recipe-model';

/** More than any caution reaches by being narrow. */
const NEVER_FIRST = 100;

/** The cautions for a piece of work: never first, then those that name its material, then the narrower before the general. */
export const orderedCautionsFor = (subject: CautionSubject, cautions: readonly Caution[]): Caution[] =>
  orderedCautionsForAny([subject], cautions);

/** The cautions for work on any of several materials, each once and in the same order. */
export function orderedCautionsForAny(subjects: readonly CautionSubject[], cautions: readonly Caution[]): Caution[] {
  const applying = cautions.filter((caution) => subjects.some((subject) => cautionsFor(subject, [caution]).length > 0));
  const rank = ({ level, appliesTo }: Caution) => (level === 'never' ? NEVER_FIRST : 0) + narrowness(appliesTo);
  return applying.sort((a, b) => rank(b) - rank(a));
}

/** Those of them that name the material or its family: what a list of materials shows in the row. */
export function cautionsNaming(subject: CautionSubject, cautions: readonly Caution[]): Caution[] {
  return orderedCautionsFor(
    subject,
    cautions.filter(({ appliesTo }) => namesMaterial(appliesTo)),
  );
}

/** It holds for all work, not for some in particular. */
export const isGeneralCaution = ({ appliesTo }: Pick<Caution, 'appliesTo'>): boolean =>
  Object.values(appliesTo).every((condition) => condition === undefined);

const namesMaterial = ({ families, materialIds }: CautionScope) => families !== undefined || materialIds !== undefined;

function narrowness(scope: CautionScope): number {
  const others = [scope.finishIds, scope.sourceKinds, scope.effectKeys, scope.roundPart].filter((condition) => condition !== undefined);
  return (namesMaterial(scope) ? 10 : 0) + others.length;
}
