import { type ReactNode, useState } from 'react';
import { type Column, DataTable } from '../../../components/data-table';
import { Dialog } from '../../../components/dialog';
import { EmptyState } from '../../../components/empty-state';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonTable } from '../../../components/skeletons';
import { useStatusLine } from '../../../components/status-line';
import { GroupForm } from '../forms/group-form';
import { type MaterialGroup, useMaterialGroups } from '../materials.api';
import { CatalogueActs } from './catalogue-acts';

/** Materials that one approval may cover together. */
export function GroupList({ addButton }: { addButton: ReactNode }) {
  const [edited, setEdited] = useState<MaterialGroup>();
  const { data, error, mutate } = useMaterialGroups();
  const announce = useStatusLine();
  if (data === undefined)
    return error === undefined ? (
      <SkeletonTable rows={3} label="Loading the groups" />
    ) : (
      <ReadProblem problem={error} thing="the groups" onRetry={() => void mutate()} />
    );
  const handleDone = () => {
    setEdited(undefined);
    announce('The group is saved.');
  };
  if (data.items.length === 0)
    return (
      <EmptyState kind="none-yet" title="No group yet" actions={addButton}>
        A recipe covers one material. Where one setting is meant for several, such as two steels of one series, name them in a group; the
        sign-off then says that the approval covers all of them.
      </EmptyState>
    );
  return (
    <>
      <DataTable label="Groups of materials" columns={columns(setEdited)} rows={data.items} rowKey={({ id }) => id} />
      {edited !== undefined && (
        <Dialog title={`Change ${edited.name}`} onClose={() => setEdited(undefined)}>
          <GroupForm group={edited} onDone={handleDone} />
        </Dialog>
      )}
    </>
  );
}

function columns(onEdit: (group: MaterialGroup) => void): readonly Column<MaterialGroup>[] {
  return [
    { key: 'name', header: 'Group', onPhone: 'title', cell: ({ name }) => <b>{name}</b> },
    {
      key: 'materials',
      header: 'Materials',
      cell: ({ materials }) => (materials.length === 0 ? 'none: it covers nothing' : materials.map(({ name }) => name).join(', ')),
    },
    {
      key: 'acts',
      header: 'Acts',
      isHeaderHidden: true,
      align: 'end',
      cell: (group) => <CatalogueActs name={group.name} allowedActions={group.allowedActions} onEdit={() => onEdit(group)} />,
    },
  ];
}
