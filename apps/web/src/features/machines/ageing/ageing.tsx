import { chakra, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { type Column, DataTable } from '../../../components/data-table';
import { SelectField } from '../../../components/field';
import { Panel } from '../../../components/page';
import { formatDay, formatPercentChange, formatQuantity } from '../../../lib/format';
import { conditionsOf } from '../components/reading-conditions';
import type { Calibration } from '../machines.api';
import { AgeingChart } from './ageing-chart';
import { type AgeingPoint, type ReadingGroup, readingGroups, sharedPercents, wattsOverTime } from './ageing-series';

/** How a source has aged: its watts at one setting over the days on which somebody read them. */
export function Ageing({ calibrations }: { calibrations: readonly Calibration[] }) {
  const groups = readingGroups(calibrations).filter((group) => group.readings.length > 1 && sharedPercents(group).length > 0);
  const [chosenKey, setChosenKey] = useState<string>();
  const group = groups.find(({ key }) => key === chosenKey) ?? groups[0];
  return (
    <chakra.section aria-labelledby="ageing-title">
      <chakra.h2 id="ageing-title">Ageing of the source</chakra.h2>
      {group === undefined ? (
        <chakra.p mt="1" color="fg.muted">
          It shows from the second reading at the same frequency and pulse width.
        </chakra.p>
      ) : (
        <AgeingOf key={group.key} group={group} groups={groups} onGroup={setChosenKey} />
      )}
    </chakra.section>
  );
}

type AgeingOfProps = { group: ReadingGroup; groups: readonly ReadingGroup[]; onGroup: (key: string) => void };

function AgeingOf({ group, groups, onGroup }: AgeingOfProps) {
  const percents = sharedPercents(group);
  const [percent, setPercent] = useState(percents[0] ?? 100);
  const points = wattsOverTime(group, percent);
  const [first, last] = [points[0], points.at(-1)];
  if (first === undefined || last === undefined) return null;
  const words = `At ${formatQuantity(percent, '%')}: ${wattsWords(first)}, ${wattsWords(last)}: ${changeSince(first, last)}.`;
  return (
    <Panel mt="2" p="5" display="grid" gap="4">
      <Flex gap="4" wrap="wrap">
        {groups.length > 1 && (
          <SelectField
            name="ageing-conditions"
            label="Read at"
            value={group.key}
            onChange={({ target }) => onGroup(target.value)}
            options={groups.map(({ key, readings }) => ({
              value: key,
              label: readings[0] === undefined ? key : conditionsOf(readings[0]),
            }))}
          />
        )}
        <SelectField
          name="ageing-percent"
          label="Power set"
          value={String(percent)}
          onChange={({ target }) => setPercent(Number(target.value))}
          options={percents.map((choice) => ({ value: String(choice), label: formatQuantity(choice, '%') }))}
        />
      </Flex>
      <AgeingChart points={points} label={words} />
      <p>{words}</p>
      <DataTable label="Watts over the days" columns={columns(first)} rows={points} rowKey={({ id }) => id} />
    </Panel>
  );
}

const wattsWords = ({ measuredOn, watts }: AgeingPoint) => `${formatQuantity(watts, 'W', { decimals: 2 })} on ${formatDay(measuredOn)}`;
const changeSince = (first: AgeingPoint, { watts }: AgeingPoint) =>
  first.watts > 0 ? formatPercentChange(watts / first.watts - 1, { decimals: 1 }) : 'no share of nothing';

const columns = (first: AgeingPoint): readonly Column<AgeingPoint>[] => [
  { key: 'day', header: 'Measured on', onPhone: 'title', cell: ({ measuredOn }) => formatDay(measuredOn) },
  { key: 'watts', header: 'Watts', align: 'end', cell: ({ watts }) => formatQuantity(watts, 'W', { decimals: 2 }) },
  { key: 'change', header: 'Since the first', align: 'end', cell: (point) => (point.id === first.id ? '' : changeSince(first, point)) },
];
