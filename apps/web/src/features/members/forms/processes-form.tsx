import { chakra, Flex } from '@chakra-ui/react';
import { useId, useState } from 'react';
import { Button } from '../../../components/button';
import { Checkbox } from '../../../components/facets';
import { ProblemNotice } from '../../../components/problem-notice';
import { ReadProblem } from '../../../components/read-problem';
import { Segmented } from '../../../components/segmented';
import { SkeletonForm } from '../../../components/skeletons';
import { ProblemError } from '../../../lib/api';
import { changeProcesses, type Member, type Process, useEffectChoices } from '../members.api';
import { isChosen, SOURCES, withProcess } from '../process-choice';

type Extent = 'all' | 'some';
const EXTENTS = [
  { value: 'all', label: 'Every process' },
  { value: 'some', label: 'Only these' },
] as const;

export type ProcessesFormProps = { member: Member; onChanged: () => void };

/** Ticks per effect and kind of source. Nothing ticked means that the person signs for nothing. */
export function ProcessesForm({ member, onChanged }: ProcessesFormProps) {
  const [extent, setExtent] = useState<Extent>(member.signsFor === null ? 'all' : 'some');
  const [chosen, setChosen] = useState<readonly Process[]>(member.signsFor ?? []);
  const [isBusy, setIsBusy] = useState(false);
  const [problem, setProblem] = useState<ProblemError>();
  const handleSave = async () => {
    setIsBusy(true);
    try {
      const plain = chosen.map(({ effectId, sourceKind }) => ({ effectId, sourceKind }));
      await changeProcesses(member, extent === 'all' ? null : plain);
      onChanged();
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      setProblem(error);
      setIsBusy(false);
    }
  };
  return (
    <chakra.div display="grid" gap="4">
      {problem !== undefined && <ProblemNotice what={`${problem.title}.`} safe="Nothing was changed." todo={problem.detail} />}
      <div>
        <Segmented label="Signs for" choices={EXTENTS} value={extent} onChange={setExtent} />
      </div>
      {extent === 'some' && <ProcessTicks chosen={chosen} onChange={setChosen} />}
      <Flex justify="flex-end" position="sticky" bottom="0" mb="-5" mx="-5" px="5" py="3" bg="bg.panel" borderTop="hairline">
        <Button kind="primary" size="touch" isBusy={isBusy} onClick={() => void handleSave()}>
          Save
        </Button>
      </Flex>
    </chakra.div>
  );
}

type TicksProps = { chosen: readonly Process[]; onChange: (chosen: readonly Process[]) => void };

function ProcessTicks({ chosen, onChange }: TicksProps) {
  const { data, error, mutate } = useEffectChoices();
  if (data === undefined)
    return error === undefined ? <SkeletonForm /> : <ReadProblem problem={error} thing="the effects" onRetry={() => void mutate()} />;
  return data.items.map((effect) => (
    <chakra.fieldset key={effect.id} borderTop="hairline" pt="2">
      <chakra.legend float="left" width="full" fontWeight="semibold">
        {effect.name}
      </chakra.legend>
      <Flex wrap="wrap" columnGap="5" clear="both">
        {SOURCES.map(({ value, label }) => {
          const process = { effectId: effect.id, sourceKind: value };
          return (
            <Tick
              key={value}
              label={label}
              isOn={isChosen(chosen, process)}
              onTick={(isOn) => onChange(withProcess(chosen, process, isOn))}
            />
          );
        })}
      </Flex>
    </chakra.fieldset>
  ));
}

function Tick({ label, isOn, onTick }: { label: string; isOn: boolean; onTick: (isOn: boolean) => void }) {
  const id = useId();
  return (
    <chakra.label
      htmlFor={id}
      display="inline-flex"
      alignItems="center"
      gap="2"
      minHeight={{ base: '44px', lg: '36px' }}
      cursor="pointer"
      fontSize="sm"
    >
      <Checkbox id={id} checked={isOn} onChange={(event) => onTick(event.currentTarget.checked)} />
      {label}
    </chakra.label>
  );
}
