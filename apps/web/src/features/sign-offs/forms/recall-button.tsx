import { useState } from 'react';
import { Button } from '../../../components/button';
import { useStatusLine } from '../../../components/status-line';
import { ProblemError } from '../../../lib/api';
import { useIdempotencyKey } from '../../../lib/idempotency-key';
import { type Revision, recallRevision } from '../sign-offs.api';
import { signedAct } from '../signing-problem';

/** The author takes a revision out of review; a new draft can copy it. */
export function RecallButton({ revision }: { revision: Revision }) {
  const announce = useStatusLine();
  const key = useIdempotencyKey();
  const [isBusy, setIsBusy] = useState(false);
  const handleRecall = async () => {
    setIsBusy(true);
    try {
      await signedAct(() => recallRevision(revision.id, {}, { idempotencyKey: key.current() }));
      announce(`Revision ${revision.number} is recalled. Propose a change to go on from it.`);
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      announce(`Not recalled. ${error.detail}`);
    } finally {
      setIsBusy(false);
    }
  };
  return (
    <Button isBusy={isBusy} onClick={() => void handleRecall()}>
      Recall
    </Button>
  );
}
