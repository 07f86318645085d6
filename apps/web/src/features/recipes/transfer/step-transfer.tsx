import { chakra, Flex } from '@chakra-ui/react';
import type { TransferChoice, TransferStep } from '@proofplate/recipe-model';
import { useState } from 'react';
import { NumberField } from '../../../components/field';
import { Panel } from '../../../components/page';
import { stepTitle } from '../../../components/setting-rows';
import { decimalSignOf, readNumber, typedNumber } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';
import { FrequencyChoice } from './frequency-choice';
import { IntervalDrawing } from './interval-drawing';
import { OutcomeMark } from './outcome-mark';
import type { TransferGround, TransferTarget } from './transfer.api';
import { TransferReasons } from './transfer-reasons';
import { frequencyStepKhz, transferGroups } from './transfer-rows';
import { TransferTable } from './transfer-table';
import { asSteps, nameOf } from './work-out';

export type StepTransferProps = {
  ground: TransferGround;
  target: TransferTarget;
  found: TransferStep;
  choice: TransferChoice;
  onChoose: (choice: TransferChoice) => void;
};

/** One mark step: whether its numbers are kept, at which frequencies, and what the target's panel would show. */
export function StepTransfer({ ground, target, found, choice, onChoose }: StepTransferProps) {
  const { shop } = useSession();
  const step = asSteps(ground.steps)[found.step - 1];
  if (step === undefined) return null;
  const { interval, proposal, outcome, reasons } = found;
  const title = stepTitle(step, found.step - 1, ground.steps.length);
  const shownKhz = proposal?.parameters.values.frequencyKhz?.physical;
  const isEquivalent = outcome === 'equivalent';
  return (
    <Panel
      px={{ base: '4', sm: '5' }}
      py="4"
      aria-label={title}
      display="grid"
      gap="4"
      borderStyle={isEquivalent ? undefined : 'dashed'}
      borderColor={isEquivalent ? undefined : 'border.emphasized'}
    >
      <div>
        <Flex justify="space-between" align="baseline" gap="3" wrap="wrap">
          <h2>{title}</h2>
          <span role="status">
            <OutcomeMark outcome={outcome} />
          </span>
        </Flex>
        <TransferReasons reasons={reasons} source={ground.source} target={target} />
      </div>
      {interval !== null && (
        <IntervalDrawing
          interval={interval}
          machineName={target.machine.name}
          chosenKhz={interval.isEmpty ? undefined : (shownKhz ?? choice.frequencyKhz)}
        />
      )}
      {interval !== null && !interval.isEmpty && (
        <FrequencyChoice
          step={found.step}
          interval={interval}
          shownKhz={choice.frequencyKhz ?? shownKhz}
          isChosen={choice.frequencyKhz !== undefined}
          panelStepKhz={frequencyStepKhz(target.panel)}
          onChoose={(frequencyKhz) => onChoose(withOr(choice, { frequencyKhz }))}
        />
      )}
      <FocusChoice found={found} choice={choice} onChoose={onChoose} />
      {proposal !== null && (
        <div>
          {!isEquivalent && (
            <chakra.h3 color="straw.fg" mb="1">
              What comes nearest, not equivalent
            </chakra.h3>
          )}
          <TransferTable
            groups={transferGroups({
              ...{ step, found, sourcePanel: ground.source.panel, targetPanel: target.panel },
              decimalSign: decimalSignOf(shop.locale),
            })}
            sourceName={nameOf(ground.source)}
            targetName={nameOf(target)}
            isEquivalent={isEquivalent}
          />
          {proposal.leftOut.length > 0 && (
            <chakra.p mt="2" fontSize="sm" color="straw.fg">
              Not on this panel, so left out: {proposal.leftOut.join(', ').toLowerCase()}.
            </chakra.p>
          )}
        </div>
      )}
    </Panel>
  );
}

const FARTHEST_MM = 1000;

function FocusChoice({ found: { step, proposal }, choice, onChoose }: Pick<StepTransferProps, 'found' | 'choice' | 'onChoose'>) {
  const { shop } = useSession();
  const [typing, setTyping] = useState<string>();
  const rule = { what: 'The focus offset', unit: 'mm', least: -FARTHEST_MM, most: FARTHEST_MM };
  const read = typing === undefined || typing.trim() === '' ? undefined : readNumber(typing, rule, shop.locale);
  const shownMm = proposal?.parameters.values.focusOffsetMm?.physical ?? choice.focusOffsetMm;
  if (shownMm === undefined && typing === undefined) return null;
  const handleTyped = (text: string) => {
    setTyping(text);
    const now = text.trim() === '' ? { value: undefined } : readNumber(text, rule, shop.locale);
    if ('value' in now) onChoose(withOr(choice, { focusOffsetMm: now.value }));
  };
  return (
    <chakra.div maxW={{ sm: '320px' }}>
      <NumberField
        name={`focus-${step}`}
        label="Focus offset on the target"
        unit="mm"
        help="Clear it for the same share of the Rayleigh length. The spot is smallest in focus."
        value={typing ?? typedNumber(shownMm ?? 0, shop.locale)}
        error={read !== undefined && 'message' in read ? read.message : undefined}
        onChange={(event) => handleTyped(event.currentTarget.value)}
        onBlur={() => (read === undefined || 'value' in read) && setTyping(undefined)}
      />
    </chakra.div>
  );
}

/** A choice that is taken back is absent. */
function withOr(choice: TransferChoice, change: { frequencyKhz?: number | undefined; focusOffsetMm?: number | undefined }): TransferChoice {
  const { frequencyKhz, focusOffsetMm } = { ...choice, ...change };
  return { ...(frequencyKhz === undefined ? {} : { frequencyKhz }), ...(focusOffsetMm === undefined ? {} : { focusOffsetMm }) };
}
