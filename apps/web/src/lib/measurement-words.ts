import { METHOD_LABELS, QUANTITIES } from '@proofplate/recipe-model';

/** Symbol of a measured quantity, such as L*; the code itself where it has none. */
export function symbolOf(quantity: string): string {
  return Object.entries(QUANTITIES).find(([key]) => key === quantity)?.[1].symbol ?? quantity;
}

/** "Evenness, U": the word first, since a symbol alone says nothing to whoever did not learn it. */
export function quantityWords(quantity: string): string {
  const meaning = Object.entries(QUANTITIES).find(([key]) => key === quantity)?.[1];
  return meaning === undefined ? quantity : withSymbol(meaning.label, quantity, ', ');
}

/** A label and its symbol, once where the label says it already: "Roughness Ra", "Wipe test, double rubs passed". */
export function withSymbol(label: string, quantity: string, between = ' '): string {
  const symbol = symbolOf(quantity);
  return label.includes(symbol) ? label : `${label}${between}${symbol}`;
}

/** "by profilometer" and the like; a photo needs no word, since it is the picture beside the number. */
export function methodWord(method: string): string {
  return (
    Object.entries(METHOD_LABELS)
      .find(([key]) => key === method)?.[1]
      .toLowerCase() ?? method
  );
}

/** "by profilometer", "by hand". */
export function byMethod(method: string): string {
  const word = methodWord(method);
  return word.startsWith('by ') ? word : `by ${word}`;
}

/** Colour numbers to a tenth, contrast to a hundredth. */
export function decimalsOf(quantity: string): number {
  return quantity === 'contrast' ? 2 : 1;
}
