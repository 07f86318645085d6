import { chakra, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../../components/button';
import { Panel } from '../../../../components/page';
import { StateShape } from '../../../../components/state-mark';
import { formatTime } from '../../../../lib/format';
import { CriteriaForm, CriteriaWords } from '../forms/criteria-form';
import type { Inspection } from '../log.api';

const CRITERIA_ID = 'criteria';

export type CriteriaPanelProps = { couponId: string; inspection: Inspection; locale: string; timeZone: string };

/** The criteria: to be recorded first, then standing as they are. */
export function CriteriaPanel({ couponId, inspection, locale, timeZone }: CriteriaPanelProps) {
  const { criteria, criteriaRecordedAt, areCriteriaFixed, proposedCriteria, version, allowedActions } = inspection;
  const [isChanging, setIsChanging] = useState(false);
  const mayRecord = allowedActions.includes('record-criteria') && !areCriteriaFixed;
  if (criteria !== null && !isChanging) {
    return (
      <Panel id={CRITERIA_ID} tabIndex={-1} px="5" py="3" aria-label="Acceptance criteria">
        <Flex justify="space-between" align="baseline" gap="3" wrap="wrap">
          <h2>Acceptance criteria</h2>
          {mayRecord && (
            <Button kind="quiet" px="2" onClick={() => setIsChanging(true)}>
              Change
            </Button>
          )}
        </Flex>
        <CriteriaWords criteria={criteria} />
        <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted" mt="1">
          {criteriaRecordedAt === null ? '' : `Recorded ${formatTime(criteriaRecordedAt, timeZone)}, before the first result.`}
        </chakra.p>
      </Panel>
    );
  }
  if (!mayRecord) return null;
  return (
    <chakra.section
      aria-label="Acceptance criteria"
      px="5"
      py="4"
      bg="straw.subtle"
      border="hairline"
      borderColor="straw.emphasized"
      borderRadius="md"
    >
      <Flex gap="2" align="center" mb="1">
        <chakra.span lineHeight="none">
          <StateShape state="caution" />
        </chakra.span>
        <h2>Record the acceptance criteria first</h2>
      </Flex>
      <chakra.p mb="3">
        Say what a mark must meet before the first cell is judged. Once something is rated or measured they stay as they are.
      </chakra.p>
      <CriteriaForm
        couponId={couponId}
        version={version}
        criteria={criteria ?? proposedCriteria}
        locale={locale}
        onRecorded={() => {
          setIsChanging(false);
          // the form that had the focus is gone, and the panel stands elsewhere
          requestAnimationFrame(() => document.getElementById(CRITERIA_ID)?.focus());
        }}
      />
    </chakra.section>
  );
}
