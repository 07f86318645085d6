import { Box, chakra, Flex } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { TickIcon } from './icons';
import { type MarkState, StateMark } from './state-mark';

export type SettingRow = {
  key: string;
  /** As on the machine's panel. */
  label: string;
  /** Physical value or hint under the label. */
  note?: ReactNode;
  /** Why the note says no more; behind a press, so that the row stays a row. */
  noteReason?: string;
  /** As typed at the panel, true minus and the panel's decimals. */
  value: string;
  unit?: string;
};

export type SettingCardProps = {
  code: string;
  /** null: a draft has no number yet. */
  revision: number | null;
  state: MarkState;
  /** "In the order of Bench 2's panel". */
  caption: ReactNode;
  /** In the order of the panel. */
  rows: readonly SettingRow[];
  /** Keys of the rows that are set. Ticks are an aid; they never block anything. */
  ticked?: ReadonlySet<string>;
  onTick?: (key: string, isTicked: boolean) => void;
};

/** The nameplate with what is dialled at the machine. */
export function SettingCard({ code, revision, state, caption, rows, ticked = NONE, onTick }: SettingCardProps) {
  const next = onTick === undefined ? undefined : rows.find(({ key }) => !ticked.has(key))?.key;
  const revisionWords = revision === null ? 'draft' : `revision ${revision}`;
  return (
    <chakra.section
      aria-label={`Setting of ${code} ${revisionWords}`}
      position="relative"
      bg="bg.panel"
      border="hairline"
      borderColor="border.emphasized"
      borderRadius="md"
      px={{ base: '4', sm: '7' }}
      pt="3"
      pb="2"
    >
      <Rivets />
      <Flex justify="space-between" align="center" gap="3">
        <chakra.h2>
          {code}{' '}
          <chakra.span fontWeight="normal" color="fg.muted">
            {revisionWords}
          </chakra.span>
        </chakra.h2>
        <StateMark state={state} />
      </Flex>
      <Flex justify="space-between" gap="3" fontSize="sm" lineHeight="sm" color="fg.muted">
        <span>{caption}</span>
        {onTick !== undefined && (
          <chakra.span whiteSpace="nowrap" aria-live="polite">
            {rows.filter(({ key }) => ticked.has(key)).length} of {rows.length} set
          </chakra.span>
        )}
      </Flex>
      <chakra.ol mt="2">
        {rows.map((row, index) => (
          <Row key={row.key} row={row} order={index + 1} isNext={row.key === next} isTicked={ticked.has(row.key)} onTick={onTick} />
        ))}
      </chakra.ol>
    </chakra.section>
  );
}

const NONE: ReadonlySet<string> = new Set();

type RowProps = {
  row: SettingRow;
  order: number;
  isNext: boolean;
  isTicked: boolean;
  onTick: SettingCardProps['onTick'];
};

function Row({ row, order, isNext, isTicked, onTick }: RowProps) {
  return (
    <chakra.li
      display="grid"
      gridTemplateColumns={
        onTick === undefined ? '28px minmax(0, 1fr)' : { base: '22px minmax(0, 1fr) 44px', sm: '28px minmax(0, 1fr) 64px' }
      }
      alignItems="center"
      minHeight={{ base: 'glove', sm: '72px' }}
      borderTop="hairline"
      mx={{ base: '-4', sm: '-7' }}
      px={{ base: '4', sm: '7' }}
      aria-current={isNext ? 'step' : undefined}
      {...(isNext ? NEXT_ROW : {})}
    >
      <chakra.span color="fg.subtle" fontSize="sm" aria-hidden="true">
        {order}
      </chakra.span>
      {/* The value keeps its size and takes a line of its own where the label leaves too little room: on a narrow phone, in large text. */}
      <chakra.span display="flex" flexWrap="wrap" alignItems="center" columnGap="2" py="1">
        <chakra.span flex="1 1 0" minWidth="min-content" fontSize={{ base: 'lg', sm: 'xl' }} lineHeight="1.15">
          {row.label}
          {row.note !== undefined && <Note note={row.note} reason={row.noteReason} />}
        </chakra.span>
        <chakra.span display="flex" alignItems="center" justifyContent="flex-end" ml="auto" maxWidth="full">
          <chakra.span whiteSpace="nowrap" fontSize={NUMERAL} lineHeight="none" fontWeight="semibold" letterSpacing="tight">
            {row.value}
          </chakra.span>
          <chakra.span
            pl={{ base: '1.5', sm: '2.5' }}
            minWidth={{ base: '58px', sm: '84px' }}
            fontSize={{ base: 'lg', sm: 'xl' }}
            lineHeight="22px"
            color="fg.muted"
          >
            {row.unit}
          </chakra.span>
        </chakra.span>
      </chakra.span>
      {onTick !== undefined && <Tick label={`${row.label} is set`} isTicked={isTicked} onChange={(isOn) => onTick(row.key, isOn)} />}
    </chakra.li>
  );
}

/** 64 px, read from a step away; text of double size grows no further than a phone is wide. */
const NUMERAL = 'min(4rem, max(64px, 17vw))';

function Note({ note, reason }: { note: ReactNode; reason: string | undefined }) {
  if (reason === undefined)
    return (
      <chakra.span display="block" fontSize="sm" lineHeight="sm" color="fg.muted">
        {note}
      </chakra.span>
    );
  return (
    <chakra.details fontSize="sm" lineHeight="sm" color="fg.muted">
      <chakra.summary display="list-item" listStyle="none" py="1" cursor="pointer" textDecoration="underline" textUnderlineOffset="3px">
        {note}
      </chakra.summary>
      {reason}
    </chakra.details>
  );
}

const NEXT_ROW = { bg: 'straw.subtle', boxShadow: 'inset 4px 0 0 var(--pp-colors-straw-solid)' } as const;

export type TickProps = { label: string; isTicked: boolean; onChange: (isTicked: boolean) => void };

/** A round tick as large as a gloved thumb; used for settings and for steps. */
export function Tick({ label, isTicked, onChange }: TickProps) {
  return (
    <chakra.button
      type="button"
      aria-pressed={isTicked}
      aria-label={label}
      onClick={() => onChange(!isTicked)}
      width={{ base: '56px', sm: 'glove' }}
      height="glove"
      display="grid"
      placeItems="center"
      justifySelf="end"
      mr={{ base: '-14px', sm: '-12px' }}
      borderRadius="md"
      cursor="pointer"
      outlineOffset="-4px !important"
    >
      <chakra.span
        boxSize="32px"
        borderRadius="full"
        border="hairline"
        borderWidth="1.5px"
        borderColor={isTicked ? 'brand.solid' : 'border.emphasized'}
        bg={isTicked ? 'brand.solid' : 'transparent'}
        color="brand.contrast"
        display="grid"
        placeItems="center"
      >
        {isTicked && <TickIcon />}
      </chakra.span>
    </chakra.button>
  );
}

/** Four rivets; the top left one is solid, like the origin mark of a coupon. */
function Rivets() {
  return (
    <>
      {RIVET_PLACES.map((place, index) => (
        <Box
          key={Object.keys(place).join()}
          aria-hidden="true"
          position="absolute"
          boxSize="9px"
          borderRadius="full"
          border="hairline"
          borderWidth="1.5px"
          borderColor="border.emphasized"
          bg={index === 0 ? 'border.emphasized' : undefined}
          {...place}
        />
      ))}
    </>
  );
}

const RIVET_PLACES = [
  { left: '8px', top: '8px' },
  { right: '8px', top: '8px' },
  { left: '8px', bottom: '8px' },
  { right: '8px', bottom: '8px' },
];
