import { Flex } from '@chakra-ui/react';
import { type ReactNode, useState } from 'react';
import { Button } from '../../../components/button';
import { type Column, DataTable } from '../../../components/data-table';
import { Dialog } from '../../../components/dialog';
import { EmptyState } from '../../../components/empty-state';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonTable } from '../../../components/skeletons';
import { useStatusLine } from '../../../components/status-line';
import { useArchiving } from '../../../components/use-archiving';
import { formatLength, formatLengths } from '../../../lib/format';
import { LensForm } from '../forms/lens-form';
import { type Lens, setLensArchived, useLenses } from '../lenses.api';

/** The lenses of the shop. */
export function LensList({ addButton }: { addButton: ReactNode }) {
  const [isArchived, setIsArchived] = useState(false);
  const [edited, setEdited] = useState<Lens>();
  const { data, error, mutate } = useLenses(isArchived);
  const announce = useStatusLine();
  const archive = useArchiving(setLensArchived);
  if (data === undefined)
    return error === undefined ? (
      <SkeletonTable rows={3} label="Loading the lenses" />
    ) : (
      <ReadProblem problem={error} thing="the lenses" onRetry={() => void mutate()} />
    );
  const handleDone = () => {
    setEdited(undefined);
    announce('The lens is saved.');
  };
  return (
    <>
      {data.items.length === 0 ? (
        <EmptyState
          kind={isArchived ? 'none-match' : 'none-yet'}
          title={isArchived ? 'No lens is archived' : 'No lens yet'}
          actions={isArchived ? undefined : addButton}
        >
          {isArchived
            ? 'Lenses that were taken out of the choices would stand here.'
            : 'A setting holds for one machine with one lens: focal length and field decide spot and depth of focus.'}
        </EmptyState>
      ) : (
        <DataTable
          label={isArchived ? 'Archived lenses' : 'Lenses'}
          columns={columns({ onEdit: setEdited, onArchive: archive })}
          rows={data.items}
          rowKey={({ id }) => id}
        />
      )}
      <Button kind="quiet" mt="2" ml="-4" onClick={() => setIsArchived(!isArchived)}>
        {isArchived ? 'Show the lenses in use' : 'Show archived lenses'}
      </Button>
      {edited !== undefined && (
        <Dialog title={`Change ${edited.name}`} onClose={() => setEdited(undefined)}>
          <LensForm lens={edited} onDone={handleDone} />
        </Dialog>
      )}
    </>
  );
}

type ColumnOptions = { onEdit: (lens: Lens) => void; onArchive: (lens: Lens, isArchived: boolean) => void };

function columns({ onEdit, onArchive }: ColumnOptions): readonly Column<Lens>[] {
  return [
    { key: 'name', header: 'Lens', onPhone: 'title', cell: ({ name }) => <b>{name}</b> },
    { key: 'focal', header: 'Focal length', align: 'end', cell: ({ focalLengthMm }) => formatLength(focalLengthMm) },
    { key: 'field', header: 'Marking field', align: 'end', cell: ({ fieldSizeMm }) => formatLengths(fieldSizeMm, fieldSizeMm) },
    { key: 'notes', header: 'Notes', cell: ({ notes }) => notes },
    {
      key: 'acts',
      header: 'Acts',
      isHeaderHidden: true,
      align: 'end',
      cell: (lens) => (
        <Flex gap="2" ml={{ base: '-4', sm: '0' }} justify={{ base: 'flex-start', sm: 'flex-end' }}>
          {lens.allowedActions.includes('edit') && (
            <Button kind="quiet" aria-label={`Change ${lens.name}`} onClick={() => onEdit(lens)}>
              Change
            </Button>
          )}
          {lens.allowedActions.includes('archive') && (
            <Button kind="quiet" aria-label={`Archive ${lens.name}`} onClick={() => onArchive(lens, true)}>
              Archive
            </Button>
          )}
          {lens.allowedActions.includes('restore') && (
            <Button kind="quiet" aria-label={`Restore ${lens.name}`} onClick={() => onArchive(lens, false)}>
              Restore
            </Button>
          )}
        </Flex>
      ),
    },
  ];
}
