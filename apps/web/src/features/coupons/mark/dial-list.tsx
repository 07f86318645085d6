import { chakra } from '@chakra-ui/react';
import type { DialRow } from './marking-order';

export type DialListProps = {
  label: string;
  rows: readonly DialRow[];
  /** Without a setting before there is nothing to compare with, and every row stands alike. */
  isFirst: boolean;
};

/** What the panel has to show, readable from a step away; only what changes stands out. */
export function DialList({ label, rows, isFirst }: DialListProps) {
  return (
    <chakra.ul aria-label={label} bg="bg.panel" border="hairline" borderColor="border.emphasized" borderRadius="md" overflow="hidden">
      {rows.map((row) => (
        <Row key={row.key} row={row} isQuiet={!isFirst && row.before === undefined} />
      ))}
    </chakra.ul>
  );
}

function Row({ row: { label, value, unit, spoken, before }, isQuiet }: { row: DialRow; isQuiet: boolean }) {
  const isChanged = before !== undefined;
  return (
    <chakra.li
      display="grid"
      gridTemplateColumns="minmax(0, 1fr) auto minmax(44px, auto)"
      alignItems="baseline"
      columnGap="2"
      px={{ base: '3', sm: '5' }}
      py="1"
      borderTop="hairline"
      borderLeft="4px solid"
      borderLeftColor={isChanged ? 'straw.solid' : 'transparent'}
      bg={isChanged ? 'straw.subtle' : 'transparent'}
      color={isQuiet ? 'fg.muted' : 'fg'}
      _first={{ borderTop: 'none' }}
    >
      <chakra.span minW="0" overflowWrap="anywhere">
        <chakra.span display="block" fontWeight={isChanged ? 'bold' : 'semibold'}>
          {label}
        </chakra.span>
        {isChanged && (
          <chakra.span display="block" fontSize="sm" lineHeight="sm" color="straw.fg">
            was {before}
          </chakra.span>
        )}
      </chakra.span>
      <chakra.span fontSize="7xl" lineHeight="none" fontWeight={isQuiet ? 'normal' : 'bold'} letterSpacing="tight">
        {value}
      </chakra.span>
      <chakra.span color="fg.muted" fontSize={{ base: 'md', sm: 'xl' }}>
        <span aria-hidden="true">{unit}</span>
        <chakra.span srOnly>{spoken}</chakra.span>
      </chakra.span>
    </chakra.li>
  );
}
