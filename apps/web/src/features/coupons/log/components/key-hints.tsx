import { chakra, Flex } from '@chakra-ui/react';
import { Keycap } from '../../../../components/keycap';
import { useListedKeys } from '../../../../lib/shortcuts';
import { MOVES_AFTER_RATING, type MoveAfterRating } from '../moves';

const HINTS: readonly (readonly [keys: readonly string[], meaning: string])[] = [
  [['←', '↑', '↓', '→'], 'move'],
  [['0', '5'], 'rate'],
  [['T'], 'tags'],
  [['N'], 'note'],
  [['H'], 'next view'],
  [['U'], 'undo'],
  [['Enter'], 'open cell'],
  [['?'], 'all keys'],
];

export type KeyHintsProps = { move: MoveAfterRating; onMove: (move: MoveAfterRating) => void };

/** The keys that the plate handles itself, under `?` whether or not its cells may be rated now: pressed, they say why not. */
export function ListedKeys() {
  useListedKeys('← ↑ ↓ → Home End', 'Move over the plate');
  useListedKeys('0 – 5', 'Rate the cell and move on');
  useListedKeys('Enter', 'Open the cell');
  return null;
}

/** The keys of the page at a desk, and where a rating leads to. */
export function KeyHints({ move, onMove }: KeyHintsProps) {
  return (
    <Flex
      ml={{ base: '0', sm: '48px' }}
      mt="1.5"
      gap="4"
      rowGap="2"
      wrap="wrap"
      align="center"
      fontSize="sm"
      lineHeight="sm"
      color="fg.muted"
    >
      {HINTS.map(([keys, meaning]) => (
        <chakra.span key={meaning} display={{ base: 'none', lg: 'inline-flex' }} alignItems="center" gap="1.5" whiteSpace="nowrap">
          {keys.map((key, index) => (
            <chakra.span key={key}>
              {meaning === 'rate' && index > 0 && '– '}
              <Keycap>{key}</Keycap>
            </chakra.span>
          ))}
          {meaning}
        </chakra.span>
      ))}
      <chakra.label display="inline-flex" alignItems="center" gap="1.5" whiteSpace="nowrap">
        After a rating:
        <chakra.select
          value={move}
          onChange={({ target }) => onMove(MOVES_AFTER_RATING.find(({ value }) => value === target.value)?.value ?? 'run')}
          minHeight={{ base: 'touch', lg: '32px' }}
          px="2"
          border="hairline"
          borderColor="border.emphasized"
          borderRadius="md"
          bg="bg.panel"
          color="fg"
        >
          {MOVES_AFTER_RATING.map(({ value, label }) => (
            <option key={value} value={value}>
              {label}
            </option>
          ))}
        </chakra.select>
      </chakra.label>
    </Flex>
  );
}
