import { chakra } from '@chakra-ui/react';
import { type Column, DataTable } from '../../../components/data-table';
import { ReadProblem } from '../../../components/read-problem';
import { StateMark } from '../../../components/state-mark';
import { TextLink } from '../../../components/text-link';
import { formatDay, formatQuantity } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import { type MachineLens, type SpotMeasurement, useSpots } from '../machines.api';

/** Every spot that was measured of a lens on this machine; nothing where nobody did. */
export function LensSpots({ pair }: { pair: MachineLens }) {
  const { data, error, mutate } = useSpots(pair);
  if (data === undefined && error !== undefined)
    return <ReadProblem problem={error} thing={`the spots of ${pair.lensName}`} onRetry={() => void mutate()} />;
  if (data === undefined || data.items.length === 0) return null;
  return (
    <chakra.section mt="4" aria-label={`Measured spots with ${pair.lensName}`}>
      <chakra.h3 mb="2">Measured spots with {pair.lensName}</chakra.h3>
      <DataTable label={`Measured spots with ${pair.lensName}`} columns={COLUMNS} rows={data.items} rowKey={({ id }) => id} />
    </chakra.section>
  );
}

const COLUMNS: readonly Column<SpotMeasurement>[] = [
  {
    key: 'spot',
    header: 'Spot',
    onPhone: 'title',
    cell: ({ spotUm, standardErrorUm }) => (
      <chakra.span whiteSpace="nowrap">
        <b>{formatQuantity(spotUm, 'um')}</b>
        {standardErrorUm !== null && ` ± ${formatQuantity(standardErrorUm, 'um')}`}
      </chakra.span>
    ),
  },
  {
    key: 'method',
    header: 'How',
    cell: ({ method, coupon, fit }) => (
      <chakra.div py="1.5">
        {method}
        {coupon !== null && (
          <>
            {', '}
            <TextLink to={paths.coupon(coupon.code)}>{coupon.code}</TextLink>
          </>
        )}
        {fit !== null && (
          <chakra.span display="block" color="fg.muted">
            threshold {formatQuantity(fit.thresholdPeakFluenceJPerCm2, 'J/cm²', { significantDigits: 3 })} peak
          </chakra.span>
        )}
      </chakra.div>
    ),
  },
  { key: 'day', header: 'Measured on', cell: ({ measuredOn }) => <chakra.span whiteSpace="nowrap">{formatDay(measuredOn)}</chakra.span> },
  { key: 'by', header: 'Entered by', cell: ({ createdByName }) => createdByName },
  {
    key: 'use',
    header: 'In use',
    cell: ({ isInUse }) => (isInUse ? <StateMark state="passes">in use</StateMark> : <chakra.span color="fg.muted">earlier</chakra.span>),
  },
];
