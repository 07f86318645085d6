import { Flex } from '@chakra-ui/react';
import { Button } from '../../../components/button';

export type CatalogueActsProps = {
  name: string;
  allowedActions: readonly string[];
  onEdit: () => void;
  onArchive?: (isArchived: boolean) => void;
};

/** The acts at the end of a row: change, archive, restore, as far as the record allows them. */
export function CatalogueActs({ name, allowedActions, onEdit, onArchive }: CatalogueActsProps) {
  return (
    <Flex gap="2" ml={{ base: '-4', sm: '0' }} justify={{ base: 'flex-start', sm: 'flex-end' }}>
      {allowedActions.includes('edit') && (
        <Button kind="quiet" aria-label={`Change ${name}`} onClick={onEdit}>
          Change
        </Button>
      )}
      {allowedActions.includes('archive') && (
        <Button kind="quiet" aria-label={`Archive ${name}`} onClick={() => onArchive?.(true)}>
          Archive
        </Button>
      )}
      {allowedActions.includes('restore') && (
        <Button kind="quiet" aria-label={`Restore ${name}`} onClick={() => onArchive?.(false)}>
          Restore
        </Button>
      )}
    </Flex>
  );
}
