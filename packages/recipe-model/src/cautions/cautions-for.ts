import type { SourceKind } from '../vocabulary/lists';
import type { MaterialFamily } from '../vocabulary/material-families';
import type { Caution, CautionScope } from './caution';

/** The work in front of somebody; what is not known is absent. */
export type CautionSubject = {
  family: MaterialFamily;
  materialId?: string;
  finishId?: string;
  sourceKind?: SourceKind;
  effectKey?: string;
  roundPart?: boolean;
};

/**
 * The cautions that stand beside a setting: `never` first, then in the order given. While source or effect are still open, a condition
 * on them counts as met: better one caution too many. A condition on a material, a finish or a round part needs the thing itself.
 *
 * @param subject  what is to be marked, with what
 * @param cautions the shop's cautions
 * @returns the ones that apply
 */
export function cautionsFor(subject: CautionSubject, cautions: readonly Caution[]): Caution[] {
  const applying = cautions.filter(({ appliesTo }) => applies(appliesTo, subject));
  return [...applying.filter(({ level }) => level === 'never'), ...applying.filter(({ level }) => level === 'care')];
}

/** True if the work must not be planned, drafted or run at all. */
export function isForbidden(subject: CautionSubject, cautions: readonly Caution[]): boolean {
  return cautions.some(({ level, appliesTo }) => level === 'never' && applies(appliesTo, subject));
}

function applies(scope: CautionScope, subject: CautionSubject): boolean {
  const { families, materialIds, finishIds, sourceKinds, effectKeys, roundPart } = scope;
  return (
    (families === undefined || families.includes(subject.family)) &&
    (materialIds === undefined || (subject.materialId !== undefined && materialIds.includes(subject.materialId))) &&
    (finishIds === undefined || (subject.finishId !== undefined && finishIds.includes(subject.finishId))) &&
    (sourceKinds === undefined || subject.sourceKind === undefined || sourceKinds.includes(subject.sourceKind)) &&
    (effectKeys === undefined || subject.effectKey === undefined || effectKeys.includes(subject.effectKey)) &&
    (roundPart === undefined || roundPart === (subject.roundPart ?? false))
  );
}
