import { chakra } from '@chakra-ui/react';
import { Fragment } from 'react';
import { TextLink } from '../../../components/text-link';
import { paths } from '../../../lib/paths';
import { type ChangedValue, changedValues } from '../event-values';
import type { LedgerEvent } from '../ledger.api';

/** What an event changed, value by value, and where it stands in the chain. */
export function EventDetails({ event }: { event: LedgerEvent }) {
  const values = changedValues(event.before, event.after);
  return (
    <chakra.div display="grid" gap="4">
      {values.length === 0 ? (
        <chakra.p color="fg.muted">No values belong to this event.</chakra.p>
      ) : (
        <Values values={values} hasBefore={event.before !== null} />
      )}
      <chakra.dl display="grid" gridTemplateColumns={{ base: 'minmax(0, 1fr)', md: 'auto minmax(0, 1fr)' }} columnGap="4" rowGap="1">
        {[
          { label: 'Hash', value: event.hash },
          { label: 'Hash before', value: event.previousHash },
        ].map(({ label, value }) => (
          <Fragment key={label}>
            <chakra.dt color="fg.muted">{label}</chakra.dt>
            <chakra.dd fontFamily="mono" fontSize="sm" overflowWrap="anywhere">
              {value}
            </chakra.dd>
          </Fragment>
        ))}
      </chakra.dl>
      <Leads event={event} />
    </chakra.div>
  );
}

function Values({ values, hasBefore }: { values: readonly ChangedValue[]; hasBefore: boolean }) {
  return (
    <chakra.div overflowX="auto" tabIndex={0} role="group" aria-label="Values">
      <chakra.table width="full" maxW="1000px" borderCollapse="collapse" aria-label="What changed">
        <thead>
          <chakra.tr color="fg.muted" textAlign="start">
            <chakra.th scope="col" textAlign="start" fontWeight="semibold" pr="4" pb="1">
              Value
            </chakra.th>
            {hasBefore && (
              <chakra.th scope="col" textAlign="start" fontWeight="semibold" pr="4" pb="1">
                Before
              </chakra.th>
            )}
            <chakra.th scope="col" textAlign="start" fontWeight="semibold" pb="1">
              {hasBefore ? 'After' : 'As it is'}
            </chakra.th>
          </chakra.tr>
        </thead>
        <tbody>
          {values.map(({ path, before, after }) => (
            <chakra.tr key={path} verticalAlign="top" borderTop="hairline">
              <chakra.th scope="row" textAlign="start" fontWeight="normal" pr="4" py="1" minW="96px" overflowWrap="anywhere">
                {path}
              </chakra.th>
              {hasBefore && (
                <chakra.td pr="4" py="1" minW="88px" color="fg.muted" overflowWrap="anywhere">
                  {before}
                </chakra.td>
              )}
              <chakra.td py="1" minW="88px" fontWeight="semibold" overflowWrap="anywhere">
                {after}
              </chakra.td>
            </chakra.tr>
          ))}
        </tbody>
      </chakra.table>
    </chakra.div>
  );
}

/** Pages that show the thing itself, by the first letter of its code. */
const PAGE_OF: Readonly<Record<string, (code: string) => string>> = { R: paths.recipe, C: paths.coupon, J: paths.run };

function Leads({ event: { subjectCode } }: { event: LedgerEvent }) {
  const code = subjectCode?.split(' ')[0] ?? '';
  const page = PAGE_OF[code.charAt(0)];
  if (page === undefined) return null;
  return (
    <chakra.p display="flex" gap="5" flexWrap="wrap">
      <TextLink to={page(code)}>Open {code}</TextLink>
      <TextLink to={paths.ledgerOf(code)}>Every event of {code}</TextLink>
    </chakra.p>
  );
}
