import { LONGEST_EMAIL, LONGEST_NAME, textRules } from '../../../lib/text-rules';

// Rules that the forms of this feature share; the server holds the same ones and decides.

export const PASSWORD_MIN_LENGTH = 15;
const PASSWORD_MAX_LENGTH = 128;
export const PASSWORD_HELP = `At least ${PASSWORD_MIN_LENGTH} characters. A few words in a row are fine, and so is pasting.`;

export const emailRules = {
  required: 'Enter the e-mail address you sign in with',
  maxLength: { value: LONGEST_EMAIL, message: `Use an address of at most ${LONGEST_EMAIL} characters` },
  pattern: { value: /^[^\s@]+@[^\s@]+\.[^\s@]+$/, message: 'Enter an address like name@shop.example' },
};

export const newPasswordRules = {
  required: 'Enter a password',
  minLength: { value: PASSWORD_MIN_LENGTH, message: `Use ${PASSWORD_MIN_LENGTH} characters or more` },
  validate: (password: string) => lengthOf(password) <= PASSWORD_MAX_LENGTH || `Use at most ${PASSWORD_MAX_LENGTH} characters`,
};

export const nameRules = textRules('Enter your name as it shall stand under what you sign', LONGEST_NAME);

/** The server counts code points of the normal form. */
const lengthOf = (password: string) => [...password.normalize('NFKC')].length;
