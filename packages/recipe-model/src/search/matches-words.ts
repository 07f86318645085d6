/** From this length a word with vowels may also match by its consonants, which lets the two spellings of English find each other. */
const MIN_SPELLING_LENGTH = 5;
/** One consonant alone would match every word that starts with it; that is a prefix, not an abbreviation. */
const MIN_ABBREVIATION_LENGTH = 2;

/**
 * True if every typed word is found in the label, in any order: as the beginning of a word ("anod" for "anodised"), as its consonants
 * ("blk" for "black"), or in the other spelling ("anodized", "aluminum").
 *
 * @param query what a person typed into the finder
 * @param label the words of a thing, such as "Black anodised aluminium 6082"
 * @returns true for an empty query as well: nothing asked, nothing excluded
 */
export function matchesWords(query: string, label: string): boolean {
  const words = wordsOf(label);
  return wordsOf(query).every((asked) => words.some((word) => matchesWord(asked, word)));
}

/** The words of a text as the finder compares them: small letters, no accents, letters and digits only. */
export function wordsOf(text: string): string[] {
  return text
    .normalize('NFKD')
    .replace(/\p{Mark}/gu, '')
    .toLowerCase()
    .split(/[^\p{Letter}\p{Number}]+/u)
    .filter((word) => word !== '');
}

function matchesWord(asked: string, word: string): boolean {
  if (word.startsWith(asked)) return true;
  if (/\d/u.test(asked) || asked.length < MIN_ABBREVIATION_LENGTH || asked[0] !== word[0]) return false;
  if (!hasVowel(asked)) return isSubsequence(asked, word);
  return asked.length >= MIN_SPELLING_LENGTH && skeleton(word).startsWith(skeleton(asked));
}

function hasVowel(word: string): boolean {
  return /[aeiou]/u.test(word.slice(1));
}

/** First letter and consonants, doubled letters once, z as s. */
function skeleton(word: string): string {
  const consonants = word.slice(1).replace(/[aeiou]/gu, '');
  return `${word[0] ?? ''}${consonants}`.replace(/z/gu, 's').replace(/(.)\1+/gu, '$1');
}

function isSubsequence(asked: string, word: string): boolean {
  let from = 0;
  for (const letter of asked) {
    const at = word.indexOf(letter, from);
    if (at < 0) return false;
    from = at + 1;
  }
  return true;
}
