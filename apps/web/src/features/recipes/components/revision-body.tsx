import { chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { CautionList } from '../../../components/caution-list';
import { GeneralCautions } from '../../../components/general-cautions';
import { NumbersPanel } from '../../../components/numbers-panel/numbers-panel';
import { Panel } from '../../../components/page';
import { revisionNumbers } from '../../../components/setting-numbers';
import type { Revision } from '../recipes.api';
import { EvidencePlates } from './evidence-plates';
import { RevisionFacts, SetUpSteps } from './revision-facts';
import { SettingCards } from './setting-cards';
import { Signatures } from './signatures';

/** A revision as it stands: cautions, setting, evidence, signatures. `children` come first in the second column. */
export function RevisionBody({ revision, children }: { revision: Revision; children?: ReactNode }) {
  return (
    <>
      <RevisionCautions revision={revision} />
      <chakra.div
        display="grid"
        gridTemplateColumns={{ base: 'minmax(0, 1fr)', xl: 'minmax(0, 600px) minmax(0, 1fr)' }}
        gap={{ base: '4', lg: '6' }}
        alignItems="start"
      >
        <chakra.div display="grid" gap="4">
          <SettingCards revision={revision} />
          <Section title="Set-up">
            <SetUpSteps steps={revision.setUpSteps} />
          </Section>
          <Section title="What follows from it">
            <NumbersPanel label="What follows from it" groups={revisionNumbers(revision)} />
          </Section>
        </chakra.div>
        <chakra.div display="grid" gap="4">
          {children}
          <Section title="Evidence">
            <EvidencePlates evidence={revision.evidence} />
          </Section>
          <Section title="Signatures">
            <Signatures signOffs={revision.signOffs} />
          </Section>
          <Section title="Covers and comes from">
            <RevisionFacts revision={revision} />
          </Section>
        </chakra.div>
      </chakra.div>
    </>
  );
}

/** Those of this work side by side, those of all work in one row, as at the machine. */
export function RevisionCautions({ revision: { cautions } }: { revision: Revision }) {
  if (cautions.length === 0) return null;
  const own = cautions.filter(({ isGeneral }) => !isGeneral);
  return (
    <chakra.div mb="4" display="grid" gap="2">
      <CautionList cautions={own.map(({ id, subject, text, source }) => ({ key: id, act: subject, reason: text, source }))} />
      <GeneralCautions cautions={cautions.filter(({ isGeneral }) => isGeneral)} />
    </chakra.div>
  );
}

export function Section({ title, children }: { title: string; children: ReactNode }) {
  return (
    <Panel px="5" py="4" aria-label={title}>
      <chakra.h2 mb="2">{title}</chakra.h2>
      {children}
    </Panel>
  );
}
