import type { KeyboardEvent } from 'react';

const STEPS: Readonly<Record<string, number>> = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 };

export type RadioProps = {
  role: 'radio';
  'aria-checked': boolean;
  tabIndex: 0 | -1;
  'data-radio': string;
  onClick: () => void;
  onKeyDown: (event: KeyboardEvent<HTMLElement>) => void;
};

type RovingRadio<T extends string> = { values: readonly T[]; value: T | undefined; onChange: (value: T) => void };

/** Props of the buttons of a radio group: one tab stop, arrows choose the next one and go round. */
export function useRovingRadio<T extends string>({ values, value, onChange }: RovingRadio<T>): (own: T) => RadioProps {
  const stop = value ?? values[0];
  return (own) => ({
    role: 'radio',
    'aria-checked': own === value,
    tabIndex: own === stop ? 0 : -1,
    'data-radio': own,
    onClick: () => onChange(own),
    onKeyDown: (event) => {
      const step = STEPS[event.key];
      if (step === undefined) return;
      event.preventDefault();
      const next = values[(values.indexOf(own) + step + values.length) % values.length];
      if (next === undefined) return;
      onChange(next);
      event.currentTarget.parentElement?.querySelector<HTMLElement>(`[data-radio="${CSS.escape(next)}"]`)?.focus();
    },
  });
}
