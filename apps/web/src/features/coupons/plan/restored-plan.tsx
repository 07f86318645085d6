import { chakra, Flex } from '@chakra-ui/react';
import { Button } from '../../../components/button';

/** Says that what stands in the form came from an earlier visit, and takes it away again. */
export function RestoredPlan({ onStartAfresh }: { onStartAfresh: () => void }) {
  return (
    <Flex
      role="status"
      align="center"
      justify="space-between"
      gap="3"
      wrap="wrap"
      pl="3.5"
      pr="1.5"
      py="1"
      border="hairline"
      borderRadius="md"
    >
      <chakra.span>The plan that you had begun is restored.</chakra.span>
      <Button kind="quiet" onClick={onStartAfresh}>
        Start afresh
      </Button>
    </Flex>
  );
}
