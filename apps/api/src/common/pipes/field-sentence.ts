import type { ValidationError } from 'class-validator';

/** Constraints that say what kind of value is wanted come first: a length means nothing for a number. */
const KIND_FIRST = ['whitelistValidation', 'isString', 'isInt', 'isNumber', 'isBoolean', 'isArray', 'isObject', 'isUuid', 'isEmail'];

const FIXED: Readonly<Record<string, string>> = {
  whitelistValidation: 'This field is not known here. Leave it out.',
  isString: 'Enter text.',
  isNotEmpty: 'Enter something here.',
  isDefined: 'This is needed.',
  isInt: 'Enter a whole number.',
  isNumber: 'Enter a number.',
  isPositive: 'Enter a number above zero.',
  isBoolean: 'Choose yes or no.',
  isArray: 'Give a list.',
  isObject: 'Give a group of fields.',
  nestedValidation: 'Give a group of fields.',
  isEmail: 'Enter an e-mail address, such as name@example.com.',
  isUuid: 'This does not name a stored item. Choose it again.',
  isTimeZone: 'Choose a time zone, such as Europe/Berlin.',
  isLocale: 'Choose a language, such as en-GB.',
  arrayUnique: 'Nothing may stand in this list twice.',
};

const NUMBERED: Readonly<Record<string, (limit: string) => string>> = {
  min: (limit) => `Enter ${limit} or more.`,
  max: (limit) => `Enter ${limit} or less.`,
  minLength: (limit) => `Enter at least ${limit} characters.`,
  maxLength: (limit) => `Enter at most ${limit} characters.`,
  arrayMinSize: (limit) => `Give at least ${limit}.`,
  arrayMaxSize: (limit) => `Give at most ${limit}.`,
};

/** One sentence that tells a person how to put the field right. A message of the DTO's own is kept as it is. */
export function fieldSentence(error: ValidationError): string {
  const constraints = error.constraints ?? {};
  const names = Object.keys(constraints);
  const own = Object.values(constraints).find((message) => !isLibraryText(message, error.property));
  if (error.value === null && !names.includes('whitelistValidation')) return 'Enter a value here, or leave the field out.';
  if (isMissing(error.value) && !names.includes('whitelistValidation')) return 'This is needed.';
  if (names.length === 1 && own !== undefined) return own;
  const name = KIND_FIRST.find((kind) => kind in constraints) ?? names[0] ?? '';
  const message = constraints[name] ?? '';
  if (!isLibraryText(message, error.property)) return message;
  return FIXED[name] ?? numbered(name, message) ?? oneOf(message) ?? own ?? 'This value cannot be used here.';
}

const isMissing = (value: unknown) => value === undefined || value === '';

/** The library begins its own texts with the property or with "each value in". */
const isLibraryText = (message: string, property: string) =>
  message.startsWith(`${property} `) || message.startsWith('each value in ') || message.startsWith(`property ${property} `);

function numbered(name: string, message: string): string | undefined {
  const limit = /-?\d+(?:\.\d+)?(?!.*\d)/.exec(message)?.[0];
  return limit === undefined ? undefined : NUMBERED[name]?.(limit);
}

function oneOf(message: string): string | undefined {
  const list = /one of the following values: (.*)$/.exec(message)?.[1];
  return list === undefined ? undefined : `Choose one of: ${list}.`;
}
