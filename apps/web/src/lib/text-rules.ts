/**
 * What every text that must be filled in obeys, as the server does: blanks at the ends do not count, and the most is a number of
 * characters. Both are said at once with the other fields, not after the server has answered.
 */
export function textRules(missing: string, mostCharacters: number) {
  return {
    validate: (text: string) => {
      const length = text.trim().length;
      if (length === 0) return missing;
      return length <= mostCharacters || `Use at most ${mostCharacters} characters; these are ${length}.`;
    },
  };
}

/** As the server has them. */
export const LONGEST_NAME = 120;
export const LONGEST_EMAIL = 254;
