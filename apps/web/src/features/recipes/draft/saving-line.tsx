import { chakra, Flex } from '@chakra-ui/react';
import { Button } from '../../../components/button';
import { ProblemNotice } from '../../../components/problem-notice';
import { StateMark } from '../../../components/state-mark';
import type { Draft } from './use-draft';

/** Says at any time whether what was typed is on the server. */
export function SavingLine({ draft: { state, problem, messages, flush } }: { draft: Draft }) {
  const count = Object.keys(messages).length;
  return (
    <chakra.div role="status" aria-live="polite" fontSize="sm" minHeight="6">
      {state === 'saved' && <StateMark state="passes">Saved</StateMark>}
      {(state === 'waiting' || state === 'saving') && <chakra.span color="fg.muted">Saving …</chakra.span>}
      {state === 'needs-change' && (
        <StateMark state="fails">
          {count === 1 ? 'One entry needs a change; the rest is saved' : `${count} entries need a change; the rest is saved`}
        </StateMark>
      )}
      {state === 'unreachable' && (
        <Flex gap="3" align="center" wrap="wrap">
          <StateMark state="fails">Not saved: no answer from the server. It stays here.</StateMark>
          <Button onClick={() => void flush()}>Save now</Button>
        </Flex>
      )}
      {state === 'refused' && problem !== undefined && (
        <ProblemNotice what={`Not saved. ${problem.title}.`} safe="What you typed is still here." todo={problem.detail} />
      )}
    </chakra.div>
  );
}
