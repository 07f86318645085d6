import { chakra, Flex } from '@chakra-ui/react';
import { matchesWords } from '@proofplate/recipe-model';
import { type KeyboardEvent, useEffect, useId, useLayoutEffect, useMemo, useRef, useState } from 'react';
import { Button } from '../../../components/button';
import { CrossIcon } from '../../../components/icons';
import { formatCount } from '../../../lib/format';
import type { SlotKey, SlotOption } from '../finder.api';
import { inSentence } from '../sentence';

const ANY = '';
const EDGE_PX = 16;

type Row = { id: string; name: string; end: string; isMuted: boolean };

export type SlotPickerProps = {
  slot: SlotKey;
  options: readonly SlotOption[];
  shownId: string | undefined;
  /** Something was chosen here, so it can be taken back. */
  isChosen: boolean;
  onChoose: (id: string | undefined) => void;
  onClose: () => void;
};

/** The options of a slot with their counts: a popover under the slot, on a phone a sheet as high as the screen. */
export function SlotPicker({ slot, options, shownId, isChosen, onChoose, onClose }: SlotPickerProps) {
  const listId = useId();
  const frame = useRef<HTMLDivElement>(null);
  const [typed, setTyped] = useState('');
  const rows = useMemo(() => rowsOf(slot, options, typed, isChosen), [slot, options, typed, isChosen]);
  const [activeIndex, setActiveIndex] = useState(() =>
    Math.max(
      0,
      rows.findIndex(({ id }) => id === shownId),
    ),
  );
  const active = rows[Math.min(activeIndex, rows.length - 1)];
  useStayInView(frame);
  useEffect(() => {
    frame.current?.querySelector('[aria-selected=true]')?.scrollIntoView?.({ block: 'nearest' });
  }, [active?.id]);

  const choose = (row: Row | undefined) => {
    if (row !== undefined) onChoose(row.id === ANY ? undefined : row.id);
  };
  const handleKeyDown = (event: KeyboardEvent) => {
    const last = rows.length - 1;
    const next = { ArrowDown: activeIndex + 1, ArrowUp: activeIndex - 1, Home: 0, End: last }[event.key];
    if (next !== undefined) {
      event.preventDefault();
      setActiveIndex(Math.max(0, Math.min(last, next)));
    }
    if (event.key === 'Enter') {
      event.preventDefault();
      choose(active);
    }
    if (event.key === 'Escape') {
      event.stopPropagation();
      onClose();
    }
  };
  return (
    <Frame
      ref={frame}
      role="dialog"
      aria-label={`Choose the ${slot}`}
      onKeyDown={handleKeyDown}
      onBlur={(event) => {
        if (!event.currentTarget.contains(event.relatedTarget)) onClose();
      }}
    >
      <Flex gap="2" align="center">
        <Search
          type="text"
          role="combobox"
          aria-label={`Find a ${slot}`}
          aria-expanded="true"
          aria-controls={listId}
          aria-autocomplete="list"
          aria-activedescendant={active === undefined ? undefined : `${listId}-${active.id}`}
          autoComplete="off"
          spellCheck={false}
          // It was opened to type or tap here.
          autoFocus
          value={typed}
          onChange={(event) => {
            setTyped(event.currentTarget.value);
            setActiveIndex(0);
          }}
        />
        <Button
          kind="quiet"
          size="glove"
          shape="square"
          display={{ base: 'inline-flex', sm: 'none' }}
          aria-label="Close"
          onClick={onClose}
          icon={<CrossIcon />}
        />
      </Flex>
      <chakra.ul id={listId} role="listbox" aria-label={`The ${slot}`} mt="2" overflowY="auto" flex="1" maxHeight={{ sm: '336px' }}>
        {rows.map((row) => (
          <OptionRow key={row.id} id={`${listId}-${row.id}`} row={row} isActive={row === active} onChoose={() => choose(row)} />
        ))}
      </chakra.ul>
      <chakra.p role="status" px="3" py={rows.length === 0 ? '3' : '0'} color="fg.muted" srOnly={rows.length > 0}>
        {rows.length === 0 ? `No ${slot} is called “${typed}”.` : `${rows.length} to choose from`}
      </chakra.p>
    </Frame>
  );
}

type OptionRowProps = { id: string; row: Row; isActive: boolean; onChoose: () => void };

function OptionRow({ id, row, isActive, onChoose }: OptionRowProps) {
  return (
    // The keys are handled by the picker that owns the list; the pointer must not take the focus out of its field first.
    <chakra.li
      id={id}
      role="option"
      aria-selected={isActive}
      onPointerDown={(event) => event.preventDefault()}
      onClick={onChoose}
      display="flex"
      alignItems="center"
      justifyContent="space-between"
      gap="4"
      minHeight={{ base: 'glove', lg: 'touch' }}
      px="3"
      borderRadius="md"
      cursor="pointer"
      color={row.isMuted ? 'fg.subtle' : 'fg'}
      _hover={{ bg: 'bg.subtle' }}
      _selected={{ bg: 'brand.subtle', color: row.isMuted ? 'fg.subtle' : 'brand.fg', fontWeight: row.isMuted ? 'normal' : 'semibold' }}
    >
      <chakra.span overflowWrap="anywhere">{row.name}</chakra.span>
      <chakra.span textAlign="end" color={isActive && !row.isMuted ? 'inherit' : 'fg.muted'}>
        {row.end}
      </chakra.span>
    </chakra.li>
  );
}

function rowsOf(slot: SlotKey, options: readonly SlotOption[], typed: string, isChosen: boolean): Row[] {
  const found = options
    .filter(({ name, detail }) => matchesWords(typed, `${name} ${detail}`))
    .map(({ id, name, count, reason }) => ({
      id,
      name: inSentence(slot, name),
      end: reason ?? formatCount(count, 'recipe'),
      isMuted: count === 0,
    }));
  return isChosen && typed === '' ? [...found, { id: ANY, name: `any ${slot}`, end: '', isMuted: false }] : found;
}

/** A slot near the right edge opens its popover to the left of where it would begin. */
function useStayInView(frame: { current: HTMLDivElement | null }) {
  useLayoutEffect(() => {
    const element = frame.current;
    if (element === null || getComputedStyle(element).position !== 'absolute') return;
    const over = element.getBoundingClientRect().right - (document.documentElement.clientWidth - EDGE_PX);
    if (over > 0) element.style.marginLeft = `${-over}px`;
  }, [frame]);
}

const Frame = chakra('div', {
  base: {
    position: { base: 'fixed', sm: 'absolute' },
    inset: { base: '0', sm: 'auto' },
    top: { sm: '56px' },
    left: { sm: '0' },
    zIndex: { base: 'modal', sm: 'popover' },
    width: { sm: '340px' },
    display: 'flex',
    flexDirection: 'column',
    p: { base: '4', sm: '2' },
    bg: 'bg.panel',
    color: 'fg',
    fontSize: 'md',
    fontWeight: 'normal',
    lineHeight: 'md',
    textAlign: 'start',
    border: { sm: 'hairline' },
    borderRadius: { sm: 'md' },
    boxShadow: { sm: 'popover' },
  },
});

const Search = chakra('input', {
  base: {
    flex: '1',
    minW: '0',
    height: { base: 'glove', lg: 'touch' },
    px: '3',
    border: 'hairline',
    borderColor: 'border.emphasized',
    borderRadius: 'md',
    bg: 'bg.panel',
    outlineOffset: '-1px !important',
  },
});
