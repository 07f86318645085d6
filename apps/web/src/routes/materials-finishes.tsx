import { roleAtLeast } from '@proofplate/recipe-model';
import { useState } from 'react';
import { Button } from '../components/button';
import { Dialog } from '../components/dialog';
import { PlusIcon } from '../components/icons';
import { Page } from '../components/page';
import { useStatusLine } from '../components/status-line';
import { FinishList } from '../features/materials/components/finish-list';
import { MaterialsTabs } from '../features/materials/components/materials-tabs';
import { FinishForm } from '../features/materials/forms/finish-form';
import { useSession } from '../lib/session';

export function Component() {
  const mayAdd = roleAtLeast(useSession().member.role, 'lead');
  const [isAdding, setIsAdding] = useState(false);
  const announce = useStatusLine();
  const handleDone = () => {
    setIsAdding(false);
    announce('The finish is added.');
  };
  const addButton = mayAdd && (
    <Button kind="primary" icon={<PlusIcon />} onClick={() => setIsAdding(true)}>
      Add a finish
    </Button>
  );
  return (
    <Page title="Finishes" actions={addButton}>
      <MaterialsTabs />
      <FinishList addButton={addButton} />
      {isAdding && (
        <Dialog title="Add a finish" onClose={() => setIsAdding(false)}>
          <FinishForm onDone={handleDone} />
        </Dialog>
      )}
    </Page>
  );
}
