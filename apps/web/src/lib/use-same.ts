import { useMemo } from 'react';

/** The value as it was as long as it says the same, so that what it is handed to is not drawn again. Plain values only. */
export function useSame<T extends object | null | undefined>(value: T): T {
  const text = value === undefined ? undefined : JSON.stringify(value);
  // read from its own text, which is all that it says
  return useMemo(() => (text === undefined ? undefined : JSON.parse(text)) as T, [text]);
}
