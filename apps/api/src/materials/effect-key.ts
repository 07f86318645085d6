const MAX_STEM_LENGTH = 120;

/** Key of an effect that the shop adds. It never clashes with a shipped key, nor with one of the keys taken. */
export function ownEffectKey(name: string, taken: readonly string[]): string {
  const key = effectKeyStem(name);
  if (!taken.includes(key)) return key;
  const number = taken.map((other) => Number(other.slice(key.length + 1))).filter((suffix) => Number.isInteger(suffix) && suffix > 0);
  return `${key}-${Math.max(1, ...number) + 1}`;
}

/** The beginning of such a key: what the name leaves when only letters and digits are kept. */
export function effectKeyStem(name: string): string {
  const plain = name
    .normalize('NFKD')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-+|-+$/g, '')
    .slice(0, MAX_STEM_LENGTH);
  return `own-${plain === '' ? 'effect' : plain}`;
}
