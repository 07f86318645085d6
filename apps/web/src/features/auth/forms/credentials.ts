// Rules that the forms of this feature share; the server holds the same ones and decides.

export const PASSWORD_MIN_LENGTH = 12;
export const PASSWORD_HELP = `At least ${PASSWORD_MIN_LENGTH} characters. Several words are good; any characters and pasting are fine.`;

export const emailRules = {
  required: 'Enter the e-mail address you sign in with',
  pattern: { value: /^[^\s@]+@[^\s@]+\.[^\s@]+$/, message: 'Enter an address like name@shop.example' },
};

export const newPasswordRules = {
  required: 'Enter a password',
  minLength: { value: PASSWORD_MIN_LENGTH, message: `Use ${PASSWORD_MIN_LENGTH} characters or more` },
};

export const nameRules = { required: 'Enter your name as it shall stand under what you sign' };
