import { useCallback, useEffect, useRef, useState } from 'react';
import type { UseFormReturn } from 'react-hook-form';
import { keepPlan } from './kept-plan';
import type { PlanValues } from './plan-values';

const TYPING_PAUSE_MS = 300;

export type KeptPlan = {
  /** What is shown came from an earlier visit. */
  isRestored: boolean;
  startAfresh: () => void;
  /** It is saved: the next plan begins empty. */
  forget: () => void;
};

/** Keeps the plan under its key while it is typed: after a rest of the keys, and at once when the page is left. */
export function useKeptPlan(
  form: UseFormReturn<PlanValues>,
  key: string,
  { initial, wasKept }: { initial: PlanValues; wasKept: boolean },
): KeptPlan {
  const [isRestored, setIsRestored] = useState(wasKept);
  // undefined: nothing was typed since it was kept or forgotten
  const pending = useRef<ReturnType<typeof setTimeout>>(undefined);
  const drop = useCallback(() => {
    clearTimeout(pending.current);
    pending.current = undefined;
  }, []);
  const forget = useCallback(() => {
    drop();
    keepPlan(key, undefined);
  }, [drop, key]);
  useEffect(() => {
    const keep = () => {
      if (pending.current === undefined) return;
      drop();
      keepPlan(key, form.getValues());
    };
    const unsubscribe = form.subscribe({
      formState: { values: true },
      callback: () => {
        clearTimeout(pending.current);
        pending.current = setTimeout(keep, TYPING_PAUSE_MS);
      },
    });
    window.addEventListener('pagehide', keep);
    return () => {
      keep();
      unsubscribe();
      window.removeEventListener('pagehide', keep);
    };
  }, [form, key, drop]);
  const startAfresh = () => {
    form.reset(initial);
    forget();
    setIsRestored(false);
  };
  return { isRestored, startAfresh, forget };
}
