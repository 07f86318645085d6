import { chakra, Flex } from '@chakra-ui/react';
import { type ReactNode, useState } from 'react';
import { Button, ButtonLink } from '../../../components/button';
import { CouponIcon, RunIcon } from '../../../components/icons';
import { Panel } from '../../../components/page';
import { paths } from '../../../lib/paths';
import type { Revision } from '../recipes.api';
import { CautionFields } from './caution-fields';
import { ConflictView } from './conflict-view';
import { CoverFields, ReasonFields } from './cover-fields';
import { EvidenceFields } from './evidence-fields';
import { ProveItDialog } from './prove-it';
import { SavingLine } from './saving-line';
import { SetUpFields } from './set-up-fields';
import { StepFields } from './step-fields';
import { useDraft } from './use-draft';

export type DraftEditorProps = {
  revision: Revision;
  /** Checks and submit, which belong to signing: they get the way to save first. */
  children: (saving: { flush: () => Promise<boolean>; isSaved: boolean }) => ReactNode;
};

/** A draft with everything that is signed later: setting left; reason, proof, checks and the way to submit right. */
export function DraftEditor({ revision, children }: DraftEditorProps) {
  const draft = useDraft(revision);
  const { form, messages, conflict, flush, state } = draft;
  const editing = { form, messages, revision };
  return (
    <>
      <chakra.div mb="3">
        <SavingLine draft={draft} fields={revision.profile.panel.fields} />
      </chakra.div>
      {conflict !== undefined && <ConflictView conflict={conflict} onResolve={draft.resolve} />}
      <CautionFields form={form} cautions={revision.cautions} />
      <chakra.div
        display="grid"
        gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: 'minmax(0, 1fr) 392px' }}
        gap={{ base: '4', lg: '6' }}
        alignItems="start"
      >
        <chakra.div display="grid" gap="4" gridTemplateColumns="minmax(0, 1fr)">
          <StepFields {...editing} />
          <SetUpFields form={form} messages={messages} />
          <CoverFields form={form} messages={messages} />
        </chakra.div>
        <chakra.div display="grid" gap="4" gridTemplateColumns="minmax(0, 1fr)">
          <ReasonFields {...editing} />
          <EvidenceFields revision={revision} draft={draft} />
          {revision.allowedActions.includes('start-confirmation') && <ProveIt revision={revision} form={form} flush={flush} />}
          {children({ flush, isSaved: state === 'saved' && conflict === undefined })}
        </chakra.div>
      </chakra.div>
    </>
  );
}

type ProveItProps = { revision: Revision; form: ReturnType<typeof useDraft>['form']; flush: () => Promise<boolean> };

function ProveIt({ revision, form, flush }: ProveItProps) {
  const [isPlanning, setIsPlanning] = useState(false);
  return (
    <Panel px="5" py="4" aria-label="Prove it">
      <h2>Prove it</h2>
      <chakra.p mt="1">
        A lead signs what was marked again with exactly this setting: on a coupon of equal cells, or in a confirmation run.
      </chakra.p>
      <Flex gap="2" wrap="wrap" mt="3">
        <Button icon={<CouponIcon />} onClick={() => setIsPlanning(true)}>
          Plan a coupon
        </Button>
        <ButtonLink icon={<RunIcon />} to={`${paths.startRun(revision.id)}&kind=confirmation`}>
          Confirmation run
        </ButtonLink>
      </Flex>
      {isPlanning && (
        <ProveItDialog
          revision={revision}
          acknowledged={form.getValues('acknowledged')}
          flush={flush}
          onClose={() => setIsPlanning(false)}
        />
      )}
    </Panel>
  );
}
