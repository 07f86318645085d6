import { Box, chakra, Flex } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { StateShape } from './state-mark';

export type ProblemNoticeProps = {
  /** What happened, in the reader's words. */
  what: string;
  /** What is safe: what was kept, what did not change. */
  safe?: ReactNode;
  /** What to do next. */
  todo?: ReactNode;
  /** Buttons for it. */
  actions?: ReactNode;
};

/** Every failure says what happened, what is safe and what to do. */
export function ProblemNotice({ what, safe, todo, actions }: ProblemNoticeProps) {
  return (
    <Flex role="alert" gap="3" p="4" bg="oxide.subtle" border="hairline" borderColor="oxide.emphasized" borderRadius="md">
      <Box color="oxide.fg" pt="1" lineHeight="none">
        <StateShape state="fails" />
      </Box>
      <Box minW="0">
        <chakra.p fontWeight="semibold" color="oxide.fg">
          {what}
        </chakra.p>
        {safe !== undefined && <p>{safe}</p>}
        {todo !== undefined && <p>{todo}</p>}
        {actions !== undefined && (
          <Flex gap="2" wrap="wrap" mt="3">
            {actions}
          </Flex>
        )}
      </Box>
    </Flex>
  );
}
