import { chakra, Flex } from '@chakra-ui/react';
import { CautionIcon } from '../../../components/icons';
import { Panel } from '../../../components/page';
import { Tick } from '../../../components/setting-card';
import { setUpTick } from '../../../lib/kept-ticks';
import type { FinderAnswer } from '../finder.api';

export type SetUpStepsProps = {
  steps: FinderAnswer['setUpSteps'];
  ticks: ReadonlySet<string>;
  onTick: (key: string, isTicked: boolean) => void;
};

/** What is done before the laser fires, in its order; steps that a run insists on say so. */
export function SetUpSteps({ steps, ticks, onTick }: SetUpStepsProps) {
  const doneCount = steps.filter((_, index) => ticks.has(setUpTick(index))).length;
  return (
    <Panel pl="5" pr="4" pt="2.5" aria-label="Set-up">
      <Flex justify="space-between" align="baseline" mb="1">
        <h2>Set-up</h2>
        <chakra.span fontSize="sm" color="fg.muted" aria-live="polite">
          {doneCount} of {steps.length} done
        </chakra.span>
      </Flex>
      <ol>
        {steps.map(({ text, caution, mustTick }, index) => (
          <chakra.li
            // Steps are known by their place.
            key={setUpTick(index)}
            display="grid"
            gridTemplateColumns={{ base: '26px minmax(0, 1fr) 64px', lg: '28px minmax(0, 1fr) 56px' }}
            alignItems="center"
            minHeight={{ base: 'glove', lg: 'touch' }}
            borderTop="hairline"
          >
            <chakra.span color="fg.subtle" fontSize="sm" aria-hidden="true">
              {index + 1}
            </chakra.span>
            <chakra.span py="1">
              {text}
              {caution !== undefined && caution !== '' && (
                <Flex gap="2" align="center" fontSize="sm" lineHeight="sm" color="straw.fg">
                  <CautionIcon size={16} />
                  {caution}
                </Flex>
              )}
              {mustTick && (
                <chakra.span display="block" fontSize="sm" lineHeight="sm" color="fg.muted">
                  needed before a run
                </chakra.span>
              )}
            </chakra.span>
            <Tick
              label={`Step ${index + 1} is done`}
              isTicked={ticks.has(setUpTick(index))}
              onChange={(isOn) => onTick(setUpTick(index), isOn)}
            />
          </chakra.li>
        ))}
      </ol>
    </Panel>
  );
}
