import { ValidateBy } from 'class-validator';
import { COMMON_BLOCKS, COMMON_SENTENCES } from './common-passwords';

/** Fifteen, because a password is the only factor; length is what makes guessing slow. No rules on kinds of characters. */
export const MIN_PASSWORD_LENGTH = 15;
export const MAX_PASSWORD_LENGTH = 128;
/** Longest text that is looked at when somebody types an existing password. */
export const MAX_TYPED_PASSWORD_LENGTH = 512;
const MIN_DIFFERENT_CHARACTERS = 5;

/** Why a new password is refused, as a sentence; undefined when it may be used. Lengths are code points after NFKC. */
export function passwordFault(password: string): string | undefined {
  const characters = Array.from(password.normalize('NFKC'));
  if (characters.length < MIN_PASSWORD_LENGTH) return `Use ${MIN_PASSWORD_LENGTH} characters or more; a few words in a row are fine.`;
  if (characters.length > MAX_PASSWORD_LENGTH) return `Use at most ${MAX_PASSWORD_LENGTH} characters.`;
  if (new Set(characters).size < MIN_DIFFERENT_CHARACTERS) return 'Use more different characters.';
  if (isCommon(characters.join(''))) return 'Many people use this one. Choose words that others would not put together.';
  return undefined;
}

/** True for a sentence of the list, or for text made of nothing but common blocks (with separators between). */
function isCommon(password: string): boolean {
  const bare = password.toLowerCase().replace(/[\s_.,;:!?+*#-]+/g, '');
  if (COMMON_SENTENCES.includes(bare)) return true;
  const reachable = new Set([0]);
  for (let end = 1; end <= bare.length; end += 1) {
    if (COMMON_BLOCKS.some((block) => reachable.has(end - block.length) && bare.endsWith(block, end))) reachable.add(end);
  }
  return reachable.has(bare.length);
}

/** A password that somebody is about to choose. */
export const IsNewPassword = () =>
  ValidateBy({
    name: 'isNewPassword',
    validator: {
      validate: (value: unknown) => typeof value === 'string' && passwordFault(value) === undefined,
      defaultMessage: (argument) => (typeof argument?.value === 'string' ? (passwordFault(argument.value) ?? '') : 'Choose a password.'),
    },
  });
