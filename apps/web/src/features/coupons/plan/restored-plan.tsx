import { chakra, Flex } from '@chakra-ui/react';
import { Button } from '../../../components/button';

/** Says that what stands in the form came from an earlier visit, and takes it away again. */
export function RestoredPlan({ onStartAfresh }: { onStartAfresh: () => void }) {
  return (
    <Flex
      role="status"
      align="center"
      justify="space-between"
      columnGap="2"
      wrap="wrap"
      pl="3"
      pr="1"
      fontSize="sm"
      lineHeight="sm"
      border="hairline"
      borderRadius="md"
    >
      <chakra.span>The plan that you had begun is restored.</chakra.span>
      <Button kind="quiet" px="2" fontSize="sm" onClick={onStartAfresh}>
        Start afresh
      </Button>
    </Flex>
  );
}
