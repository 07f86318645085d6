import { useParams } from 'react-router';
import { Page } from '../components/page';
import { ReadProblem } from '../components/read-problem';
import { SkeletonBlock } from '../components/skeletons';
import { TextLink } from '../components/text-link';
import { Signing } from '../features/members/components/signing';
import { Trainings } from '../features/members/components/trainings';
import { type Member, useMember } from '../features/members/members.api';
import { formatDate } from '../lib/format';
import { paths } from '../lib/paths';
import { roleWord } from '../lib/roles';
import { useSession } from '../lib/session';

const CRUMBS = [{ label: 'People', to: paths.people }];

export function Component() {
  const { memberId = '' } = useParams();
  const { data: member, error, mutate } = useMember(memberId);
  if (member === undefined) {
    return (
      <Page title="Member" crumbs={[...CRUMBS, { label: 'Member' }]}>
        {error === undefined ? (
          <SkeletonBlock height="320px" label="Loading the member" />
        ) : (
          <ReadProblem problem={error} thing="this member" onRetry={() => void mutate()} />
        )}
      </Page>
    );
  }
  return (
    <Page title={member.printedName} crumbs={[...CRUMBS, { label: member.printedName }]} meta={<Meta member={member} />}>
      <Signing member={member} />
      <Trainings member={member} />
    </Page>
  );
}

function Meta({ member: { id, role, email, createdAt, removedAt } }: { member: Member }) {
  const { shop } = useSession();
  return (
    <>
      <span>{roleWord(role)}</span>
      {email !== null && <span>{email}</span>}
      <span>here since {formatDate(createdAt, shop.timeZone)}</span>
      {removedAt !== null && <span>left {formatDate(removedAt, shop.timeZone)}</span>}
      <TextLink to={`${paths.ledger}?who=${encodeURIComponent(id)}`}>In the ledger</TextLink>
    </>
  );
}
