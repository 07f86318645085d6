import { useState } from 'react';
import { useNavigate } from 'react-router';
import { Button } from '../../../../components/button';
import { DraftIcon } from '../../../../components/icons';
import { ProblemNotice } from '../../../../components/problem-notice';
import { ProblemError } from '../../../../lib/api';
import { useIdempotencyKey } from '../../../../lib/idempotency-key';
import { paths } from '../../../../lib/paths';
import type { Coupon, CouponCell } from '../../coupons.api';
import { draftFromCell } from '../log.api';

/** Begins a draft whose setting is what was really marked in the cell, and opens it. */
export function DraftButton({ coupon, cell }: { coupon: Coupon; cell: CouponCell }) {
  const navigate = useNavigate();
  const key = useIdempotencyKey();
  const [isBusy, setIsBusy] = useState(false);
  const [problem, setProblem] = useState<ProblemError>();
  const handleDraft = async () => {
    setIsBusy(true);
    setProblem(undefined);
    try {
      const draft = await draftFromCell(coupon.id, cell.id, key.current());
      key.renew();
      await navigate(paths.recipeRevision(draft.recipe.code, draft.id));
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      if (error.status !== 0 && error.status < 500) key.renew();
      setProblem(error);
      setIsBusy(false);
    }
  };
  return (
    <>
      <Button
        kind="primary"
        shape="wide"
        minHeight={{ base: 'act', lg: 'touch' }}
        icon={<DraftIcon />}
        isBusy={isBusy}
        onClick={() => void handleDraft()}
      >
        Draft a recipe from {cell.address}
      </Button>
      {problem !== undefined && (
        <ProblemNotice
          what={problem.status === 0 ? 'No answer came from the server.' : `No draft was begun: ${problem.title.toLowerCase()}.`}
          safe="The coupon is as it was."
          todo={problem.status === 0 ? 'Press again when the connection is back: it is carried out once.' : problem.detail}
        />
      )}
    </>
  );
}
