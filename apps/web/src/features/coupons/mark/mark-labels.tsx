import { chakra } from '@chakra-ui/react';
import { ASSIST_LABELS, FILL_LABELS } from '@proofplate/recipe-model';
import { useState } from 'react';
import { ActBar } from '../../../components/act-bar';
import { Button } from '../../../components/button';
import { ProblemNotice } from '../../../components/problem-notice';
import { ProblemError } from '../../../lib/api';
import { type Coupon, type ShopCaution, startMarking } from '../coupons.api';
import { NeverMarked } from '../plan/never-marked';
import { READ_CAUTIONS_ID, ReadCautions } from '../plan/read-cautions';
import { DialList } from './dial-list';
import { CouponDownloads } from './downloads';
import { dialRows } from './marking-order';

export type MarkLabelsProps = { coupon: Coupon; cautions: readonly ShopCaution[]; onStarted: (coupon: Coupon) => void };

/** Before the cells: cautions, then the files, then corner marks, letters and code with their own setting. */
export function MarkLabels({ coupon, cautions, onStarted }: MarkLabelsProps) {
  const [never, care] = [cautions.filter(({ level }) => level === 'never'), cautions.filter(({ level }) => level === 'care')];
  const [readIds, setReadIds] = useState<readonly string[]>([]);
  const [isAsked, setIsAsked] = useState(false);
  const isRead = care.every(({ id }) => readIds.includes(id));
  const [isBusy, setIsBusy] = useState(false);
  const [problem, setProblem] = useState<ProblemError>();
  const [grid] = coupon.grids;
  const labelStep = grid?.labelStep ?? null;
  const handleStart = async () => {
    setIsAsked(true);
    if (!isRead) {
      document.getElementById(READ_CAUTIONS_ID)?.focus();
      return;
    }
    setIsBusy(true);
    setProblem(undefined);
    try {
      onStarted(await startMarking(coupon));
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      setProblem(error);
    } finally {
      setIsBusy(false);
    }
  };
  return (
    <chakra.div display="grid" gap="4" maxW="640px">
      {problem !== undefined && <ProblemNotice what="Marking was not started." safe="Nothing was stored." todo={problem.detail} />}
      {never.map((caution) => (
        <NeverMarked key={caution.id} caution={caution} />
      ))}
      <ReadCautions
        cautions={care}
        readIds={readIds}
        onRead={setReadIds}
        error={isAsked && !isRead ? 'Read them and say so before you mark.' : undefined}
      />
      <CouponDownloads coupon={coupon} />
      <chakra.section aria-labelledby="labels-first" display="grid" gap="2">
        <chakra.h2 id="labels-first">{labelStep === null ? 'No setting for labels' : 'Labels first'}</chakra.h2>
        <chakra.p>
          {labelStep === null
            ? 'This plan has no setting for corner marks and letters. Without them a photo is laid under the grid by hand.'
            : 'Prove this setting on a scrap edge: corner marks, letters and code must be read in every photo. Then mark them on the plate.'}
        </chakra.p>
        {labelStep !== null && (
          <>
            <DialList label="Setting of the labels" rows={dialRows(coupon.profile.panel, labelStep)} isFirst />
            <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
              Fill: {FILL_LABELS[labelStep.fill].toLowerCase()}. Assist: {ASSIST_LABELS[labelStep.assist].toLowerCase()}.
            </chakra.p>
          </>
        )}
      </chakra.section>
      <ActBar>
        <Button kind="primary" size="primaryAct" isBusy={isBusy} onClick={() => void handleStart()}>
          {labelStep === null ? 'Start with the cells' : 'Labels are marked'}
        </Button>
      </ActBar>
    </chakra.div>
  );
}
