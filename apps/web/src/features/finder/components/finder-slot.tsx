import { chakra } from '@chakra-ui/react';
import { useRef, useState } from 'react';
import { ChevronDownIcon } from '../../../components/icons';
import type { SlotKey, SlotView } from '../finder.api';
import { inSentence, slotCaption } from '../sentence';
import { SlotPicker } from './slot-picker';

export type FinderSlotProps = {
  slot: SlotKey;
  view: SlotView;
  /** What stands in it; undefined: nothing yet. */
  shownId: string | undefined;
  onChoose: (id: string | undefined) => void;
};

/** One blank of the sentence. On a phone it is an underlined word of plain text. */
export function FinderSlot({ slot, view, shownId, onChoose }: FinderSlotProps) {
  const [isOpen, setIsOpen] = useState(false);
  const button = useRef<HTMLButtonElement>(null);
  const shown = view.options.find(({ id }) => id === shownId);
  const caption = slotCaption(slot, view.fitCount, shown === undefined || shown.count > 0);
  const close = () => {
    setIsOpen(false);
    button.current?.focus();
  };
  return (
    <chakra.span position="relative" display="inline-block" maxW="full" verticalAlign={{ base: 'middle', sm: 'top' }}>
      <Blank
        ref={button}
        type="button"
        aria-haspopup="dialog"
        aria-expanded={isOpen}
        data-open={isOpen || undefined}
        data-slot={slot}
        onClick={() => setIsOpen(true)}
      >
        <chakra.span srOnly>{slot}: </chakra.span>
        <BlankText data-blank="" data-empty={shown === undefined || undefined}>
          {shown === undefined ? BLANK_WORDS[slot] : inSentence(slot, shown.name)}
          <chakra.span display={{ base: 'none', sm: 'inline-block' }} lineHeight="none" aria-hidden="true">
            <ChevronDownIcon />
          </chakra.span>
        </BlankText>
        <chakra.span
          display={{ base: 'none', sm: 'block' }}
          fontSize="sm"
          lineHeight="1.5rem"
          fontWeight="normal"
          color="fg.muted"
          pl="2.5"
          textAlign="start"
          whiteSpace="nowrap"
        >
          <chakra.span srOnly>, </chakra.span>
          {caption}
        </chakra.span>
      </Blank>
      {isOpen && (
        <SlotPicker
          slot={slot}
          options={view.options}
          shownId={shownId}
          isChosen={view.chosenId !== null}
          onChoose={(id) => {
            onChoose(id);
            close();
          }}
          onClose={close}
        />
      )}
    </chakra.span>
  );
}

const BLANK_WORDS: Record<SlotKey, string> = {
  machine: 'which machine',
  lens: 'which',
  material: 'which material',
  finish: 'which',
  effect: 'which effect',
};

const Blank = chakra('button', {
  base: {
    fontWeight: 'semibold',
    color: 'brand.fg',
    cursor: 'pointer',
    borderRadius: 'md',
    textAlign: 'start',
    // 64 px and a gap of 8 for a gloved finger; the words of the sentence keep to the middle.
    lineHeight: { base: '1.5rem', sm: 'inherit' },
    minHeight: { base: 'glove', sm: '0' },
    py: { base: '5', sm: '0' },
    my: { base: '1', sm: '0' },
    '&:hover [data-blank]': { bg: { sm: 'brand.muted' } },
    '&[data-open] [data-blank]': { outline: { sm: '2px solid' }, outlineColor: 'brand.focusRing', outlineOffset: '2px' },
  },
});

const BlankText = chakra('span', {
  base: {
    textDecoration: { base: 'underline', sm: 'none' },
    textDecorationThickness: '2px',
    textUnderlineOffset: '4px',
    display: { base: 'inline', sm: 'inline-flex' },
    alignItems: 'center',
    gap: '2',
    minHeight: { sm: '40px' },
    px: { sm: '2.5' },
    bg: { sm: 'brand.subtle' },
    borderBottom: { sm: '2px solid' },
    borderColor: { sm: 'brand.solid' },
    borderRadius: { sm: '4px 4px 0 0' },
    '&[data-empty]': { fontWeight: 'normal', borderBottomStyle: 'dashed' },
  },
});
