import { chakra, Flex } from '@chakra-ui/react';
import { roleAtLeast } from '@proofplate/recipe-model';
import { useState } from 'react';
import { Button, ButtonLink } from '../components/button';
import { Dialog } from '../components/dialog';
import { PlusIcon } from '../components/icons';
import { Page } from '../components/page';
import { useStatusLine } from '../components/status-line';
import { LensList } from '../features/lenses/components/lens-list';
import { LensForm } from '../features/lenses/forms/lens-form';
import { MachineList } from '../features/machines/components/machine-list';
import { paths } from '../lib/paths';
import { useSession } from '../lib/session';

/** Machines and lenses of the shop. */
export function Component() {
  const mayAdd = roleAtLeast(useSession().member.role, 'lead');
  const [isAdding, setIsAdding] = useState(false);
  const announce = useStatusLine();
  const handleAdded = () => {
    setIsAdding(false);
    announce('The lens is added.');
  };
  const addLens = mayAdd && (
    <Button icon={<PlusIcon />} onClick={() => setIsAdding(true)}>
      Add a lens
    </Button>
  );
  return (
    <Page
      title="Equipment"
      actions={
        mayAdd && (
          <ButtonLink kind="primary" icon={<PlusIcon />} to={paths.newMachine}>
            Add a machine
          </ButtonLink>
        )
      }
    >
      <chakra.section aria-labelledby="machines-title">
        <chakra.h2 id="machines-title" mb="2">
          Machines
        </chakra.h2>
        <MachineList mayAdd={mayAdd} />
      </chakra.section>
      <chakra.section aria-labelledby="lenses-title" mt="8">
        <Flex justify="space-between" align="center" gap="3" mb="2">
          <chakra.h2 id="lenses-title">Lenses</chakra.h2>
          {addLens}
        </Flex>
        <LensList addButton={addLens} />
      </chakra.section>
      {isAdding && (
        <Dialog title="Add a lens" onClose={() => setIsAdding(false)}>
          <LensForm onDone={handleAdded} />
        </Dialog>
      )}
    </Page>
  );
}
