/** Words as a LIKE pattern that finds them anywhere; the pattern's own signs are taken literally. */
export const containsPattern = (words: string) => `%${words.replace(/[\\%_]/g, (sign) => `\\${sign}`)}%`;
