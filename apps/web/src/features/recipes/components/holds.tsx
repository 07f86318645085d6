import { chakra } from '@chakra-ui/react';
import { CautionIcon } from '../../../components/icons';
import { formatTime } from '../../../lib/format';
import { useSession } from '../../../lib/session';
import type { Recipe } from '../recipes.api';

/** A hold comes before everything else. */
export function Holds({ recipe: { holds, machine } }: { recipe: Recipe }) {
  const { shop } = useSession();
  if (holds.length === 0) return null;
  return (
    <chakra.div role="alert">
      <chakra.ul display="grid" gap="2" mb="4">
        {holds.map(({ id, subject, reason, placedBy, placedAt }) => (
          <chakra.li
            key={id}
            display="grid"
            gridTemplateColumns="32px minmax(0, 1fr)"
            p="4"
            bg="straw.subtle"
            border="hairline"
            borderColor="straw.emphasized"
            borderRadius="md"
          >
            <chakra.span lineHeight="none">
              <CautionIcon />
            </chakra.span>
            <span>
              <b>{subject === 'machine' ? `${machine.name} is on hold. Start no run.` : 'This recipe is on hold. Start no run.'}</b>
              <chakra.span display="block">{reason}</chakra.span>
              <chakra.span display="block" fontSize="sm" color="fg.muted">
                Placed by {placedBy}, {formatTime(placedAt, shop.timeZone)}
              </chakra.span>
            </span>
          </chakra.li>
        ))}
      </chakra.ul>
    </chakra.div>
  );
}
