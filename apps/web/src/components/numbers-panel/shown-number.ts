/** A number as the panel shows it: every text is ready to read. */
export type ShownNumber = {
  key: string;
  label: string;
  /** Formatted; undefined: not known, for the reason given. */
  text: string | undefined;
  unit: string;
  /** Why there is no value. */
  reason: string;
  /** No input would bring it: it has no meaning for what is set. */
  isRuledOut: boolean;
  formula: string;
  /** "From power 12 W, speed 800 mm/s."; empty where no number went in. */
  inputs: string;
  source: string;
  /** Page that tells more; undefined: there is none. */
  more: string | undefined;
  /** Why the value needs a second look; empty: it doesn't. */
  lookAt: readonly string[];
  /** Asked for most; the others open on demand. */
  isFirst: boolean;
};

export type NumbersGroup = {
  key: string;
  /** Only where there are several. */
  title: string;
  numbers: readonly ShownNumber[];
  /** What to look at in what was set, before any number. */
  remarks: readonly string[];
};

/** Numbers that are not known for the same reason are named together. */
export function reasonsOf(numbers: readonly ShownNumber[]): [reason: string, labels: string[]][] {
  const byReason = new Map<string, string[]>();
  for (const { text, reason, label } of numbers) {
    if (text !== undefined) continue;
    // It goes on in a sentence of the panel, which has its own full stop.
    const because = reason.replace(/\.$/, '');
    byReason.set(because, [...(byReason.get(because) ?? []), label]);
  }
  return [...byReason];
}

/** Two states of a number that look and read the same. */
export function isSameNumber(one: ShownNumber, other: ShownNumber): boolean {
  const texts = ({ key, label, text, unit, reason, formula, inputs, source, lookAt }: ShownNumber) =>
    [key, label, text ?? '', unit, reason, formula, inputs, source, ...lookAt].join('\n');
  return one === other || texts(one) === texts(other);
}
