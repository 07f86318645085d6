import { chakra } from '@chakra-ui/react';
import { useNavigate, useParams } from 'react-router';
import { Page } from '../components/page';
import { ReadProblem } from '../components/read-problem';
import { SkeletonBlock } from '../components/skeletons';
import { useStatusLine } from '../components/status-line';
import { TextLink } from '../components/text-link';
import { RevisionSetting } from '../features/recipes/components/revision-setting';
import { Review } from '../features/sign-offs/components/review';
import { type Revision, useRevision, useSignOffQueue } from '../features/sign-offs/sign-offs.api';
import { formatTime } from '../lib/format';
import { paths } from '../lib/paths';
import { useSession } from '../lib/session';

const QUEUE_CRUMB = { label: 'Sign-off', to: paths.signOffs };

export function Component() {
  const { revisionId } = useParams();
  const { data: revision, error, mutate } = useRevision(revisionId);
  if (revision === undefined) {
    return (
      <Page title="Sign-off" crumbs={[QUEUE_CRUMB]}>
        {error === undefined ? (
          <SkeletonBlock height="480px" label="Loading the revision" />
        ) : (
          <ReadProblem problem={error} thing="this revision" onRetry={() => void mutate()} />
        )}
      </Page>
    );
  }
  return <SignOffPage key={revision.id} revision={revision} />;
}

function SignOffPage({ revision }: { revision: Revision }) {
  const { shop } = useSession();
  const navigate = useNavigate();
  const announce = useStatusLine();
  const { recipe, number, author, submittedAt, reason } = revision;
  const place = usePlaceInQueue(revision.id);
  const handleReturned = () => {
    announce(`Revision ${number} of ${recipe.code} goes back to ${author.name}.`);
    void navigate(paths.signOffs);
  };
  return (
    <Page
      title={recipe.code}
      name={recipe.title}
      crumbs={[QUEUE_CRUMB, { label: place.words }]}
      meta={
        <span>
          <TextLink to={paths.recipeRevision(recipe.code, revision.id)}>{number === null ? 'Draft' : `Revision ${number}`}</TextLink>
          {submittedAt !== null && `, submitted by ${author.name} on ${formatTime(submittedAt, shop.timeZone)}`}. Reason:{' '}
          <chakra.span color="fg">{reason}</chakra.span>
        </span>
      }
      actions={place.next !== undefined && <TextLink to={paths.signOff(place.next.id)}>Next: {place.next.words}</TextLink>}
    >
      <Review revision={revision} onReturned={handleReturned}>
        <RevisionSetting revision={revision} />
      </Review>
    </Page>
  );
}

/** "1 of 3 waiting, oldest first", and the one after it. */
function usePlaceInQueue(revisionId: string): { words: string; next: { id: string; words: string } | undefined } {
  const { data } = useSignOffQueue();
  const items = data?.items ?? [];
  const index = items.findIndex(({ revision }) => revision.id === revisionId);
  const following = index === -1 ? items[0] : items[index + 1];
  const next =
    following === undefined
      ? undefined
      : { id: following.revision.id, words: `${following.recipe.code} revision ${following.revision.number}` };
  if (data === undefined) return { words: 'waiting', next: undefined };
  return {
    words: index === -1 ? signedWords(data.totalCount) : `${index + 1} of ${data.totalCount} waiting, oldest first`,
    next,
  };
}

/** Of a revision that no longer waits: how many others do. */
function signedWords(waitingCount: number): string {
  if (waitingCount === 0) return 'nothing waits';
  return waitingCount === 1 ? 'one other waits' : `${waitingCount} others wait`;
}
