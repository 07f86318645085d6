import { chakra } from '@chakra-ui/react';
import { useId } from 'react';
import { Panel } from '../../../components/page';
import { OutcomeMark } from './outcome-mark';
import type { TransferGround } from './transfer.api';
import { judgedTargets, keyOf } from './work-out';

export type TargetChoiceProps = { ground: TransferGround; chosen: string | undefined; onChoose: (key: string) => void };

/** Every other machine and lens, each with what a transfer to it would be worth. */
export function TargetChoice({ ground, chosen, onChoose }: TargetChoiceProps) {
  const name = useId();
  return (
    <Panel px="5" py="4">
      <chakra.fieldset minW="0">
        <chakra.legend fontWeight="semibold" fontSize="lg">
          To which machine and lens?
        </chakra.legend>
        <chakra.ul mt="2">
          {judgedTargets(ground).map(({ target, outcome }) => (
            <chakra.li key={keyOf(target)} borderTop="hairline">
              <chakra.label
                display="grid"
                gridTemplateColumns="28px minmax(0, 1fr)"
                alignItems="center"
                gap="2"
                minHeight="52px"
                py="1.5"
                cursor="pointer"
              >
                <chakra.input
                  type="radio"
                  name={name}
                  value={keyOf(target)}
                  checked={keyOf(target) === chosen}
                  onChange={() => onChoose(keyOf(target))}
                  boxSize="20px"
                  accentColor="brand.solid"
                />
                <span>
                  <b>{target.machine.name}</b>, {target.lens.name}
                  <chakra.span display="block" fontSize="sm">
                    <OutcomeMark outcome={outcome} />
                  </chakra.span>
                </span>
              </chakra.label>
            </chakra.li>
          ))}
        </chakra.ul>
      </chakra.fieldset>
    </Panel>
  );
}
