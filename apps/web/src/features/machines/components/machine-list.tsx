import { chakra, Flex } from '@chakra-ui/react';
import { SOURCE_KIND_LABELS } from '@proofplate/recipe-model';
import { useState } from 'react';
import { Button, ButtonLink } from '../../../components/button';
import { type Column, DataTable } from '../../../components/data-table';
import { EmptyState } from '../../../components/empty-state';
import { PlusIcon } from '../../../components/icons';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonTable } from '../../../components/skeletons';
import { TextLink } from '../../../components/text-link';
import { formatDay, formatQuantity } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import { type Machine, useMachines } from '../machines.api';

/** The lasers of the shop. */
export function MachineList({ mayAdd }: { mayAdd: boolean }) {
  const [isArchived, setIsArchived] = useState(false);
  const { data, error, mutate } = useMachines(isArchived);
  if (data === undefined)
    return error === undefined ? (
      <SkeletonTable rows={3} label="Loading the machines" />
    ) : (
      <ReadProblem problem={error} thing="the machines" onRetry={() => void mutate()} />
    );
  if (data.items.length === 0 && !isArchived) return <NoMachines mayAdd={mayAdd} onShowArchived={() => setIsArchived(true)} />;
  return (
    <>
      {data.items.length === 0 ? (
        <EmptyState kind="none-match" title="No machine is archived">
          Machines that were taken out of the choices would stand here.
        </EmptyState>
      ) : (
        <DataTable label={isArchived ? 'Archived machines' : 'Machines'} columns={columns()} rows={data.items} rowKey={({ id }) => id} />
      )}
      <Button kind="quiet" mt="2" ml="-4" onClick={() => setIsArchived(!isArchived)}>
        {isArchived ? 'Show the machines in use' : 'Show archived machines'}
      </Button>
    </>
  );
}

function NoMachines({ mayAdd, onShowArchived }: { mayAdd: boolean; onShowArchived: () => void }) {
  return (
    <EmptyState
      kind="none-yet"
      title="No machine yet"
      actions={
        <>
          {mayAdd && (
            <ButtonLink kind="primary" icon={<PlusIcon />} to={paths.newMachine}>
              Add a machine
            </ButtonLink>
          )}
          <Button kind="quiet" onClick={onShowArchived}>
            Show archived machines
          </Button>
        </>
      }
    >
      Describe a laser once: what its source is and which fields its own panel shows. From then on settings are typed and read in the order,
      under the labels and in the units of that panel.
    </EmptyState>
  );
}

function columns(): readonly Column<Machine>[] {
  return [
    {
      key: 'name',
      header: 'Machine',
      onPhone: 'title',
      cell: ({ id, name }) => (
        <TextLink to={paths.machineDetail(id)} fontWeight="semibold" display="inline-block" py="2">
          {name}
        </TextLink>
      ),
    },
    { key: 'source', header: 'Source', cell: ({ sourceKind }) => SOURCE_KIND_LABELS[sourceKind] },
    {
      key: 'power',
      header: 'Rated power',
      align: 'end',
      cell: ({ profile }) => formatQuantity(profile.physical.ratedPowerW, 'W'),
    },
    {
      key: 'wavelength',
      header: 'Wavelength',
      align: 'end',
      cell: ({ profile }) => formatQuantity(profile.physical.wavelengthNm, 'nm'),
    },
    { key: 'lens', header: 'Lens now', cell: ({ mountedLens }) => mountedLens?.name ?? <Missing>not set</Missing> },
    {
      key: 'calibrated',
      header: 'Power measured',
      cell: ({ latestCalibrationOn }) => (latestCalibrationOn === null ? <Missing>never</Missing> : formatDay(latestCalibrationOn)),
    },
    {
      key: 'panel',
      header: 'Panel',
      onPhone: 'hidden',
      cell: ({ profile }) => (
        <Flex color="fg.muted" columnGap="1.5" wrap="wrap">
          {profile.panel.fields.map(({ label }) => label).join(' · ')}
        </Flex>
      ),
    },
  ];
}

/** What nobody has entered: said, never shown as a number. */
export const Missing = chakra('span', { base: { color: 'fg.muted' } });
