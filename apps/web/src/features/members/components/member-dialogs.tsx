import { chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { ProblemNotice } from '../../../components/problem-notice';
import { useStatusLine } from '../../../components/status-line';
import { ProblemError } from '../../../lib/api';
import { roleWord } from '../../../lib/roles';
import { ChangeRoleForm } from '../forms/change-role-form';
import { type Member, removeMember } from '../members.api';

type MemberDialogProps = { member: Member; onClose: () => void };

export function ChangeRoleDialog({ member, onClose }: MemberDialogProps) {
  const announce = useStatusLine();
  return (
    <Dialog title={`Role of ${member.printedName}`} onClose={onClose}>
      <ChangeRoleForm
        member={member}
        onChanged={(role) => {
          announce(`${member.printedName} is now ${roleWord(role)}.`);
          onClose();
        }}
      />
    </Dialog>
  );
}

/** Removing ends sessions at once and cannot be taken back, so it asks. */
export function RemoveMemberDialog({ member, onClose }: MemberDialogProps) {
  const announce = useStatusLine();
  const [isBusy, setIsBusy] = useState(false);
  const [problem, setProblem] = useState<ProblemError>();
  const handleRemove = async () => {
    setIsBusy(true);
    try {
      await removeMember(member);
      announce(`${member.printedName} is removed.`);
      onClose();
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      setProblem(error);
      setIsBusy(false);
    }
  };
  return (
    <Dialog
      title={`Remove ${member.printedName}`}
      onClose={onClose}
      actions={
        <>
          <Button onClick={onClose}>Keep {member.printedName}</Button>
          <Button kind="danger" isBusy={isBusy} onClick={() => void handleRemove()}>
            Remove {member.printedName}
          </Button>
        </>
      }
    >
      {problem !== undefined && <ProblemNotice what={`${problem.title}.`} safe="Nobody was removed." todo={problem.detail} />}
      <chakra.p mt={problem === undefined ? '0' : '3'}>
        Every session in this shop ends at once. What {member.printedName} marked, drafted and signed stays, under this name. Coming back
        takes a new invitation.
      </chakra.p>
    </Dialog>
  );
}
