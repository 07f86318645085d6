import { chakra, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { type Column, DataTable } from '../../../components/data-table';
import { Dialog } from '../../../components/dialog';
import { PlusIcon } from '../../../components/icons';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonTable } from '../../../components/skeletons';
import { useStatusLine } from '../../../components/status-line';
import { formatDay, formatLength, formatQuantity } from '../../../lib/format';
import { AddMachineLensForm, ChangeMachineLensForm } from '../forms/machine-lens-form';
import { type LensChoice, type Machine, type MachineLens, useMachineLenses } from '../machines.api';
import { LensSpots } from './lens-spots';
import { Missing } from './machine-list';

type OpenDialog = { act: 'add' } | { act: 'edit'; pair: MachineLens };

/** Lenses on this machine: working distance, how focus is found, the spot where somebody measured one. */
export function MachineLenses({ machine, lenses }: { machine: Machine; lenses: readonly LensChoice[] }) {
  const { data, error, mutate } = useMachineLenses(machine.id);
  const [dialog, setDialog] = useState<OpenDialog>();
  const announce = useStatusLine();
  const free = lenses.filter(({ id }) => data?.items.every(({ lensId }) => lensId !== id));
  const handleDone = () => {
    setDialog(undefined);
    announce('The lens on this machine is saved.');
  };
  return (
    <chakra.section aria-labelledby="lenses-title">
      <Flex justify="space-between" align="center" gap="3" wrap="wrap" mb="2">
        <chakra.h2 id="lenses-title">Lenses on this machine</chakra.h2>
        {machine.allowedActions.includes('add-lens') && free.length > 0 && (
          <Button icon={<PlusIcon />} onClick={() => setDialog({ act: 'add' })}>
            Add a lens
          </Button>
        )}
      </Flex>
      {data === undefined && error === undefined && <SkeletonTable rows={2} label="Loading the lenses" />}
      {data === undefined && error !== undefined && <ReadProblem problem={error} onRetry={() => void mutate()} />}
      {data?.items.length === 0 && (
        <chakra.p color="fg.muted">
          No lens yet. A setting belongs to one machine with one lens, so coupons can be planned as soon as a lens stands here.
          {lenses.length === 0 && ' Add the lens itself under Equipment first.'}
        </chakra.p>
      )}
      {data !== undefined && data.items.length > 0 && (
        <DataTable
          label="Lenses on this machine"
          columns={columns((pair) => setDialog({ act: 'edit', pair }))}
          rows={data.items}
          rowKey={({ id }) => id}
        />
      )}
      {data?.items.map((pair) => (
        <LensSpots key={pair.id} pair={pair} />
      ))}
      {dialog?.act === 'add' && (
        <Dialog title="Add a lens to this machine" onClose={() => setDialog(undefined)}>
          <AddMachineLensForm machineId={machine.id} lenses={free} onDone={handleDone} />
        </Dialog>
      )}
      {dialog?.act === 'edit' && (
        <Dialog title={`${dialog.pair.lensName} on this machine`} onClose={() => setDialog(undefined)}>
          <ChangeMachineLensForm pair={dialog.pair} onDone={handleDone} />
        </Dialog>
      )}
    </chakra.section>
  );
}

function columns(onEdit: (pair: MachineLens) => void): readonly Column<MachineLens>[] {
  return [
    {
      key: 'lens',
      header: 'Lens',
      onPhone: 'title',
      cell: ({ lensName, focalLengthMm, isMounted }) => (
        <chakra.div py="1.5">
          <b>{lensName}</b>
          <chakra.span display="block" color="fg.muted" fontWeight="normal">
            {formatLength(focalLengthMm)}
            {isMounted && ', mounted now'}
          </chakra.span>
        </chakra.div>
      ),
    },
    {
      key: 'distance',
      header: 'Working distance',
      align: 'end',
      cell: ({ workingDistanceMm }) => (workingDistanceMm === null ? <Missing>not set</Missing> : formatLength(workingDistanceMm)),
    },
    {
      key: 'focus',
      header: 'Focus is found by',
      cell: ({ focusMethod }) => (focusMethod === '' ? <Missing>not set</Missing> : focusMethod),
    },
    { key: 'spot', header: 'Measured spot', cell: spotOf },
    {
      key: 'acts',
      header: 'Acts',
      isHeaderHidden: true,
      align: 'end',
      cell: (pair) =>
        pair.allowedActions.includes('edit') && (
          <Button
            kind="quiet"
            ml={{ base: '-4', sm: '0' }}
            aria-label={`Change ${pair.lensName} on this machine`}
            onClick={() => onEdit(pair)}
          >
            Change
          </Button>
        ),
    },
  ];
}

function spotOf({ measuredSpotUm, spotMethod, spotMeasuredOn }: MachineLens) {
  if (measuredSpotUm === null) return <Missing>not measured</Missing>;
  const day = spotMeasuredOn === null ? '' : `, ${formatDay(spotMeasuredOn)}`;
  return (
    <>
      {formatQuantity(measuredSpotUm, 'um')}{' '}
      <chakra.span color="fg.muted">
        {spotMethod}
        {day}
      </chakra.span>
    </>
  );
}
