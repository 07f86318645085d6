import { chakra, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { type Column, DataTable } from '../../../components/data-table';
import { Dialog } from '../../../components/dialog';
import { PlusIcon } from '../../../components/icons';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonTable } from '../../../components/skeletons';
import { StateMark } from '../../../components/state-mark';
import { useStatusLine } from '../../../components/status-line';
import { formatDate, formatDay } from '../../../lib/format';
import { useSession } from '../../../lib/session';
import { TrainingForm } from '../forms/training-form';
import { type Member, type TrainingRecord, useTrainings } from '../members.api';

/** What a member was taught. Records are added and stay; a wrong one is followed by a right one. */
export function Trainings({ member }: { member: Member }) {
  const { data, error, mutate } = useTrainings(member.id);
  const { shop } = useSession();
  const announce = useStatusLine();
  const [isAdding, setIsAdding] = useState(false);
  return (
    <chakra.section mt="8" aria-labelledby="trainings-title">
      <Flex justify="space-between" align="center" gap="3" wrap="wrap" mb="3">
        <chakra.h2 id="trainings-title">Training</chakra.h2>
        {member.allowedActions.includes('edit') && (
          <Button icon={<PlusIcon />} onClick={() => setIsAdding(true)}>
            Add a training
          </Button>
        )}
      </Flex>
      {data === undefined && error === undefined && <SkeletonTable rows={2} label="Loading the trainings" />}
      {data === undefined && error !== undefined && <ReadProblem problem={error} thing="the trainings" onRetry={() => void mutate()} />}
      {data !== undefined && data.items.length === 0 && (
        <chakra.p color="fg.muted">Nothing is written down yet. What somebody was taught, by whom and until when belongs here.</chakra.p>
      )}
      {data !== undefined && data.items.length > 0 && (
        <DataTable label="Training" columns={columns(shop.timeZone)} rows={data.items} rowKey={({ id }) => id} />
      )}
      {isAdding && (
        <Dialog title={`Training of ${member.printedName}`} onClose={() => setIsAdding(false)}>
          <TrainingForm
            member={member}
            onAdded={(subject) => {
              setIsAdding(false);
              announce(`${subject} is written down.`);
            }}
          />
        </Dialog>
      )}
    </chakra.section>
  );
}

function columns(timeZone: string): readonly Column<TrainingRecord>[] {
  return [
    { key: 'subject', header: 'What', onPhone: 'title', cell: ({ subject }) => <b>{subject}</b> },
    { key: 'by', header: 'Taught by', cell: ({ taughtBy }) => taughtBy },
    { key: 'on', header: 'When', cell: ({ taughtOn }) => formatDay(taughtOn) },
    {
      key: 'until',
      header: 'Counts until',
      cell: ({ expiresOn, isExpired }) => (
        <chakra.span display="inline-flex" gap="2" flexWrap="wrap">
          {expiresOn === null ? 'no end' : formatDay(expiresOn)}
          {isExpired && <StateMark state="caution">Run out</StateMark>}
        </chakra.span>
      ),
    },
    { key: 'recorded', header: 'Written down', cell: ({ recordedBy, recordedAt }) => `${recordedBy}, ${formatDate(recordedAt, timeZone)}` },
  ];
}
