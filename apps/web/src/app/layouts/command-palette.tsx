import { chakra } from '@chakra-ui/react';
import { type KeyboardEvent, useDeferredValue, useEffect, useId, useMemo, useState } from 'react';
import { useNavigate } from 'react-router';
import { Dialog } from '../../components/dialog';
import { FindIcon } from '../../components/icons';
import { type FoundRecord, findRecords } from '../../lib/find-records';
import { paths } from '../../lib/paths';
import type { Role } from '../../lib/session';
import { navigationFor } from './navigation';

const TYPING_PAUSE_MS = 150;

type Entry = { id: string; to: string; label: string; kind: string };

export type CommandPaletteProps = { role: Role; onClose: () => void };

/** Finds any page, recipe, coupon, material or machine by a few letters. */
export function CommandPalette({ role, onClose }: CommandPaletteProps) {
  const navigate = useNavigate();
  const listId = useId();
  const [typed, setTyped] = useState('');
  const [activeIndex, setActiveIndex] = useState(0);
  const pages = useMemo(() => pagesFor(role), [role]);
  const records = useRecords(typed, role);
  const entries = useMemo(() => [...pages.filter((page) => matches(page.label, typed)), ...records], [pages, records, typed]);
  const active = entries[Math.min(activeIndex, entries.length - 1)];

  const open = (entry: Entry | undefined) => {
    if (entry === undefined) return;
    onClose();
    void navigate(entry.to);
  };
  const handleKeyDown = (event: KeyboardEvent) => {
    const step = { ArrowDown: 1, ArrowUp: -1 }[event.key];
    if (step !== undefined) {
      event.preventDefault();
      setActiveIndex((index) => Math.max(0, Math.min(entries.length - 1, index + step)));
    }
    if (event.key === 'Enter') open(active);
  };

  return (
    <Dialog title="Find" isTitleHidden width="wide" place="top" onClose={onClose}>
      <chakra.label display="flex" alignItems="center" gap="2" px="4" borderBottom="hairline">
        <FindIcon />
        <chakra.input
          role="combobox"
          aria-label="Find a page or a record"
          aria-expanded="true"
          aria-controls={listId}
          aria-autocomplete="list"
          aria-activedescendant={active === undefined ? undefined : `${listId}-${active.id}`}
          autoComplete="off"
          spellCheck={false}
          // The dialog was opened to type here.
          autoFocus
          value={typed}
          onChange={(event) => {
            setTyped(event.currentTarget.value);
            setActiveIndex(0);
          }}
          onKeyDown={handleKeyDown}
          flex="1"
          minHeight="act"
          fontSize="lg"
          bg="transparent"
          outline="none !important"
        />
      </chakra.label>
      <chakra.ul id={listId} role="listbox" aria-label="Found" p="2" maxHeight="50dvh" overflowY="auto">
        {entries.map((entry) => (
          <EntryRow key={entry.id} id={`${listId}-${entry.id}`} entry={entry} isActive={entry === active} onOpen={() => open(entry)} />
        ))}
      </chakra.ul>
      <chakra.p role="status" px="5" pb={entries.length === 0 ? '5' : '0'} color="fg.muted" srOnly={entries.length > 0}>
        {entries.length === 0 ? `Nothing is called “${typed}”.` : `${entries.length} found`}
      </chakra.p>
    </Dialog>
  );
}

type EntryRowProps = { id: string; entry: Entry; isActive: boolean; onOpen: () => void };

function EntryRow({ id, entry, isActive, onOpen }: EntryRowProps) {
  return (
    // The keys are handled by the combobox that owns the list.
    <chakra.li
      id={id}
      role="option"
      aria-selected={isActive}
      onClick={onOpen}
      display="flex"
      alignItems="center"
      justifyContent="space-between"
      gap="4"
      minHeight="touch"
      px="3"
      borderRadius="md"
      cursor="pointer"
      _hover={{ bg: 'bg.subtle' }}
      _selected={{ bg: 'brand.subtle', color: 'brand.fg', fontWeight: 'semibold' }}
    >
      <span>{entry.label}</span>
      <chakra.span color="fg.muted" fontWeight="normal" fontSize="sm">
        {entry.kind}
      </chakra.span>
    </chakra.li>
  );
}

function useRecords(typed: string, role: Role): readonly Entry[] {
  const query = useDeferredValue(typed.trim());
  const [records, setRecords] = useState<readonly FoundRecord[]>([]);
  useEffect(() => {
    if (query.length < 2) {
      setRecords([]);
      return undefined;
    }
    const leaving = new AbortController();
    const timer = setTimeout(() => {
      findRecords(query, role, leaving.signal).then(setRecords, () => setRecords([]));
    }, TYPING_PAUSE_MS);
    // An older answer must not overwrite a newer one.
    return () => {
      clearTimeout(timer);
      leaving.abort();
    };
  }, [query, role]);
  return useMemo(() => records.map(({ kind, id, to, label }) => ({ id: `${kind}-${id}`, to, label, kind })), [records]);
}

function pagesFor(role: Role): readonly Entry[] {
  const listed = navigationFor(role).map(({ to, label }) => ({ id: to, to, label, kind: 'page' }));
  const science = { id: paths.scienceIndex, to: paths.scienceIndex, label: 'How the numbers are worked out', kind: 'page' };
  return [...listed, science, { id: paths.account, to: paths.account, label: 'Your account', kind: 'page' }];
}

function matches(label: string, typed: string): boolean {
  return label.toLowerCase().includes(typed.trim().toLowerCase());
}
