import { chakra } from '@chakra-ui/react';
import { StateMark } from '../../../components/state-mark';
import { grantWords } from '../../../lib/deviation-words';
import { formatCount } from '../../../lib/format';
import { useSession } from '../../../lib/session';
import type { Deviation } from '../deviations.api';

/** Permitted departures: what may differ, who granted it and until when. */
export function DeviationList({ deviations }: { deviations: readonly Deviation[] }) {
  const { shop } = useSession();
  return (
    <chakra.ul display="grid" gap="3">
      {deviations.map((deviation) => {
        const { id, description, reason, isLive, usedQuantity } = deviation;
        return (
          <chakra.li key={id} borderTop="hairline" pt="3" _first={{ borderTop: 'none', pt: '0' }}>
            <StateMark state={isLive ? 'caution' : 'superseded'}>{isLive ? 'May be used' : 'Ended'}</StateMark>
            <chakra.p fontWeight="semibold" overflowWrap="anywhere">
              {description}
            </chakra.p>
            <chakra.p fontSize="sm" lineHeight="sm" overflowWrap="anywhere">
              {reason}
            </chakra.p>
            <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
              {grantWords(deviation, shop.timeZone)}. {formatCount(usedQuantity, 'part')} marked under it so far.
            </chakra.p>
          </chakra.li>
        );
      })}
    </chakra.ul>
  );
}
