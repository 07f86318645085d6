import { chakra, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { type Column, DataTable } from '../../../components/data-table';
import { Dialog } from '../../../components/dialog';
import { PlusIcon } from '../../../components/icons';
import { Panel } from '../../../components/page';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonBlock } from '../../../components/skeletons';
import { useStatusLine } from '../../../components/status-line';
import { formatDay, formatEntered, formatQuantity } from '../../../lib/format';
import { Ageing } from '../ageing/ageing';
import { CalibrationForm } from '../forms/calibration-form';
import { type Calibration, type Machine, useCalibrations } from '../machines.api';
import { CalibrationCurve } from './calibration-curve';
import { conditionsOf } from './reading-conditions';

/** How many earlier readings of the same conditions stand behind the newest in the picture. */
const SHOWN_EARLIER = 3;

export function Calibrations({ machine }: { machine: Machine }) {
  const { data, error, mutate } = useCalibrations(machine.id);
  const [isAdding, setIsAdding] = useState(false);
  const announce = useStatusLine();
  const handleAdded = () => {
    setIsAdding(false);
    announce('The power calibration is added. It stays as it is.');
  };
  return (
    <>
      <chakra.section aria-labelledby="calibrations-title">
        <Flex justify="space-between" align="center" gap="3" wrap="wrap">
          <chakra.h2 id="calibrations-title">Power calibrations</chakra.h2>
          {machine.allowedActions.includes('add-calibration') && (
            <Button icon={<PlusIcon />} onClick={() => setIsAdding(true)}>
              Add readings
            </Button>
          )}
        </Flex>
        {data === undefined && error === undefined && <SkeletonBlock height="240px" label="Loading the calibrations" />}
        {data === undefined && error !== undefined && <ReadProblem problem={error} onRetry={() => void mutate()} />}
        {data !== undefined && <Readings calibrations={data.items} />}
        {isAdding && (
          <Dialog title="Add a power calibration" width="broad" onClose={() => setIsAdding(false)}>
            <CalibrationForm machine={machine} onAdded={handleAdded} />
          </Dialog>
        )}
      </chakra.section>
      {data !== undefined && data.items.length > 0 && <Ageing calibrations={data.items} />}
    </>
  );
}

function Readings({ calibrations }: { calibrations: readonly Calibration[] }) {
  const [newest, ...earlier] = calibrations;
  if (newest === undefined)
    return (
      <chakra.p mt="1" color="fg.muted">
        Nobody has measured this source yet. Until then watts are worked out from the rated power and marked “not calibrated”.
      </chakra.p>
    );
  const shown = earlier.filter((reading) => conditionsOf(reading) === conditionsOf(newest)).slice(0, SHOWN_EARLIER);
  return (
    <chakra.div mt="2" display="grid" gap="4">
      <Panel p="5">
        <CalibrationCurve
          label={`Power over percent on ${formatDay(newest.measuredOn)}: ${newest.points.map(({ percent, watts }) => `${formatEntered(percent)} percent ${formatEntered(watts)} watts`).join(', ')}`}
          newest={{ key: newest.id, points: newest.points }}
          earlier={shown.map(({ id, points }) => ({ key: id, points }))}
        />
        <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
          Solid: {formatDay(newest.measuredOn)} at {conditionsOf(newest)}.
          {shown.length > 0 && ` Dashed: ${shown.map(({ measuredOn }) => formatDay(measuredOn)).join(', ')}.`} Monotone piecewise cubic
          through the readings (Fritsch and Butland 1984); nothing is guessed beyond them.
        </chakra.p>
      </Panel>
      <DataTable label="Power calibrations" columns={COLUMNS} rows={calibrations} rowKey={({ id }) => id} />
    </chakra.div>
  );
}

const COLUMNS: readonly Column<Calibration>[] = [
  {
    key: 'day',
    header: 'Measured on',
    onPhone: 'title',
    cell: ({ measuredOn, createdByName }) => (
      <chakra.div py="1.5" whiteSpace="nowrap">
        <b>{formatDay(measuredOn)}</b>
        <chakra.span display="block" color="fg.muted" fontWeight="normal">
          entered by {createdByName}
        </chakra.span>
      </chakra.div>
    ),
  },
  {
    key: 'top',
    header: 'Highest reading',
    align: 'end',
    cell: ({ points }) => {
      const last = points.at(-1);
      return last === undefined ? '' : `${formatQuantity(last.watts, 'W')} at ${formatQuantity(last.percent, '%')}`;
    },
  },
  { key: 'conditions', header: 'At', cell: conditionsOf },
  {
    key: 'meter',
    header: 'Meter',
    cell: ({ meter, meterDueOn }) => (meterDueOn === null ? meter : `${meter}, due ${formatDay(meterDueOn)}`),
  },
];
