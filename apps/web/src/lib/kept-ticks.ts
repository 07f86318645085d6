import { useCallback, useState } from 'react';

const KEY = 'proofplate.ticks.';

export type KeptTicks = {
  ticks: ReadonlySet<string>;
  setTick: (key: string, isTicked: boolean) => void;
  forget: () => void;
};

/** What was ticked of a revision before its run exists; kept over reload and from the look-up to the start, in this tab only. */
export function useKeptTicks(revisionId: string): KeptTicks {
  const [kept, setKept] = useState(() => ({ revisionId, ticks: read(revisionId) }));
  const current = kept.revisionId === revisionId ? kept.ticks : read(revisionId);
  const write = useCallback(
    (ticks: ReadonlySet<string>) => {
      store(revisionId, ticks);
      setKept({ revisionId, ticks });
    },
    [revisionId],
  );
  const setTick = (key: string, isTicked: boolean) => {
    const next = new Set(current);
    if (isTicked) next.add(key);
    else next.delete(key);
    write(next);
  };
  return { ticks: current, setTick, forget: () => write(new Set()) };
}

/** Key of a set-up step and of a value on the setting card, as the api knows them. */
export const setUpTick = (index: number) => `set-up.${index}`;
export const settingTick = (step: number, parameter: string) => `setting.${step}.${parameter}`;

function read(revisionId: string): ReadonlySet<string> {
  try {
    const stored: unknown = JSON.parse(sessionStorage.getItem(KEY + revisionId) ?? '[]');
    return new Set(Array.isArray(stored) ? stored.filter((key) => typeof key === 'string') : []);
  } catch {
    return new Set();
  }
}

function store(revisionId: string, ticks: ReadonlySet<string>): void {
  try {
    if (ticks.size === 0) sessionStorage.removeItem(KEY + revisionId);
    else sessionStorage.setItem(KEY + revisionId, JSON.stringify([...ticks]));
  } catch {
    // Without storage the ticks hold until the page is closed.
  }
}
