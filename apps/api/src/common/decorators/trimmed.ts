import { Transform } from 'class-transformer';

/** White space around typed text is never meant. Not for passwords. */
export const Trimmed = () => Transform(({ value }) => (typeof value === 'string' ? value.trim() : value));
