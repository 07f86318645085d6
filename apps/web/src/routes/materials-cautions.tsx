import { roleAtLeast } from '@proofplate/recipe-model';
import { useState } from 'react';
import { Button } from '../components/button';
import { Dialog } from '../components/dialog';
import { PlusIcon } from '../components/icons';
import { Page } from '../components/page';
import { useStatusLine } from '../components/status-line';
import { CautionsList } from '../features/materials/components/cautions-list';
import { MaterialsTabs } from '../features/materials/components/materials-tabs';
import { useEffects } from '../features/materials/effects.api';
import { CautionForm } from '../features/materials/forms/caution-form';
import { useFinishes, useMaterials } from '../features/materials/materials.api';
import { useSession } from '../lib/session';

/** What stands before every setting, and what refuses one. */
export function Component() {
  const mayAdd = roleAtLeast(useSession().member.role, 'lead');
  const [isAdding, setIsAdding] = useState(false);
  const announce = useStatusLine();
  const names = {
    materials: new Map((useMaterials().data?.items ?? []).map(({ id, name }) => [id, name])),
    finishes: new Map((useFinishes().data?.items ?? []).map(({ id, name }) => [id, name])),
    effects: new Map((useEffects().data?.items ?? []).map(({ key, name }) => [key, name])),
  };
  const handleDone = () => {
    setIsAdding(false);
    announce('The caution is added.');
  };
  return (
    <Page
      title="Cautions"
      meta={<span>Prompts, no clearances: the machine’s manual and the laser safety officer decide. They get tighter, never looser.</span>}
      actions={
        mayAdd && (
          <Button kind="primary" icon={<PlusIcon />} onClick={() => setIsAdding(true)}>
            Add a caution
          </Button>
        )
      }
    >
      <MaterialsTabs />
      <CautionsList names={names} />
      {isAdding && (
        <Dialog title="Add a caution" onClose={() => setIsAdding(false)}>
          <CautionForm onDone={handleDone} />
        </Dialog>
      )}
    </Page>
  );
}
