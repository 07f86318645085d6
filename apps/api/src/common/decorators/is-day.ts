import { ValidateBy } from 'class-validator';

const FORM = /^\d{4}-\d{2}-\d{2}$/;

/** A day of the calendar, such as 2026-05-14; 30 February is none. */
export const isDay = (text: string) => FORM.test(text) && isSameDay(new Date(`${text}T00:00:00Z`), text);

const isSameDay = (date: Date, text: string) => !Number.isNaN(date.getTime()) && date.toISOString().startsWith(text);

export const IsDay = () =>
  ValidateBy({
    name: 'isDay',
    validator: {
      validate: (value: unknown) => typeof value === 'string' && isDay(value),
      defaultMessage: () => 'Give a day of the calendar, such as 2026-05-14.',
    },
  });

const FURTHEST_EAST_MS = 14 * 3_600_000;

/** True for a day that has begun somewhere on earth: what was measured was not measured on a day to come. */
export const hasBegun = (day: string, now: Date) => new Date(`${day}T00:00:00Z`).getTime() <= now.getTime() + FURTHEST_EAST_MS;

export const HasBegun = () =>
  ValidateBy({
    name: 'hasBegun',
    validator: {
      validate: (value: unknown) => typeof value !== 'string' || !isDay(value) || hasBegun(value, new Date()),
      defaultMessage: () => 'This day is still to come. Give the day on which it was measured.',
    },
  });
