import { chakra, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { Button, ButtonLink } from '../../../components/button';
import { EmptyState } from '../../../components/empty-state';
import { Panel } from '../../../components/page';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonTable } from '../../../components/skeletons';
import { formatDate, formatTime } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import { useSession } from '../../../lib/session';
import { AnswerDialog } from '../forms/answer-dialog';
import { type RequestState, type SettingRequest, useRequests } from '../requests.api';

const EMPTY: Record<RequestState, string> = {
  open: 'Nobody waits for a setting',
  answered: 'No request was answered yet',
  closed: 'No request was closed without a setting',
};

export function RequestList({ state }: { state: RequestState }) {
  const { data, error, mutate } = useRequests(state);
  const [answering, setAnswering] = useState<SettingRequest>();
  if (data === undefined)
    return error === undefined ? (
      <SkeletonTable rows={4} label="Loading the requests" />
    ) : (
      <ReadProblem problem={error} thing="the requests" onRetry={() => void mutate()} />
    );
  if (data.items.length === 0)
    return (
      <EmptyState kind="none-yet" title={EMPTY[state]}>
        Whoever finds no approved setting at the machine can ask for one there; it comes up here with the whole sentence.
      </EmptyState>
    );
  return (
    <>
      <chakra.ul display="grid" gap="3">
        {data.items.map((request) => (
          <li key={request.id}>
            <RequestCard request={request} onAnswer={() => setAnswering(request)} />
          </li>
        ))}
      </chakra.ul>
      {answering !== undefined && <AnswerDialog request={answering} onClose={() => setAnswering(undefined)} />}
    </>
  );
}

function RequestCard({ request, onAnswer }: { request: SettingRequest; onAnswer: () => void }) {
  const { shop } = useSession();
  const { machine, lens, material, finish, effect, jobReference, neededOn, note, askedBy, askedAt, answer, answeredBy, answeredAt } =
    request;
  const place = [machine?.name, lens?.name].filter((name) => name !== undefined).join(' with ');
  const work = [material?.name, finish?.name, effect?.name].filter((name) => name !== undefined).join(', ');
  return (
    <Panel px="5" py="4">
      <Flex justify="space-between" gap="4" wrap="wrap" align="flex-start">
        <chakra.div minW="0" flex="1">
          <h2>{work}</h2>
          {place !== '' && <p>On {place}</p>}
          {note !== '' && <p>{note}</p>}
          <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
            {askedBy}, {formatTime(askedAt, shop.timeZone)}
            {jobReference === '' ? '' : `, job ${jobReference}`}
            {neededOn === null ? '' : `, needed by ${formatDate(`${neededOn}T00:00:00Z`, 'UTC')}`}
          </chakra.p>
          {answer !== null && (
            <chakra.p mt="2">
              <b>{answeredBy}:</b> {answer}
              <chakra.span fontSize="sm" color="fg.muted">
                {' '}
                {answeredAt === null ? '' : formatTime(answeredAt, shop.timeZone)}
              </chakra.span>
            </chakra.p>
          )}
        </chakra.div>
        <Flex gap="2" wrap="wrap">
          <ButtonLink size="glove" to={atTheMachine(request)}>
            Look at the machine
          </ButtonLink>
          {request.allowedActions.includes('answer') && (
            <Button kind="primary" size="glove" onClick={onAnswer} aria-label={`Answer ${askedBy}: ${work}`}>
              Answer
            </Button>
          )}
        </Flex>
      </Flex>
    </Panel>
  );
}

/** The same sentence at the machine. */
function atTheMachine({ machine, lens, material, finish, effect }: SettingRequest): string {
  const params = new URLSearchParams();
  for (const [slot, thing] of Object.entries({ machine, lens, material, finish, effect })) if (thing !== null) params.set(slot, thing.id);
  return `${paths.machine}?${params}`;
}
