import { chakra } from '@chakra-ui/react';
import { Fragment, type ReactNode } from 'react';

export type Fact = { label: string; value: ReactNode; unit?: string };

/** Names left, values right: the measured and the set values of a cell, the facts of a record. */
export function FactList({ facts }: { facts: readonly Fact[] }) {
  return (
    <chakra.dl display="grid" gridTemplateColumns="minmax(min-content, 1fr) fit-content(68%)" columnGap="3" fontSize="sm" lineHeight="sm">
      {facts.map(({ label, value, unit }) => (
        <Fragment key={label}>
          <chakra.dt color="fg.muted" py="1">
            {label}
          </chakra.dt>
          <chakra.dd textAlign="right" fontWeight="semibold" py="1" minW="0" overflowWrap="break-word">
            {value}
            {unit !== undefined && <chakra.span fontWeight="normal" color="fg.muted">{`\u00A0${unit}`}</chakra.span>}
          </chakra.dd>
        </Fragment>
      ))}
    </chakra.dl>
  );
}
