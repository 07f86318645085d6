import { ValidateBy } from 'class-validator';
import { isDay } from './is-day';

const FORM = /^(\d{4}-\d{2}-\d{2})T\d{2}:\d{2}(?::\d{2}(?:\.\d{1,9})?)?(?:Z|[+-]\d{2}:\d{2})$/;

/** A moment of RFC 3339. Without its zone a time is another one on each server, and weeks or ordinal days are no date to JavaScript. */
export function isMoment(text: string): boolean {
  const day = FORM.exec(text)?.[1];
  return day !== undefined && isDay(day) && !Number.isNaN(Date.parse(text));
}

export const IsMoment = () =>
  ValidateBy({
    name: 'isMoment',
    validator: {
      validate: (value: unknown) => typeof value === 'string' && isMoment(value),
      defaultMessage: () => 'Give a date and a time with its zone, such as 2026-03-31T08:30:00Z.',
    },
  });
