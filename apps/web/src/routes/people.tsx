import { useState } from 'react';
import { Button } from '../components/button';
import { Dialog } from '../components/dialog';
import { PlusIcon } from '../components/icons';
import { Page } from '../components/page';
import { useStatusLine } from '../components/status-line';
import { Invitations } from '../features/members/components/invitations';
import { People } from '../features/members/components/people';
import { UndeliveredLetters } from '../features/members/components/undelivered-letters';
import { InviteForm } from '../features/members/forms/invite-form';
import { useSession } from '../lib/session';

export function Component() {
  const { member } = useSession();
  const announce = useStatusLine();
  const [isInviting, setIsInviting] = useState(false);
  const handleInvited = (email: string) => {
    setIsInviting(false);
    announce(`The invitation goes to ${email}.`);
  };
  return (
    <Page
      title="People"
      actions={
        member.role === 'owner' && (
          <Button kind="primary" icon={<PlusIcon />} onClick={() => setIsInviting(true)}>
            Invite somebody
          </Button>
        )
      }
    >
      <People />
      <Invitations />
      {member.role === 'owner' && <UndeliveredLetters />}
      {isInviting && (
        <Dialog title="Invite somebody" onClose={() => setIsInviting(false)}>
          <InviteForm onInvited={handleInvited} />
        </Dialog>
      )}
    </Page>
  );
}
