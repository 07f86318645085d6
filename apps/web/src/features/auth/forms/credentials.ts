// Rules that the forms of this feature share; the server holds the same ones and decides.

export const PASSWORD_MIN_LENGTH = 15;
export const PASSWORD_HELP = `At least ${PASSWORD_MIN_LENGTH} characters. A few words in a row are fine, and so is pasting.`;

export const emailRules = {
  required: 'Enter the e-mail address you sign in with',
  pattern: { value: /^[^\s@]+@[^\s@]+\.[^\s@]+$/, message: 'Enter an address like name@shop.example' },
};

export const newPasswordRules = {
  required: 'Enter a password',
  minLength: { value: PASSWORD_MIN_LENGTH, message: `Use ${PASSWORD_MIN_LENGTH} characters or more` },
};

export const nameRules = { required: 'Enter your name as it shall stand under what you sign' };
