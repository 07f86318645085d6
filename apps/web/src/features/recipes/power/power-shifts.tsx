import { chakra } from '@chakra-ui/react';
import { type Column, DataTable } from '../../../components/data-table';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonBlock } from '../../../components/skeletons';
import { StateMark } from '../../../components/state-mark';
import { TextLink } from '../../../components/text-link';
import { formatDay, formatPercentChange, formatQuantity } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import { type PowerShift, type RecipePowerShift, usePowerShifts } from '../recipes.api';

/** Which approved settings of a machine the latest readings have moved, those that need a check first. */
export function PowerShifts({ machine }: { machine: { id: string } }) {
  const { data, error, mutate } = usePowerShifts(machine.id);
  return (
    <chakra.section aria-labelledby="power-shifts-title">
      <chakra.h2 id="power-shifts-title">Recipes and their watts now</chakra.h2>
      {data === undefined && error === undefined && <SkeletonBlock height="120px" label="Loading the recipes of this machine" />}
      {data === undefined && error !== undefined && <ReadProblem problem={error} onRetry={() => void mutate()} />}
      {data !== undefined && <Shifts items={data.items} />}
    </chakra.section>
  );
}

function Shifts({ items }: { items: readonly RecipePowerShift[] }) {
  if (items.length === 0)
    return (
      <chakra.p mt="1" color="fg.muted">
        No recipe is approved on this machine yet.
      </chakra.p>
    );
  const moved = items.filter(hasShift).sort(byUrgency);
  const due = items.filter(({ shift }) => shift?.isCheckDue === true).length;
  const limit = items.find(({ shift }) => shift !== null)?.shift?.limitPercent;
  return (
    <>
      <chakra.p mt="1" mb="2" color="fg.muted">
        {due === 0 ? 'None is due for a check. ' : `${due} of ${items.length} due for a check. `}
        {limit !== undefined && `A setting is, once its watts have moved by more than ${formatQuantity(limit, '%')} since it was proved.`}
      </chakra.p>
      {moved.length > 0 && <DataTable label="Recipes and their watts now" columns={COLUMNS} rows={moved} rowKey={({ id }) => id} />}
      <NothingToCompare items={items} />
    </>
  );
}

/** The others in a line for each reason: a row of empty cells tells nobody anything. */
function NothingToCompare({ items }: { items: readonly RecipePowerShift[] }) {
  const reasons = [...new Set(items.flatMap(({ reason }) => (reason === null ? [] : [reason])))];
  return reasons.map((reason) => (
    <chakra.p key={reason} mt="2" color="fg.muted">
      {reason}{' '}
      {items
        .filter((item) => item.reason === reason)
        .map(({ id, code, title }) => (
          <TextLink key={id} to={paths.recipe(code)} title={title} mr="2">
            {code}
          </TextLink>
        ))}
    </chakra.p>
  ));
}

type Moved = RecipePowerShift & { shift: PowerShift };
const hasShift = (item: RecipePowerShift): item is Moved => item.shift !== null;
const byUrgency = (one: Moved, other: Moved) => Math.abs(other.shift.shiftPercent) - Math.abs(one.shift.shiftPercent);

const COLUMNS: readonly Column<Moved>[] = [
  {
    key: 'recipe',
    header: 'Recipe',
    onPhone: 'title',
    cell: ({ code, title, revisionNumber }) => (
      <chakra.div py="1.5">
        <TextLink to={paths.recipe(code)} fontWeight="semibold">
          {code}
        </TextLink>
        <chakra.span display="block" color="fg.muted" fontWeight="normal">
          {title}, revision {revisionNumber}
        </chakra.span>
      </chakra.div>
    ),
  },
  {
    key: 'before',
    header: 'When proved',
    align: 'end',
    cell: ({ shift }) => <Read watts={shift.beforeW} day={shift.citedOn} />,
  },
  {
    key: 'now',
    header: 'By the latest reading',
    align: 'end',
    cell: ({ shift }) => <Read watts={shift.afterW} day={shift.measuredOn} />,
  },
  {
    key: 'shift',
    header: 'Moved',
    align: 'end',
    cell: ({ shift }) => formatPercentChange(shift.shiftPercent / 100, { decimals: 1 }),
  },
  {
    key: 'due',
    header: 'Check',
    cell: ({ shift }) => (shift.isCheckDue ? <StateMark state="reproveDue">Check due</StateMark> : 'within the policy'),
  },
];

function Read({ watts, day }: { watts: number; day: string }) {
  return (
    <chakra.span whiteSpace="nowrap">
      {formatQuantity(watts, 'W', { decimals: 2 })}
      <chakra.span display="block" color="fg.muted">
        {formatDay(day)}
      </chakra.span>
    </chakra.span>
  );
}
