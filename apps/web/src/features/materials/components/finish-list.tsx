import { type ReactNode, useState } from 'react';
import { Button } from '../../../components/button';
import { type Column, DataTable } from '../../../components/data-table';
import { Dialog } from '../../../components/dialog';
import { EmptyState } from '../../../components/empty-state';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonTable } from '../../../components/skeletons';
import { useStatusLine } from '../../../components/status-line';
import { useArchiving } from '../../../components/use-archiving';
import { FinishForm } from '../forms/finish-form';
import { type Finish, setFinishArchived, useFinishes } from '../materials.api';
import { CatalogueActs } from './catalogue-acts';

/** The surfaces that the shop marks, with what is done before and after. */
export function FinishList({ addButton }: { addButton: ReactNode }) {
  const [isArchived, setIsArchived] = useState(false);
  const [edited, setEdited] = useState<Finish>();
  const { data, error, mutate } = useFinishes(isArchived);
  const archive = useArchiving(setFinishArchived);
  const announce = useStatusLine();
  if (data === undefined)
    return error === undefined ? (
      <SkeletonTable rows={4} label="Loading the finishes" />
    ) : (
      <ReadProblem problem={error} thing="the finishes" onRetry={() => void mutate()} />
    );
  const handleDone = () => {
    setEdited(undefined);
    announce('The finish is saved.');
  };
  return (
    <>
      {data.items.length === 0 ? (
        <EmptyState
          kind={isArchived ? 'none-match' : 'none-yet'}
          title={isArchived ? 'No finish is archived' : 'No finish yet'}
          actions={isArchived ? undefined : addButton}
        >
          {isArchived
            ? 'Finishes that were taken out of the choices would stand here.'
            : 'Brushed and polished steel need different settings. Name the surface, what is done to it before, and what after.'}
        </EmptyState>
      ) : (
        <DataTable
          label={isArchived ? 'Archived finishes' : 'Finishes'}
          columns={columns({ onEdit: setEdited, onArchive: (finish, isNow) => void archive(finish, isNow) })}
          rows={data.items}
          rowKey={({ id }) => id}
        />
      )}
      <Button kind="quiet" mt="2" ml="-4" onClick={() => setIsArchived(!isArchived)}>
        {isArchived ? 'Show the finishes in use' : 'Show archived finishes'}
      </Button>
      {edited !== undefined && (
        <Dialog title={`Change ${edited.name}`} onClose={() => setEdited(undefined)}>
          <FinishForm finish={edited} onDone={handleDone} />
        </Dialog>
      )}
    </>
  );
}

type ColumnOptions = { onEdit: (finish: Finish) => void; onArchive: (finish: Finish, isArchived: boolean) => void };

function columns({ onEdit, onArchive }: ColumnOptions): readonly Column<Finish>[] {
  return [
    { key: 'name', header: 'Finish', onPhone: 'title', cell: ({ name }) => <b>{name}</b> },
    { key: 'before', header: 'Before marking', cell: ({ preparation }) => preparation },
    { key: 'after', header: 'After marking', cell: ({ treatment }) => treatment },
    {
      key: 'acts',
      header: 'Acts',
      isHeaderHidden: true,
      align: 'end',
      cell: (finish) => (
        <CatalogueActs
          name={finish.name}
          allowedActions={finish.allowedActions}
          onEdit={() => onEdit(finish)}
          onArchive={(isArchived) => onArchive(finish, isArchived)}
        />
      ),
    },
  ];
}
