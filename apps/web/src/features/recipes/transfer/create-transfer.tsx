import { chakra, Flex } from '@chakra-ui/react';
import { isDraftable, type TransferChoice, type TransferResult } from '@proofplate/recipe-model';
import { useState } from 'react';
import { useNavigate } from 'react-router';
import { Button, ButtonLink } from '../../../components/button';
import { SelectField } from '../../../components/field';
import { DraftIcon } from '../../../components/icons';
import { Panel } from '../../../components/page';
import { ProblemNotice } from '../../../components/problem-notice';
import { useStatusLine } from '../../../components/status-line';
import { ProblemError } from '../../../lib/api';
import { useIdempotencyKey } from '../../../lib/idempotency-key';
import { paths } from '../../../lib/paths';
import { createTransfer, type TransferTarget } from './transfer.api';

export type CreateTransferProps = {
  revisionId: string;
  target: TransferTarget;
  result: TransferResult;
  choices: readonly TransferChoice[];
};

/** The act at the end: a draft on the target, which says what it is and needs a coupon. */
export function CreateTransfer({ revisionId, target, result, choices }: CreateTransferProps) {
  const navigate = useNavigate();
  const announce = useStatusLine();
  const key = useIdempotencyKey();
  const [recipeId, setRecipeId] = useState('');
  const [problem, setProblem] = useState<ProblemError>();
  const [isBusy, setIsBusy] = useState(false);
  const isEquivalent = result.outcome === 'equivalent';
  const handleCreate = async () => {
    setIsBusy(true);
    setProblem(undefined);
    try {
      const body = { machineId: target.machine.id, lensId: target.lens.id, choices: choices.map((choice) => ({ ...choice })) };
      const into = recipeId === '' ? {} : { recipeId };
      const draft = await createTransfer(revisionId, { ...body, ...into, acceptNotEquivalent: !isEquivalent }, key.current());
      key.renew();
      announce(`${draft.recipe.code} has a draft on ${target.machine.name}. It needs a coupon.`);
      await navigate(paths.recipeRevision(draft.recipe.code, draft.id));
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      setIsBusy(false);
      if (error.status !== 0 && error.status < 500) key.renew();
      setProblem(error);
    }
  };
  if (!isDraftable(result)) return <NothingToDraft result={result} />;
  return (
    <Panel px={{ base: '4', sm: '5' }} py="4" display="grid" gap="3" aria-label="Draft it">
      {target.recipes.length > 0 && (
        <chakra.div maxW={{ sm: '420px' }}>
          <SelectField
            name="recipe"
            label="The draft goes into"
            value={recipeId}
            onChange={(event) => setRecipeId(event.currentTarget.value)}
            options={[
              { value: '', label: 'A new recipe' },
              ...target.recipes.map(({ id, code, title }) => ({ value: id, label: `${code}, ${title}` })),
            ]}
          />
        </chakra.div>
      )}
      <chakra.p maxW="prose">
        The draft cites this revision as its source. It is a proposal: a coupon on {target.machine.name} has to prove it, and a lead writes
        the grounds, before anybody signs. The manual of the machine and the laser safety officer have the last word on its limits.
      </chakra.p>
      {problem !== undefined && (
        <ProblemNotice
          what="No draft was made."
          safe="Nothing was changed."
          todo={[problem.detail, ...problem.errors.map(({ detail }) => detail)].join(' ')}
        />
      )}
      <Flex gap="3" wrap="wrap">
        <Button kind={isEquivalent ? 'primary' : 'plain'} icon={<DraftIcon />} isBusy={isBusy} onClick={() => void handleCreate()}>
          {isEquivalent ? 'Create draft' : 'Create draft, not equivalent'}
        </Button>
      </Flex>
    </Panel>
  );
}

function NothingToDraft({ result: { outcome } }: { result: TransferResult }) {
  return (
    <Panel px={{ base: '4', sm: '5' }} py="4" display="grid" gap="3" aria-label="Draft it">
      <p>
        {outcome === 'not known'
          ? 'There is no setting to draft before what is missing is entered.'
          : 'Nothing can be carried over. A coupon on the target finds a setting of its own.'}
      </p>
      <div>
        <ButtonLink to={paths.planCoupon}>Plan a coupon</ButtonLink>
      </div>
    </Panel>
  );
}
