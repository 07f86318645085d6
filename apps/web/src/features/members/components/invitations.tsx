import { chakra } from '@chakra-ui/react';
import { Button } from '../../../components/button';
import { type Column, DataTable } from '../../../components/data-table';
import { useStatusLine } from '../../../components/status-line';
import { ProblemError } from '../../../lib/api';
import { formatDate } from '../../../lib/format';
import { roleWord } from '../../../lib/roles';
import { useSession } from '../../../lib/session';
import { type Invitation, revokeInvitation, useInvitations } from '../members.api';

/** Invitations that nobody has used yet; nothing is drawn when there are none. */
export function Invitations() {
  const { data } = useInvitations();
  const { shop } = useSession();
  const announce = useStatusLine();
  const waiting = data?.items.filter(({ state }) => state === 'open' || state === 'expired') ?? [];
  if (waiting.length === 0) return null;

  const handleRevoke = async ({ id, email }: Invitation) => {
    try {
      await revokeInvitation(id);
      announce(`The invitation of ${email} no longer works.`);
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      announce(`Not taken back: ${error.detail}`);
    }
  };
  return (
    <chakra.section mt="8" aria-labelledby="invitations-title">
      <chakra.h2 id="invitations-title" mb="3">
        Invited
      </chakra.h2>
      <DataTable
        label="Invitations"
        columns={columns(shop.timeZone, (invitation) => void handleRevoke(invitation))}
        rows={waiting}
        rowKey={({ id }) => id}
      />
    </chakra.section>
  );
}

function columns(timeZone: string, onRevoke: (invitation: Invitation) => void): readonly Column<Invitation>[] {
  return [
    { key: 'email', header: 'E-mail', onPhone: 'title', cell: ({ email }) => <chakra.span overflowWrap="anywhere">{email}</chakra.span> },
    { key: 'role', header: 'Role', cell: ({ role }) => roleWord(role) },
    { key: 'by', header: 'By', cell: ({ invitedBy }) => invitedBy },
    {
      key: 'until',
      header: 'Works until',
      cell: ({ state, expiresAt }) => (state === 'expired' ? 'too old' : formatDate(expiresAt, timeZone)),
    },
    {
      key: 'acts',
      header: 'Acts',
      isHeaderHidden: true,
      align: 'end',
      cell: (invitation) =>
        invitation.allowedActions.includes('revoke') && (
          <Button kind="quiet" onClick={() => onRevoke(invitation)} aria-label={`Take back the invitation of ${invitation.email}`}>
            Take back
          </Button>
        ),
    },
  ];
}
