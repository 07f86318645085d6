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
