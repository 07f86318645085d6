import { chakra } from '@chakra-ui/react';
import useSWRImmutable from 'swr/immutable';
import { ButtonLink } from '../../../components/button';
import { Panel } from '../../../components/page';
import { ProblemNotice } from '../../../components/problem-notice';
import { SkeletonForm } from '../../../components/skeletons';
import type { ProblemError } from '../../../lib/api';
import { paths } from '../../../lib/paths';
import { roleWord } from '../../../lib/roles';
import { type InvitationPreview, previewInvitation } from '../auth.api';
import { AcceptInvitationForm } from '../forms/accept-invitation-form';

/** What somebody was invited to, and the form to accept it. */
export function Invitation({ token }: { token: string }) {
  const { data, error } = useSWRImmutable<InvitationPreview, ProblemError>(['invitation', token], () => previewInvitation(token));
  if (error !== undefined) return <InvitationGone isAnswer={error.status !== 0} />;
  if (data === undefined) return <SkeletonForm fields={2} label="Reading the invitation" />;
  return (
    <>
      <chakra.p mb="4">
        <b>{data.shopName}</b> invites <b>{data.email}</b> as {roleWord(data.role)}.
      </chakra.p>
      <Panel p={{ base: '4', sm: '6' }}>
        <AcceptInvitationForm token={token} invitation={data} />
      </Panel>
    </>
  );
}

export function InvitationGone({ isAnswer }: { isAnswer: boolean }) {
  return (
    <ProblemNotice
      what={isAnswer ? 'This invitation was used, withdrawn or is too old.' : 'No answer came from the server.'}
      safe="Nothing was changed."
      todo={
        isAnswer
          ? 'Ask the owner of the shop for a new one. If you accepted it before, sign in.'
          : 'Open the link again when the connection is back.'
      }
      actions={<ButtonLink to={paths.signIn}>Sign in</ButtonLink>}
    />
  );
}
