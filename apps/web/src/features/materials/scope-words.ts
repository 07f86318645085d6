import { type CautionScope, MATERIAL_FAMILIES, SOURCE_KIND_LABELS } from '@proofplate/recipe-model';

/** Names of the shop's own things by id or key; what is not known stays a count. */
export type ScopeNames = {
  materials: ReadonlyMap<string, string>;
  finishes: ReadonlyMap<string, string>;
  effects: ReadonlyMap<string, string>;
};

/** What a caution applies to, in words: every condition that is given must hold. */
export function scopeWords(scope: CautionScope, names: ScopeNames): string {
  const parts = [
    scope.families?.map((family) => MATERIAL_FAMILIES[family].label),
    named(scope.materialIds, names.materials, 'a material'),
    named(scope.finishIds, names.finishes, 'a finish'),
    scope.sourceKinds?.map((kind) => SOURCE_KIND_LABELS[kind]),
    named(scope.effectKeys, names.effects, 'an effect'),
    scope.roundPart === true ? ['round parts that turn'] : undefined,
  ].flatMap((list) => (list === undefined || list.length === 0 ? [] : [joined(list)]));
  const words = parts.join(' · ');
  return words === '' ? 'All work' : `${words.charAt(0).toUpperCase()}${words.slice(1)}`;
}

function named(ids: readonly string[] | undefined, names: ReadonlyMap<string, string>, fallback: string): string[] | undefined {
  return ids?.map((id) => names.get(id) ?? `${fallback} that is archived`);
}

function joined(words: readonly string[]): string {
  const last = words.at(-1) ?? '';
  return words.length < 2 ? last : `${words.slice(0, -1).join(', ')} or ${last}`;
}
