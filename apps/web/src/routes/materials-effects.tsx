import { roleAtLeast } from '@proofplate/recipe-model';
import { useState } from 'react';
import { Button } from '../components/button';
import { Dialog } from '../components/dialog';
import { PlusIcon } from '../components/icons';
import { Page } from '../components/page';
import { useStatusLine } from '../components/status-line';
import { EffectList } from '../features/materials/components/effect-list';
import { MaterialsTabs } from '../features/materials/components/materials-tabs';
import { EffectForm } from '../features/materials/forms/effect-form';
import { useSession } from '../lib/session';

export function Component() {
  const mayAdd = roleAtLeast(useSession().member.role, 'lead');
  const [isAdding, setIsAdding] = useState(false);
  const announce = useStatusLine();
  const handleDone = () => {
    setIsAdding(false);
    announce('The effect is added.');
  };
  const addButton = mayAdd && (
    <Button kind="primary" icon={<PlusIcon />} onClick={() => setIsAdding(true)}>
      Add an effect
    </Button>
  );
  return (
    <Page title="Effects" actions={addButton}>
      <MaterialsTabs />
      <EffectList />
      {isAdding && (
        <Dialog title="Add an effect" onClose={() => setIsAdding(false)}>
          <EffectForm onDone={handleDone} />
        </Dialog>
      )}
    </Page>
  );
}
