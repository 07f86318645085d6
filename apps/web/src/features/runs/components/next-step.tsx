import { chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { CautionIcon } from '../../../components/icons';

/** What to do now that something came out wrong. */
export function NextStep({ children }: { children: ReactNode }) {
  return (
    <chakra.div
      role="status"
      display="grid"
      gridTemplateColumns="34px minmax(0, 1fr)"
      px="3.5"
      py="2.5"
      bg="straw.subtle"
      border="hairline"
      borderColor="straw.emphasized"
      borderRadius="md"
    >
      <chakra.span lineHeight="none" pt="0.5">
        <CautionIcon />
      </chakra.span>
      <div>{children}</div>
    </chakra.div>
  );
}
