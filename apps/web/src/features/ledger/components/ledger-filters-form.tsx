import { chakra } from '@chakra-ui/react';
import { useEffect, useRef, useState } from 'react';
import { SelectField, TextField } from '../../../components/field';
import { ACTIONS } from '../action-words';
import { useLedgerActors } from '../ledger.api';
import { type FilterName, type LedgerFilters, readCode } from '../ledger-filters';

/** Two choices above three short fields on a tablet, all in one row on a desk. */
const PLACES = {
  '& > *': { gridColumn: { base: 'auto', sm: 'span 2', xl: 'span 2' } },
  '& > :nth-of-type(-n + 2)': { gridColumn: { base: 'auto', sm: 'span 3', xl: 'span 3' } },
} as const;

const TYPING_PAUSE_MS = 400;
const ACTION_OPTIONS = Object.entries(ACTIONS).map(([value, { label }]) => ({ value, label }));

export type LedgerFiltersFormProps = {
  /** Keeps the controls of two copies on one page apart. */
  idPrefix: string;
  filters: LedgerFilters;
  onFilter: (name: FilterName, value: string) => void;
};

/** Results follow every choice; nothing has to be sent. */
export function LedgerFiltersForm({ idPrefix, filters, onFilter }: LedgerFiltersFormProps) {
  const { data: actors } = useLedgerActors();
  const people = (actors?.items ?? []).map(({ memberId, name, isActive }) => ({
    value: memberId,
    label: isActive ? name : `${name}, left`,
  }));
  return (
    <chakra.div
      role="search"
      aria-label="Search the ledger"
      display="grid"
      gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: 'repeat(6, minmax(0, 1fr))', xl: 'repeat(12, minmax(0, 1fr))' }}
      gap="3"
      css={PLACES}
    >
      <SelectField
        name={`${idPrefix}-who`}
        label="Who"
        placeholder="Everybody"
        options={people}
        value={filters.actorMemberId ?? ''}
        onChange={(event) => onFilter('actorMemberId', event.currentTarget.value)}
      />
      <SelectField
        name={`${idPrefix}-action`}
        label="What happened"
        placeholder="Everything"
        options={ACTION_OPTIONS}
        value={filters.action ?? ''}
        onChange={(event) => onFilter('action', event.currentTarget.value)}
      />
      <CodeField name={`${idPrefix}-code`} code={filters.subjectCode ?? ''} onCode={(code) => onFilter('subjectCode', code)} />
      <TextField
        name={`${idPrefix}-from`}
        label="From"
        type="date"
        max={filters.toDay}
        value={filters.fromDay ?? ''}
        onChange={(event) => onFilter('fromDay', event.currentTarget.value)}
      />
      <TextField
        name={`${idPrefix}-to`}
        label="To"
        type="date"
        min={filters.fromDay}
        value={filters.toDay ?? ''}
        onChange={(event) => onFilter('toDay', event.currentTarget.value)}
      />
    </chakra.div>
  );
}

/** Results follow as soon as what is typed is a code; Enter and leaving the field say so when it is none. */
function CodeField({ name, code, onCode }: { name: string; code: string; onCode: (code: string) => void }) {
  const [typed, setTyped] = useState(code);
  const [isTold, setIsTold] = useState(false);
  useEffect(() => setTyped(code), [code]);
  const isUnreadable = typed.trim() !== '' && readCode(typed) === undefined;
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  useEffect(() => () => clearTimeout(timer.current), []);
  const handleType = (text: string) => {
    setTyped(text);
    clearTimeout(timer.current);
    const read = text.trim() === '' ? '' : readCode(text);
    // "R-1" is a code on the way to "R-12": the list waits for the pause.
    if (read !== undefined && read !== code) timer.current = setTimeout(() => onCode(read), TYPING_PAUSE_MS);
  };
  const settle = () => {
    clearTimeout(timer.current);
    setIsTold(isUnreadable);
    if (!isUnreadable) onCode(readCode(typed) ?? '');
  };
  return (
    <TextField
      name={name}
      label="Code"
      autoComplete="off"
      autoCapitalize="characters"
      spellCheck={false}
      value={typed}
      error={isTold && isUnreadable ? 'Type a code like R-0031' : undefined}
      onChange={(event) => handleType(event.currentTarget.value)}
      onBlur={settle}
      onKeyDown={(event) => {
        if (event.key === 'Enter') settle();
      }}
    />
  );
}
