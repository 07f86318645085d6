import { useState } from 'react';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { ProblemNotice } from '../../../components/problem-notice';
import { ProblemError } from '../../../lib/api';
import { discardDraft, type Revision } from '../recipes.api';

export type DiscardDialogProps = { revision: Revision; onClose: () => void; onDiscarded: () => void };

/** A draft that is thrown away cannot be brought back, so this asks. */
export function DiscardDialog({ revision, onClose, onDiscarded }: DiscardDialogProps) {
  const [problem, setProblem] = useState<ProblemError>();
  const [isBusy, setIsBusy] = useState(false);
  const handleDiscard = async () => {
    setIsBusy(true);
    try {
      await discardDraft(revision);
      onDiscarded();
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      setProblem(error);
      setIsBusy(false);
    }
  };
  return (
    <Dialog
      title={`Throw away the draft of ${revision.recipe.code}`}
      onClose={onClose}
      actions={
        <>
          <Button onClick={onClose}>Keep the draft</Button>
          <Button kind="danger" isBusy={isBusy} onClick={() => void handleDiscard()}>
            Throw away the draft
          </Button>
        </>
      }
    >
      {problem !== undefined && <ProblemNotice what={`${problem.title}.`} safe="The draft is still there." todo={problem.detail} />}
      <p>Its setting, reason and evidence links are gone then. Coupons stay, and the ledger keeps that there was a draft.</p>
    </Dialog>
  );
}
