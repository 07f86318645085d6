import { chakra } from '@chakra-ui/react';
import { type Column, DataTable } from '../../../components/data-table';
import { formatDate } from '../../../lib/format';
import { useSession } from '../../../lib/session';
import { letterWords } from '../letter-words';
import { type UndeliveredLetter, useUndeliveredLetters } from '../members.api';

/** Letters that never arrived, with the way out; nothing is drawn when there are none. */
export function UndeliveredLetters() {
  const { data } = useUndeliveredLetters();
  const { shop } = useSession();
  if (data === undefined || data.items.length === 0) return null;
  return (
    <chakra.section mt="8" aria-labelledby="letters-title">
      <chakra.h2 id="letters-title" mb="3">
        Letters that did not arrive
      </chakra.h2>
      <DataTable label="Letters that did not arrive" columns={columns(shop.timeZone)} rows={data.items} rowKey={({ id }) => id} />
    </chakra.section>
  );
}

function columns(timeZone: string): readonly Column<UndeliveredLetter>[] {
  return [
    {
      key: 'address',
      header: 'To',
      width: '26%',
      onPhone: 'title',
      cell: ({ address }) => <chakra.span overflowWrap="anywhere">{address}</chakra.span>,
    },
    { key: 'about', header: 'About', cell: ({ kind }) => <chakra.span whiteSpace="nowrap">{letterWords(kind).about}</chakra.span> },
    {
      key: 'written',
      header: 'Written',
      cell: ({ writtenAt }) => <chakra.span whiteSpace="nowrap">{formatDate(writtenAt, timeZone)}</chakra.span>,
    },
    {
      key: 'reason',
      header: 'Why not',
      cell: ({ reason }) => (
        <chakra.span color="fg.muted" overflowWrap="anywhere">
          {reason}
        </chakra.span>
      ),
    },
    { key: 'wayOut', header: 'What to do', cell: ({ kind }) => letterWords(kind).wayOut },
  ];
}
