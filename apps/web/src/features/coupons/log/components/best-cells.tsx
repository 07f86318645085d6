import { chakra } from '@chakra-ui/react';
import { Panel } from '../../../../components/page';
import { StateMark } from '../../../../components/state-mark';
import { formatNumber } from '../../../../lib/format';
import type { CouponCell } from '../../coupons.api';
import type { Inspection } from '../log.api';

const MOST_SHOWN = 5;

/** The cells in the order of the criteria, then of the ratings; a press leads to the cell. */
export function BestCells({
  cells,
  inspection,
  onChoose,
}: {
  cells: readonly CouponCell[];
  inspection: Inspection;
  onChoose: (address: string) => void;
}) {
  const addresses = new Map(cells.map(({ id, address }) => [id, address]));
  const ranked = inspection.verdicts
    .flatMap((verdict) => {
      const address = addresses.get(verdict.cellId);
      return verdict.rank === null || address === undefined ? [] : [{ ...verdict, rank: verdict.rank, address }];
    })
    .sort((one, other) => one.rank - other.rank)
    .slice(0, MOST_SHOWN);
  if (ranked.length === 0) return null;
  return (
    <Panel px="5" py="3" aria-label="Best cells">
      <chakra.h2 mb="1">Best cells</chakra.h2>
      <ol>
        {ranked.map(({ cellId, address, rank, meanRating, meets }) => (
          <li key={cellId}>
            <chakra.button
              type="button"
              onClick={() => onChoose(address)}
              display="grid"
              gridTemplateColumns="32px 56px 1fr auto"
              alignItems="center"
              width="full"
              minHeight={{ base: 'touch', lg: 'row' }}
              textAlign="left"
              cursor="pointer"
              fontSize="sm"
              _hover={{ bg: 'bg.subtle' }}
            >
              <chakra.span color="fg.muted">{rank}</chakra.span>
              <b>{address}</b>
              <chakra.span color="fg.muted">
                {meanRating === null ? 'not rated' : `rated ${formatNumber(meanRating, { decimals: meanRating % 1 === 0 ? 0 : 1 })}`}
              </chakra.span>
              <MeetsMark meets={meets} hasCriteria={(inspection.criteria ?? []).length > 0} />
            </chakra.button>
          </li>
        ))}
      </ol>
    </Panel>
  );
}

function MeetsMark({ meets, hasCriteria }: { meets: boolean | null; hasCriteria: boolean }) {
  if (!hasCriteria) return null;
  if (meets === null) return <StateMark state="unknown">not all measured</StateMark>;
  return meets ? <StateMark state="passes">meets the criteria</StateMark> : <StateMark state="fails">fails a criterion</StateMark>;
}
