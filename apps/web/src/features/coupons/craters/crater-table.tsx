import { chakra } from '@chakra-ui/react';
import { type Column, DataTable } from '../../../components/data-table';
import { formatCount, formatNumber } from '../../../lib/format';
import type { CraterPoint } from './craters.api';

/** Closed it would not be printed. */
const OPEN_IN_PRINT = { '@media print': { '&::details-content': { contentVisibility: 'visible', height: 'auto' } } };

/** Every crater with its numbers, and why the line leaves it out. On a phone every row is a card, so it opens when it is asked for. */
export function CraterTable({ points }: { points: readonly CraterPoint[] }) {
  return (
    <chakra.details css={OPEN_IN_PRINT}>
      <chakra.summary cursor="pointer" color="brand.fg" py="2.5" width="fit-content">
        {formatCount(points.length, 'crater')} with pulse energy and place in the line
      </chakra.summary>
      <Table points={points} />
    </chakra.details>
  );
}

function Table({ points }: { points: readonly CraterPoint[] }) {
  return <DataTable label="Craters" density="dense" columns={COLUMNS} rows={points} rowKey={({ address }) => address} />;
}

const COLUMNS: readonly Column<CraterPoint>[] = [
  { key: 'cell', header: 'Cell', onPhone: 'title', cell: ({ address }) => <b>{address}</b> },
  {
    key: 'energy',
    header: 'Pulse energy, µJ',
    align: 'end',
    cell: ({ pulseEnergyUj }) =>
      pulseEnergyUj === null ? <Missing>not known</Missing> : formatNumber(pulseEnergyUj, { significantDigits: 4 }),
  },
  { key: 'diameter', header: 'Crater diameter, µm', align: 'end', cell: ({ diameterUm }) => formatNumber(diameterUm) },
  { key: 'square', header: 'D², µm²', align: 'end', cell: ({ diameterUm }) => formatNumber(diameterUm ** 2, { decimals: 0 }) },
  { key: 'pulses', header: 'Pulses on one place', align: 'end', cell: ({ series }) => series?.pulses ?? <Missing>not known</Missing> },
  { key: 'line', header: 'In the line', cell: placeOf },
];

function placeOf({ excludedBecause, isFarAbove }: CraterPoint) {
  if (excludedBecause !== null) return `left out: ${excludedBecause}`;
  return isFarAbove ? 'yes, more than ten thresholds' : 'yes';
}

const Missing = chakra('span', { base: { color: 'fg.muted' } });
