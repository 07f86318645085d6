import { chakra } from '@chakra-ui/react';
import { Fragment, useState } from 'react';
import { ChevronDownIcon } from '../../../components/icons';
import { formatTime } from '../../../lib/format';
import { useSession } from '../../../lib/session';
import { eventSentence } from '../event-words';
import type { LedgerEvent } from '../ledger.api';
import { EventDetails } from './event-details';

const HASH_SHOWN = 10;

const Cell = chakra('td', {
  base: {
    display: { base: 'block', sm: 'table-cell' },
    verticalAlign: 'top',
    py: { base: '0', sm: '3' },
    px: { base: '0', sm: '2.5' },
    borderBottom: { base: 'none', sm: 'hairline' },
    _first: { pl: { sm: '4' } },
    _last: { pr: { sm: '4' } },
  },
});

const Head = chakra('th', {
  base: {
    textAlign: 'start',
    fontWeight: 'semibold',
    color: 'fg.muted',
    bg: 'bg.panel',
    px: '2.5',
    py: '2',
    borderBottom: 'hairline',
    borderColor: 'border.emphasized',
    whiteSpace: 'nowrap',
    _first: { pl: '4', borderTopLeftRadius: 'md' },
    _last: { pr: '4', borderTopRightRadius: 'md' },
  },
});

/** Event after event, newest first; one opens to what it changed. Below 600 px every event is a card. */
export function EventTable({ events }: { events: readonly LedgerEvent[] }) {
  const [openSeqs, setOpenSeqs] = useState<ReadonlySet<number>>(new Set());
  const toggle = (seq: number) =>
    setOpenSeqs((present) => (present.has(seq) ? new Set([...present].filter((other) => other !== seq)) : new Set([...present, seq])));
  return (
    <chakra.div
      bg={{ base: 'transparent', sm: 'bg.panel' }}
      border={{ base: 'none', sm: 'hairline' }}
      borderColor={{ sm: 'border' }}
      borderRadius="md"
    >
      <chakra.table
        role="table"
        aria-label="Events"
        display={{ base: 'block', sm: 'table' }}
        width="full"
        borderCollapse="separate"
        borderSpacing="0"
        fontSize="sm"
        lineHeight="sm"
      >
        <chakra.thead role="rowgroup" display={{ base: 'none', sm: 'table-header-group' }} position="sticky" top="0" zIndex="sticky">
          <chakra.tr role="row">
            <Head role="columnheader" scope="col" width="72px">
              No.
            </Head>
            <Head role="columnheader" scope="col">
              What happened
            </Head>
            <Head role="columnheader" scope="col">
              When
            </Head>
            <Head role="columnheader" scope="col" display={{ base: 'none', md: 'table-cell' }}>
              Hash
            </Head>
          </chakra.tr>
        </chakra.thead>
        <chakra.tbody role="rowgroup" display={{ base: 'grid', sm: 'table-row-group' }} gap="2">
          {events.map((event) => (
            <EventRow key={event.seq} event={event} isOpen={openSeqs.has(event.seq)} onToggle={() => toggle(event.seq)} />
          ))}
        </chakra.tbody>
      </chakra.table>
    </chakra.div>
  );
}

type EventRowProps = { event: LedgerEvent; isOpen: boolean; onToggle: () => void };

function EventRow({ event, isOpen, onToggle }: EventRowProps) {
  const { shop } = useSession();
  const detailsId = `event-${event.seq}`;
  return (
    <Fragment>
      <chakra.tr
        role="row"
        display={{ base: 'grid', sm: 'table-row' }}
        gridTemplateColumns="auto 1fr"
        columnGap="3"
        bg={{ base: 'bg.panel', sm: 'transparent' }}
        border={{ base: 'hairline', sm: 'none' }}
        borderTopRadius={{ base: 'md', sm: '0' }}
        borderBottomRadius={{ base: isOpen ? '0' : 'md', sm: '0' }}
        px={{ base: '3', sm: '0' }}
        pb={{ base: '3', sm: '0' }}
      >
        <Cell role="cell" color="fg.muted" order={{ base: '1', sm: 'initial' }}>
          {event.seq}
        </Cell>
        <Cell role="cell" gridColumn="1 / -1" order={{ base: '0', sm: 'initial' }} py={{ base: '0', sm: '0' }}>
          <chakra.button
            type="button"
            aria-expanded={isOpen}
            aria-controls={detailsId}
            onClick={onToggle}
            display="flex"
            alignItems="center"
            gap="1.5"
            minHeight="touch"
            width="full"
            textAlign="start"
            cursor="pointer"
            fontSize={{ base: 'md', sm: 'sm' }}
            borderRadius="md"
          >
            <chakra.span color="fg.muted" lineHeight="none" transform={isOpen ? 'none' : 'rotate(-90deg)'}>
              <ChevronDownIcon size={16} />
            </chakra.span>
            <chakra.span minW="0" overflowWrap="anywhere">
              {eventSentence(event)}
            </chakra.span>
          </chakra.button>
        </Cell>
        <Cell role="cell" color={{ base: 'fg.muted', sm: 'fg' }} whiteSpace="nowrap" order={{ base: '2', sm: 'initial' }}>
          {formatTime(event.at, shop.timeZone)}
        </Cell>
        <Cell role="cell" display={{ base: 'none', md: 'table-cell' }} whiteSpace="nowrap">
          <chakra.code fontFamily="mono" fontSize="sm" color="fg.muted">
            {event.hash.slice(0, HASH_SHOWN)}…
          </chakra.code>
        </Cell>
      </chakra.tr>
      {isOpen && (
        <chakra.tr role="row" display={{ base: 'block', sm: 'table-row' }} mt={{ base: '-2', sm: '0' }}>
          <chakra.td
            id={detailsId}
            role="cell"
            colSpan={4}
            display={{ base: 'block', sm: 'table-cell' }}
            bg={{ base: 'bg.panel', sm: 'bg.subtle' }}
            border={{ base: 'hairline', sm: 'none' }}
            borderBottom="hairline"
            borderTop="none"
            borderBottomRadius={{ base: 'md', sm: '0' }}
            px="4"
            py="4"
          >
            <EventDetails event={event} />
          </chakra.td>
        </chakra.tr>
      )}
    </Fragment>
  );
}
