import { ValidateBy } from 'class-validator';

/** A language tag that this runtime can format for. */
export const IsLocaleTag = () =>
  ValidateBy({
    name: 'isLocale',
    validator: { validate: isLocaleTag, defaultMessage: () => 'Choose a language, such as en-GB.' },
  });

function isLocaleTag(value: unknown): boolean {
  if (typeof value !== 'string' || value.length > 35) return false;
  try {
    return Intl.DateTimeFormat.supportedLocalesOf(value).length > 0;
  } catch {
    return false;
  }
}
