import { chakra } from '@chakra-ui/react';
import type { TransferReason } from '@proofplate/recipe-model';
import { TextLink } from '../../../components/text-link';
import { inShopNumbers } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import type { TransferPlaceRecord } from './transfer.api';

export type TransferReasonsProps = { reasons: readonly TransferReason[]; source: TransferPlaceRecord; target: TransferPlaceRecord };

/** Why there is no equivalent setting, or no number; what somebody can enter links to where it is entered. */
export function TransferReasons({ reasons, source, target }: TransferReasonsProps) {
  if (reasons.length === 0) return null;
  const placeOf = ({ side }: TransferReason) => (side === undefined ? undefined : side === 'source' ? source : target);
  return (
    <chakra.ul mt="2" display="grid" gap="1.5">
      {reasons.map((reason) => {
        const place = placeOf(reason);
        return (
          <chakra.li key={reason.text} overflowWrap="anywhere">
            {inShopNumbers(reason.text)}{' '}
            {place !== undefined && <TextLink to={paths.machineDetail(place.machine.id)}>Open {place.machine.name}</TextLink>}
          </chakra.li>
        );
      })}
    </chakra.ul>
  );
}
