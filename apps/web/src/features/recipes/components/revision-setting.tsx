import { chakra } from '@chakra-ui/react';
import { Panel } from '../../../components/page';
import type { Revision } from '../recipes.api';
import { RevisionFacts, SetUpSteps } from './revision-facts';
import { SettingCards } from './setting-cards';

/** What a signature is given for: every mark step as the panel shows it, the set-up, and what it covers and rests on. */
export function RevisionSetting({ revision }: { revision: Revision }) {
  return (
    <chakra.section aria-label="What is signed" display="grid" gap="4" gridTemplateColumns="minmax(0, 1fr)">
      <SettingCards revision={revision} />
      <chakra.div
        display="grid"
        gap="4"
        alignItems="start"
        gridTemplateColumns={{ base: 'minmax(0, 1fr)', xl: 'repeat(2, minmax(0, 1fr))' }}
      >
        <Panel px="5" py="4" aria-label="Set-up">
          <chakra.h2 mb="2">Set-up</chakra.h2>
          <SetUpSteps steps={revision.setUpSteps} />
        </Panel>
        <Panel px="5" py="4" aria-label="Covers and comes from">
          <chakra.h2 mb="2">Covers and comes from</chakra.h2>
          <RevisionFacts revision={revision} />
        </Panel>
      </chakra.div>
    </chakra.section>
  );
}
