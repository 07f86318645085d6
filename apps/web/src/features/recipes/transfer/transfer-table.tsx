import { chakra } from '@chakra-ui/react';
import { ChangeTrack } from '../../../components/change-bar';
import type { TransferGroup, TransferRow } from './transfer-rows';

export type TransferTableProps = {
  groups: readonly TransferGroup[];
  sourceName: string;
  targetName: string;
  /** Only what keeps the numbers has the look of a proposal. */
  isEquivalent: boolean;
};

const CELL = {
  py: '1.5',
  px: { base: '1', sm: '2' },
  borderBottom: 'hairline',
  verticalAlign: 'baseline',
  overflowWrap: 'anywhere',
} as const;
/** End of the bars: what is kept moves by a few percent at most. */
const BAR_LIMIT = 0.2;

/** Source and target side by side, with how far each number moved. */
export function TransferTable({ groups, sourceName, targetName, isEquivalent }: TransferTableProps) {
  return (
    <chakra.table width="full" tableLayout="fixed" borderCollapse="separate" borderSpacing="0" fontSize="sm" lineHeight="sm">
      <colgroup>
        <chakra.col width={{ base: '32%', sm: '34%' }} />
        <col />
        <col />
        <chakra.col width={{ base: '20%', sm: '26%' }} />
      </colgroup>
      <thead>
        <tr>
          <chakra.th {...CELL} scope="col" textAlign="start" fontWeight="normal" color="fg.muted">
            Number
          </chakra.th>
          <chakra.th {...CELL} scope="col" textAlign="end" fontWeight="normal" color="fg.muted">
            {sourceName}
          </chakra.th>
          <chakra.th {...CELL} scope="col" textAlign="end" bg={isEquivalent ? 'bg.subtle' : undefined}>
            {targetName}
          </chakra.th>
          <chakra.th {...CELL} scope="col" textAlign="start" fontWeight="normal" color="fg.muted">
            Change
          </chakra.th>
        </tr>
      </thead>
      {groups.map(({ title, rows }) => (
        <tbody key={title}>
          <tr>
            <chakra.th
              scope="rowgroup"
              colSpan={4}
              textAlign="start"
              pt="3.5"
              pb="1.5"
              px={{ base: '1', sm: '2' }}
              fontSize="md"
              borderBottom="hairline"
            >
              {title}
            </chakra.th>
          </tr>
          {rows.map((row) => (
            <Row key={row.key} row={row} isEquivalent={isEquivalent} />
          ))}
        </tbody>
      ))}
    </chakra.table>
  );
}

function Row({ row: { label, unit, source, target, share, change }, isEquivalent }: { row: TransferRow; isEquivalent: boolean }) {
  return (
    <tr>
      <chakra.th {...CELL} scope="row" textAlign="start" fontWeight="normal">
        {label}{' '}
        <chakra.span color="fg.muted" whiteSpace="nowrap">
          {unit}
        </chakra.span>
      </chakra.th>
      <chakra.td {...CELL} textAlign="end">
        {source}
      </chakra.td>
      <chakra.td
        {...CELL}
        textAlign="end"
        fontWeight={isEquivalent ? 'semibold' : 'normal'}
        color={isEquivalent ? undefined : 'fg.muted'}
        bg={isEquivalent ? 'bg.subtle' : undefined}
      >
        {target}
      </chakra.td>
      <chakra.td {...CELL}>
        <chakra.span display="flex" alignItems="center" gap="2">
          {share !== undefined && (
            <chakra.span flex="0 1 84px" minWidth="0" display={{ base: 'none', md: 'block' }}>
              <ChangeTrack change={share} limit={BAR_LIMIT} />
            </chakra.span>
          )}
          {change}
        </chakra.span>
      </chakra.td>
    </tr>
  );
}
