import { useState } from 'react';
import { useNavigate } from 'react-router';
import { Button } from '../../../components/button';
import { DraftIcon } from '../../../components/icons';
import { useStatusLine } from '../../../components/status-line';
import { ProblemError } from '../../../lib/api';
import { useIdempotencyKey } from '../../../lib/idempotency-key';
import { paths } from '../../../lib/paths';
import { startDraft } from '../recipes.api';

export type ProposeChangeButtonProps = {
  recipe: { id: string; code: string };
  /** Revision to copy; absent: the approved one, else the newest. */
  basedOnId?: string;
  kind?: 'primary' | 'plain';
  label?: string;
};

/** Copies a revision into a draft and opens it. */
export function ProposeChangeButton({ recipe, basedOnId, kind = 'primary', label = 'Propose a change' }: ProposeChangeButtonProps) {
  const navigate = useNavigate();
  const announce = useStatusLine();
  const key = useIdempotencyKey();
  const [isBusy, setIsBusy] = useState(false);
  const handleStart = async () => {
    setIsBusy(true);
    try {
      const draft = await startDraft(recipe.id, basedOnId, key.current());
      key.renew();
      await navigate(paths.recipeRevision(recipe.code, draft.id));
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      setIsBusy(false);
      if (error.status !== 0 && error.status < 500) key.renew();
      announce(`No draft was begun. ${error.detail}`);
    }
  };
  return (
    <Button kind={kind} icon={<DraftIcon />} isBusy={isBusy} onClick={() => void handleStart()}>
      {label}
    </Button>
  );
}
