import { chakra, Flex } from '@chakra-ui/react';
import { Button } from '../../../components/button';
import { ErrorSummary } from '../../../components/error-summary';
import { ProblemNotice } from '../../../components/problem-notice';
import { StateMark } from '../../../components/state-mark';
import type { Revision } from '../recipes.api';
import { fieldWords } from './field-words';
import type { Draft } from './use-draft';

export type SavingLineProps = { draft: Draft; fields: Revision['profile']['panel']['fields'] };

/** Says at any time whether what was typed is on the server, and leads to what keeps it from being saved. */
export function SavingLine({ draft: { state, problem, messages, flush }, fields }: SavingLineProps) {
  const entries = Object.entries(messages).map(([name, message]) => ({ name, label: fieldWords(name, fields), message }));
  return (
    <>
      <chakra.div role="status" aria-live="polite" fontSize="sm" minHeight="6">
        {state === 'saved' && <StateMark state="passes">Saved</StateMark>}
        {(state === 'waiting' || state === 'saving') && <chakra.span color="fg.muted">Saving …</chakra.span>}
        {state === 'needs-change' && <StateMark state="fails">Not all is saved; what needs no change is</StateMark>}
        {state === 'unreachable' && (
          <Flex gap="3" align="center" wrap="wrap">
            <StateMark state="fails">Not saved: no answer from the server. It stays here and is sent again by itself.</StateMark>
            <Button onClick={() => void flush()}>Save now</Button>
          </Flex>
        )}
        {state === 'refused' && problem !== undefined && (
          <ProblemNotice what={`Not saved. ${problem.title}.`} safe="What you typed is still here." todo={problem.detail} />
        )}
      </chakra.div>
      {state === 'needs-change' && <ErrorSummary entries={entries} />}
    </>
  );
}
