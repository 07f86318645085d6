import type { CautionLevel, CautionScope } from '@proofplate/recipe-model';

type Named = 'families' | 'materialIds' | 'finishIds' | 'sourceKinds' | 'effectKeys';
const NAMED: readonly Named[] = ['families', 'materialIds', 'finishIds', 'sourceKinds', 'effectKeys'];

/** A scope as stored: an empty list is no condition, and neither is "not only round parts". */
export function scopeAsStored({ families, materialIds, finishIds, sourceKinds, effectKeys, roundPart }: CautionScope): CautionScope {
  return {
    ...(isGiven(families) ? { families: [...families] } : {}),
    ...(isGiven(materialIds) ? { materialIds: [...materialIds] } : {}),
    ...(isGiven(finishIds) ? { finishIds: [...finishIds] } : {}),
    ...(isGiven(sourceKinds) ? { sourceKinds: [...sourceKinds] } : {}),
    ...(isGiven(effectKeys) ? { effectKeys: [...effectKeys] } : {}),
    ...(roundPart === true ? { roundPart } : {}),
  };
}

/** True if all work under the earlier scope is still under the later one. */
export function isAtLeastAsWide(earlier: CautionScope, later: CautionScope): boolean {
  const listsHold = NAMED.every((name) => {
    const wanted: readonly string[] | undefined = later[name];
    const had: readonly string[] | undefined = earlier[name];
    return wanted === undefined || had?.every((entry) => wanted.includes(entry)) === true;
  });
  return listsHold && (later.roundPart === undefined || earlier.roundPart === later.roundPart);
}

/** `never` may follow `care`, not the other way round. */
export const isAtLeastAsStrict = (earlier: CautionLevel, later: CautionLevel) => earlier === 'care' || later === 'never';

const isGiven = <Entry>(list: readonly Entry[] | undefined): list is readonly Entry[] =>
  list !== undefined && list !== null && list.length > 0;
