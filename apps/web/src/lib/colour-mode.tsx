import { createContext, type ReactNode, useContext, useEffect, useMemo, useState, useSyncExternalStore } from 'react';

/** 'system' follows the device; the other two stay until changed. */
export type ColourChoice = 'system' | 'light' | 'dark';
export type ColourMode = 'light' | 'dark';

// public/colour-mode.js reads the same key before the first paint.
const STORAGE_KEY = 'proofplate.colour-mode';
const DARK_QUERY = '(prefers-color-scheme: dark)';

type ColourModeValue = { choice: ColourChoice; mode: ColourMode; setChoice: (choice: ColourChoice) => void };

const ColourModeContext = createContext<ColourModeValue | undefined>(undefined);

export function ColourModeProvider({ children }: { children: ReactNode }) {
  const [choice, setStoredChoice] = useState<ColourChoice>(readChoice);
  const systemIsDark = useSyncExternalStore(subscribeToSystem, isSystemDark);
  const mode = choice === 'system' ? (systemIsDark ? 'dark' : 'light') : choice;

  useEffect(() => {
    const root = document.documentElement;
    root.classList.remove('light', 'dark');
    root.classList.add(mode);
    root.style.colorScheme = mode;
    // The early script painted the ground; from here on the theme's own rule does.
    root.style.background = '';
  }, [mode]);

  const value = useMemo(() => ({ choice, mode, setChoice: (next: ColourChoice) => setStoredChoice(storeChoice(next)) }), [choice, mode]);
  return <ColourModeContext.Provider value={value}>{children}</ColourModeContext.Provider>;
}

export function useColourMode(): ColourModeValue {
  const value = useContext(ColourModeContext);
  if (value === undefined) throw new Error('useColourMode needs a ColourModeProvider above it');
  return value;
}

function readChoice(): ColourChoice {
  try {
    const stored = localStorage.getItem(STORAGE_KEY);
    return stored === 'light' || stored === 'dark' ? stored : 'system';
  } catch {
    return 'system';
  }
}

function storeChoice(choice: ColourChoice): ColourChoice {
  try {
    if (choice === 'system') localStorage.removeItem(STORAGE_KEY);
    else localStorage.setItem(STORAGE_KEY, choice);
  } catch {
    // Without storage the choice holds until the page is closed.
  }
  return choice;
}

function subscribeToSystem(onChange: () => void): () => void {
  const query = window.matchMedia?.(DARK_QUERY);
  query?.addEventListener('change', onChange);
  return () => query?.removeEventListener('change', onChange);
}

function isSystemDark(): boolean {
  return window.matchMedia?.(DARK_QUERY).matches ?? false;
}
