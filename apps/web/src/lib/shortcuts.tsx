import { createContext, type ReactNode, useContext, useEffect, useMemo, useRef, useState, useSyncExternalStore } from 'react';

/** 'mod+k' is Ctrl K or ⌘ K; a single character is that key without a modifier, outside fields. */
type Shortcut = { keys: string; meaning: string };

type Registry = {
  add: (shortcut: Shortcut) => () => void;
  subscribe: (listener: () => void) => () => void;
  list: () => readonly Shortcut[];
  areSingleKeysOn: boolean;
  setAreSingleKeysOn: (isOn: boolean) => void;
};

const STORAGE_KEY = 'proofplate.single-keys';
const ShortcutContext = createContext<Registry | undefined>(undefined);

export function ShortcutProvider({ children }: { children: ReactNode }) {
  const [areSingleKeysOn, setIsOn] = useState(readSetting);
  const [store] = useState(createStore);
  const registry = useMemo(
    () => ({
      ...store,
      areSingleKeysOn,
      setAreSingleKeysOn: (isOn: boolean) => {
        storeSetting(isOn);
        setIsOn(isOn);
      },
    }),
    [store, areSingleKeysOn],
  );
  return <ShortcutContext.Provider value={registry}>{children}</ShortcutContext.Provider>;
}

/** Runs `handler` on the keys while the component is on the page, and lists them under `?`. */
export function useShortcut(keys: string, meaning: string, handler: () => void): void {
  const { add, areSingleKeysOn } = useRegistry();
  const latest = useRef(handler);
  latest.current = handler;
  const isSingle = !keys.startsWith('mod+');
  useEffect(() => add({ keys, meaning }), [add, keys, meaning]);
  useEffect(() => {
    if (isSingle && !areSingleKeysOn) return undefined;
    const handleKeyDown = (event: KeyboardEvent) => {
      if (!matches(event, keys)) return;
      event.preventDefault();
      latest.current();
    };
    document.addEventListener('keydown', handleKeyDown);
    return () => document.removeEventListener('keydown', handleKeyDown);
  }, [keys, isSingle, areSingleKeysOn]);
}

/** Lists keys that a component handles itself, such as the arrows of the plate. */
export function useListedKeys(keys: string, meaning: string): void {
  const { add } = useRegistry();
  useEffect(() => add({ keys, meaning }), [add, keys, meaning]);
}

export function useShortcutList(): readonly Shortcut[] {
  const { subscribe, list } = useRegistry();
  return useSyncExternalStore(subscribe, list);
}

/** Single-key shortcuts can be turned off, for people who dictate or whose hands shake. */
export function useSingleKeySetting(): [isOn: boolean, setIsOn: (isOn: boolean) => void] {
  const { areSingleKeysOn, setAreSingleKeysOn } = useRegistry();
  return [areSingleKeysOn, setAreSingleKeysOn];
}

function useRegistry(): Registry {
  const registry = useContext(ShortcutContext);
  if (registry === undefined) throw new Error('Shortcuts need a ShortcutProvider above them');
  return registry;
}

function createStore(): Pick<Registry, 'add' | 'subscribe' | 'list'> {
  let shortcuts: readonly Shortcut[] = [];
  const listeners = new Set<() => void>();
  const change = (next: readonly Shortcut[]) => {
    shortcuts = next;
    for (const listener of listeners) listener();
  };
  return {
    add: (shortcut) => {
      change([...shortcuts, shortcut]);
      return () => change(shortcuts.filter((other) => other !== shortcut));
    },
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    list: () => shortcuts,
  };
}

function matches(event: KeyboardEvent, keys: string): boolean {
  if (keys.startsWith('mod+')) return (event.ctrlKey || event.metaKey) && !event.altKey && event.key.toLowerCase() === keys.slice(4);
  if (event.ctrlKey || event.metaKey || event.altKey || isTyping(event.target)) return false;
  return event.key.toLowerCase() === keys.toLowerCase();
}

function isTyping(target: EventTarget | null): boolean {
  return target instanceof HTMLElement && (target.isContentEditable || /^(?:INPUT|TEXTAREA|SELECT)$/.test(target.tagName));
}

function readSetting(): boolean {
  try {
    return localStorage.getItem(STORAGE_KEY) !== 'off';
  } catch {
    return true;
  }
}

function storeSetting(isOn: boolean): void {
  try {
    localStorage.setItem(STORAGE_KEY, isOn ? 'on' : 'off');
  } catch {
    // Without storage the setting holds until the page is closed.
  }
}
