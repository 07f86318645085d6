import { chakra, Flex } from '@chakra-ui/react';
import type { TransferChoice } from '@proofplate/recipe-model';
import { useState } from 'react';
import { EmptyState } from '../../../components/empty-state';
import { Panel } from '../../../components/page';
import { CreateTransfer } from './create-transfer';
import { OutcomeMark } from './outcome-mark';
import { StepTransfer } from './step-transfer';
import { TargetChoice } from './target-choice';
import type { TransferGround, TransferTarget } from './transfer.api';
import { TransferReasons } from './transfer-reasons';
import { keyOf, nameOf, workOut } from './work-out';

export type TransferBodyProps = {
  revisionId: string;
  ground: TransferGround;
  /** Machine and lens as they stand in the address. */
  chosen: string | undefined;
  onChoose: (key: string) => void;
};

/** Choose a target; everything that follows is worked out at once. */
export function TransferBody({ revisionId, ground, chosen, onChoose }: TransferBodyProps) {
  const target = ground.targets.find((place) => keyOf(place) === chosen);
  if (ground.targets.length === 0) {
    return (
      <EmptyState kind="none-yet" title="There is no other machine or lens">
        A setting is carried over to another machine, or to another lens of the same one. A lead adds both under Equipment.
      </EmptyState>
    );
  }
  return (
    <chakra.div display="grid" gap="4" gridTemplateColumns={{ base: 'minmax(0, 1fr)', xl: '340px minmax(0, 1fr)' }} alignItems="start">
      <TargetChoice ground={ground} chosen={chosen} onChoose={onChoose} />
      {target === undefined ? (
        <EmptyState kind="none-match" title="Choose a machine and a lens">
          Which numbers are kept, at which frequencies, and what its panel would show then stands here.
        </EmptyState>
      ) : (
        <Worked key={keyOf(target)} revisionId={revisionId} ground={ground} target={target} />
      )}
    </chakra.div>
  );
}

type WorkedProps = { revisionId: string; ground: TransferGround; target: TransferTarget };

function Worked({ revisionId, ground, target }: WorkedProps) {
  const [choices, setChoices] = useState<readonly TransferChoice[]>([]);
  const result = workOut(ground, target, choices);
  const choose = (index: number, choice: TransferChoice) =>
    setChoices(ground.steps.map((_, place) => (place === index ? choice : (choices[place] ?? {}))));
  return (
    <chakra.div display="grid" gap="4" minW="0">
      {(result.reasons.length > 0 || ground.steps.length > 1) && (
        <Panel px={{ base: '4', sm: '5' }} py="4" aria-label="All steps">
          <Flex justify="space-between" align="baseline" gap="3" wrap="wrap">
            <h2>To {nameOf(target)}</h2>
            <OutcomeMark outcome={result.outcome} />
          </Flex>
          <TransferReasons reasons={result.reasons} source={ground.source} target={target} />
        </Panel>
      )}
      {result.steps.map((found) => (
        <StepTransfer
          key={found.step}
          ground={ground}
          target={target}
          found={found}
          choice={choices[found.step - 1] ?? {}}
          onChoose={(choice) => choose(found.step - 1, choice)}
        />
      ))}
      <CreateTransfer revisionId={revisionId} target={target} result={result} choices={choices} />
    </chakra.div>
  );
}
