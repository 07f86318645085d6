import { chakra, Flex } from '@chakra-ui/react';
import { ButtonLink } from '../../../components/button';
import { TextLink } from '../../../components/text-link';
import { paths } from '../../../lib/paths';
import { useWaitingCoupons } from '../coupons.api';

/** Planned coupons that wait for marking on a machine; nothing where none waits, or where the list can't be read just now. */
export function WaitingCoupons({ machineId }: { machineId: string }) {
  const { data } = useWaitingCoupons(machineId);
  if (data === undefined || data.items.length === 0) return null;
  return (
    <chakra.section aria-label="Coupons to mark here" mt="6" pt="3" borderTop="hairline" borderColor="border">
      <chakra.h2 fontSize="md" mb="2">
        Coupons to mark here
      </chakra.h2>
      <chakra.ul display="grid" gap="2">
        {data.items.map(({ id, code, title, material, finish }) => (
          <li key={id}>
            <Flex align="center" gap="3" wrap="wrap">
              <ButtonLink size="glove" to={paths.markCoupon(code)}>
                Mark {code}
              </ButtonLink>
              <chakra.span fontSize="sm" lineHeight="sm" color="fg.muted" minW="0">
                {title === '' ? `${material.name}, ${finish.name}` : title}
              </chakra.span>
            </Flex>
          </li>
        ))}
      </chakra.ul>
      {data.nextCursor !== null && (
        <chakra.p mt="2" fontSize="sm">
          <TextLink to={`${paths.coupons}?state=planned&machine=${encodeURIComponent(machineId)}`}>All coupons that wait here</TextLink>
        </chakra.p>
      )}
    </chakra.section>
  );
}
