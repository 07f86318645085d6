/** A text as LIKE finds it: what means something to LIKE is taken literally. */
export const literalText = (text: string) => text.replace(/[\\%_]/gu, String.raw`\$&`);

/** LIKE pattern of a text that may stand anywhere. */
export const containsText = (text: string) => `%${literalText(text)}%`;
