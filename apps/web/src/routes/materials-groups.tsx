import { roleAtLeast } from '@proofplate/recipe-model';
import { useState } from 'react';
import { Button } from '../components/button';
import { Dialog } from '../components/dialog';
import { PlusIcon } from '../components/icons';
import { Page } from '../components/page';
import { useStatusLine } from '../components/status-line';
import { GroupList } from '../features/materials/components/group-list';
import { MaterialsTabs } from '../features/materials/components/materials-tabs';
import { GroupForm } from '../features/materials/forms/group-form';
import { useSession } from '../lib/session';

export function Component() {
  const mayAdd = roleAtLeast(useSession().member.role, 'lead');
  const [isAdding, setIsAdding] = useState(false);
  const announce = useStatusLine();
  const handleDone = () => {
    setIsAdding(false);
    announce('The group is added.');
  };
  const addButton = mayAdd && (
    <Button kind="primary" icon={<PlusIcon />} onClick={() => setIsAdding(true)}>
      Add a group
    </Button>
  );
  return (
    <Page title="Groups of materials" actions={addButton}>
      <MaterialsTabs />
      <GroupList addButton={addButton} />
      {isAdding && (
        <Dialog title="Add a group" onClose={() => setIsAdding(false)}>
          <GroupForm onDone={handleDone} />
        </Dialog>
      )}
    </Page>
  );
}
