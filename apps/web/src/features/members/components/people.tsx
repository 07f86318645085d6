import { chakra, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { type Column, DataTable } from '../../../components/data-table';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonTable } from '../../../components/skeletons';
import { TextLink } from '../../../components/text-link';
import { formatDate } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import { roleWord } from '../../../lib/roles';
import { useSession } from '../../../lib/session';
import { type Member, useMembers } from '../members.api';
import { ChangeRoleDialog, RemoveMemberDialog } from './member-dialogs';

type OpenDialog = { act: 'edit' | 'remove'; member: Member };

/** Everybody who works in the shop. */
export function People() {
  const { data, error, mutate } = useMembers();
  const { member: own, shop } = useSession();
  const [dialog, setDialog] = useState<OpenDialog>();
  if (data === undefined)
    return error === undefined ? (
      <SkeletonTable rows={4} label="Loading the people" />
    ) : (
      <ReadProblem problem={error} onRetry={() => void mutate()} />
    );
  const close = () => setDialog(undefined);
  return (
    <>
      <DataTable
        label="People"
        columns={columns({ ownId: own.id, timeZone: shop.timeZone, onAct: setDialog })}
        rows={data.items}
        rowKey={({ id }) => id}
      />
      {dialog?.act === 'edit' && <ChangeRoleDialog member={dialog.member} onClose={close} />}
      {dialog?.act === 'remove' && <RemoveMemberDialog member={dialog.member} onClose={close} />}
    </>
  );
}

type ColumnOptions = { ownId: string; timeZone: string; onAct: (dialog: OpenDialog) => void };

function columns({ ownId, timeZone, onAct }: ColumnOptions): readonly Column<Member>[] {
  return [
    {
      key: 'name',
      header: 'Name',
      onPhone: 'title',
      cell: ({ id, printedName }) => (
        <>
          <TextLink to={paths.person(id)} fontWeight="semibold" py="3">
            {printedName}
          </TextLink>
          {id === ownId && <chakra.span color="fg.muted"> you</chakra.span>}
        </>
      ),
    },
    { key: 'role', header: 'Role', cell: ({ role }) => roleWord(role) },
    { key: 'email', header: 'E-mail', cell: ({ email }) => <chakra.span overflowWrap="anywhere">{email}</chakra.span> },
    { key: 'since', header: 'Here since', cell: ({ createdAt }) => formatDate(createdAt, timeZone) },
    {
      key: 'acts',
      header: 'Acts',
      isHeaderHidden: true,
      align: 'end',
      cell: (member) => (
        <Flex gap="2" ml={{ base: '-4', sm: '0' }} justify={{ base: 'flex-start', sm: 'flex-end' }}>
          {member.allowedActions.includes('edit') && (
            <Button kind="quiet" onClick={() => onAct({ act: 'edit', member })} aria-label={`Change the role of ${member.printedName}`}>
              Change role
            </Button>
          )}
          {member.allowedActions.includes('remove') && member.id !== ownId && (
            <Button
              kind="quiet"
              color="oxide.fg"
              onClick={() => onAct({ act: 'remove', member })}
              aria-label={`Remove ${member.printedName}`}
            >
              Remove
            </Button>
          )}
        </Flex>
      ),
    },
  ];
}
