import { chakra, Flex } from '@chakra-ui/react';
import { fieldId } from '../../../components/field';
import { CautionIcon } from '../../../components/icons';
import { Panel } from '../../../components/page';
import { SettingCard, Tick } from '../../../components/setting-card';
import { settingRows, stepTitle } from '../../../components/setting-rows';
import type { MarkState } from '../../../components/state-mark';
import { settingTick, setUpTick } from '../../../lib/kept-ticks';
import { decimalSignOf } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';
import type { Run, StartSheet } from '../runs.api';

type Shown = Pick<Run | StartSheet, 'recipe' | 'revision' | 'machine' | 'panel' | 'steps' | 'setUpSteps'>;
export type RunStepsProps = { shown: Shown; ticks: ReadonlySet<string>; onTick?: ((key: string, isTicked: boolean) => void) | undefined };

const MARK_OF: Record<Shown['revision']['state'], MarkState> = {
  draft: 'draft',
  in_review: 'inReview',
  returned: 'returned',
  scheduled: 'approved',
  approved: 'approved',
  superseded: 'superseded',
  withdrawn: 'withdrawn',
};

/** The setting cards of a run, ticked as far as they are dialled in. */
export function RunCards({ shown, ticks, onTick }: RunStepsProps) {
  const { shop } = useSession();
  const { steps, panel, recipe, revision, machine } = shown;
  return (
    <chakra.div display="grid" gap="4" minW="0">
      {steps.map((step, index) => {
        const prefix = settingTick(index, '');
        const own = new Set([...ticks].filter((key) => key.startsWith(prefix)).map((key) => key.slice(prefix.length)));
        const order = `In the order of ${machine.name}’s panel`;
        return (
          <SettingCard
            // Steps have no names of their own; their place is what they are known by.
            key={prefix}
            code={recipe.code}
            revision={revision.number}
            state={MARK_OF[revision.state]}
            caption={steps.length === 1 ? order : `${stepTitle(step, index, steps.length)}. ${order}`}
            rows={settingRows(step, panel, decimalSignOf(shop.locale))}
            ticked={own}
            {...(onTick === undefined ? {} : { onTick: (key: string, isTicked: boolean) => onTick(settingTick(index, key), isTicked) })}
          />
        );
      })}
    </chakra.div>
  );
}

/** Set-up steps with their ticks; those that a run insists on say so. */
export function RunSetUp({ shown: { setUpSteps }, ticks, onTick }: RunStepsProps) {
  if (setUpSteps.length === 0) return null;
  return (
    <Panel id={fieldId('ticks')} tabIndex={-1} pl="5" pr="4" pt="2.5" aria-label="Set-up">
      <chakra.h2 mb="1">Set-up</chakra.h2>
      <ol>
        {setUpSteps.map(({ text, caution, mustTick }, index) => (
          <chakra.li
            // Steps are known by their place.
            key={setUpTick(index)}
            display="grid"
            gridTemplateColumns="28px minmax(0, 1fr) 64px"
            alignItems="center"
            minHeight="glove"
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
                  needed before the run starts
                </chakra.span>
              )}
            </chakra.span>
            {onTick === undefined ? (
              <chakra.span fontSize="sm" color="fg.muted" textAlign="end">
                {ticks.has(setUpTick(index)) ? 'done' : 'open'}
              </chakra.span>
            ) : (
              <Tick
                label={`Step ${index + 1} is done`}
                isTicked={ticks.has(setUpTick(index))}
                onChange={(isOn) => onTick(setUpTick(index), isOn)}
              />
            )}
          </chakra.li>
        ))}
      </ol>
    </Panel>
  );
}
