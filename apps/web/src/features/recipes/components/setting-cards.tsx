import { chakra } from '@chakra-ui/react';
import { FactList } from '../../../components/fact-list';
import { SettingCard } from '../../../components/setting-card';
import { besidePanel, settingRows, stepTitle } from '../../../components/setting-rows';
import { decimalSignOf } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';
import type { Revision } from '../recipes.api';
import { markOf } from '../revision-words';

/** One nameplate for each mark step, in the order of marking. */
export function SettingCards({ revision }: { revision: Revision }) {
  const { shop } = useSession();
  const decimalSign = decimalSignOf(shop.locale);
  const { steps, recipe, profile } = revision;
  return (
    <chakra.div display="grid" gap="4">
      {steps.map((step, index) => (
        // Steps have no names of their own; their place is what they are known by.
        <div key={`${index + 1} ${step.purpose}`}>
          <SettingCard
            code={recipe.code}
            revision={revision.number}
            state={markOf(revision)}
            caption={`${stepTitle(step, index, steps.length)}, in the order of ${recipe.machine.name}’s panel`}
            rows={settingRows(step, profile.panel, decimalSign)}
          />
          <chakra.div px={{ base: '1', sm: '7' }} pt="1">
            <FactList facts={besidePanel(step, profile.panel, decimalSign)} />
          </chakra.div>
        </div>
      ))}
      {steps.length === 0 && <chakra.p color="fg.muted">No mark step has been entered yet.</chakra.p>}
    </chakra.div>
  );
}
