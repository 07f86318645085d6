import { chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';

export type ActBarProps = {
  /** Beside the acts, for example a SignatureLine; left out on a phone. */
  lead?: ReactNode;
  /** On a phone the acts end the page instead of standing over it, where the page leads down to them anyway. */
  isInFlowOnPhone?: boolean;
  children: ReactNode;
};

/** The acts of a page at the machine: the last line at a desk, a bar above the bottom navigation below 1024 px. */
export function ActBar({ lead, isInFlowOnPhone = false, children }: ActBarProps) {
  return (
    <chakra.div
      display="flex"
      alignItems="center"
      gap={{ base: '2.5', sm: '4' }}
      position={{ base: isInFlowOnPhone ? 'static' : 'fixed', sm: 'fixed', lg: 'static' }}
      insetX="0"
      bottom="var(--pp-sizes-bar)"
      zIndex="acts"
      bg="bg"
      borderTop="hairline"
      px={{ base: isInFlowOnPhone ? '0' : '4', sm: '6', lg: '0' }}
      pt={{ base: '3', lg: '3.5' }}
      pb={{ base: '3', lg: '0' }}
      mt={{ base: '0', lg: '4' }}
    >
      {lead !== undefined && (
        <chakra.div display={{ base: 'none', sm: 'block' }} flex="1" minW="0" maxW="400px" mr="auto">
          {lead}
        </chakra.div>
      )}
      <chakra.div
        display="flex"
        flexWrap="wrap"
        gap={{ base: '2.5', sm: '4' }}
        flex={{ base: '1', sm: 'none' }}
        ml="auto"
        css={{ '& > *': { flex: { base: '1', sm: 'none' }, px: { base: '3', sm: '6' }, whiteSpace: { base: 'normal', sm: 'nowrap' } } }}
      >
        {children}
      </chakra.div>
    </chakra.div>
  );
}
