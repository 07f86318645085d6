import { chakra } from '@chakra-ui/react';
import { type Column, DataTable } from '../../../components/data-table';
import { EmptyState } from '../../../components/empty-state';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonTable } from '../../../components/skeletons';
import { StateMark } from '../../../components/state-mark';
import { TextLink } from '../../../components/text-link';
import { formatTime } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import { useSession } from '../../../lib/session';
import { type QueuedRevision, useSignOffQueue } from '../sign-offs.api';

/** What waits for a signature, oldest first. */
export function Queue() {
  const { shop } = useSession();
  const { data, error, mutate } = useSignOffQueue();
  if (error !== undefined) return <ReadProblem problem={error} thing="what waits" onRetry={() => void mutate()} />;
  if (data === undefined) return <SkeletonTable rows={4} label="Loading what waits" />;
  if (data.items.length === 0) {
    return (
      <EmptyState kind="none-match" title="Nothing waits for a signature">
        A revision that its author submits stands here, the oldest first.
      </EmptyState>
    );
  }
  return (
    <DataTable label="Waiting for a signature" columns={columns(shop.timeZone)} rows={data.items} rowKey={({ revision }) => revision.id} />
  );
}

function columns(timeZone: string): readonly Column<QueuedRevision>[] {
  return [
    {
      key: 'recipe',
      header: 'Recipe and revision',
      onPhone: 'title',
      cell: ({ recipe, revision }) => (
        <TextLink to={paths.signOff(revision.id)} fontWeight="semibold" py="3">
          {recipe.code} revision {revision.number}
        </TextLink>
      ),
    },
    { key: 'what', header: 'What', cell: ({ recipe }) => recipe.title },
    {
      key: 'kind',
      header: 'Kind',
      cell: ({ hasCurrent }) => (hasCurrent ? 'change' : 'first setting'),
    },
    { key: 'reason', header: 'Reason', cell: ({ revision }) => <chakra.span overflowWrap="anywhere">{revision.reason}</chakra.span> },
    { key: 'author', header: 'Author', cell: ({ revision, isOwn }) => (isOwn ? `${revision.author.name}, you` : revision.author.name) },
    {
      key: 'since',
      header: 'Waiting since',
      cell: ({ revision }) => (revision.submittedAt === null ? '' : formatTime(revision.submittedAt, timeZone)),
    },
    {
      key: 'may',
      header: 'For you',
      cell: ({ allowedActions, isOwn }) => {
        if (allowedActions.includes('approve')) return <StateMark state="inReview">yours to sign</StateMark>;
        return isOwn ? 'another lead signs' : 'to read';
      },
    },
  ];
}
