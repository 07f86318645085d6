import { chakra } from '@chakra-ui/react';
import { roleAtLeast } from '@proofplate/recipe-model';
import { useState } from 'react';
import { useParams } from 'react-router';
import { Button, ButtonLink } from '../components/button';
import { EmptyState } from '../components/empty-state';
import { Page } from '../components/page';
import { ReadProblem } from '../components/read-problem';
import { SkeletonBlock } from '../components/skeletons';
import { StateMark } from '../components/state-mark';
import { useStatusLine } from '../components/status-line';
import { TextLink } from '../components/text-link';
import { DeviationsPanel } from '../features/deviations/components/deviations-panel';
import { Holds, PlaceHoldButton } from '../features/holds/components/holds';
import { RevisionBody } from '../features/recipes/components/revision-body';
import { RevisionLadder } from '../features/recipes/components/revision-ladder';
import { ProposeChangeButton } from '../features/recipes/forms/propose-change-button';
import { CheckDue } from '../features/recipes/power/check-due';
import { type Recipe, useRecipe } from '../features/recipes/recipes.api';
import { recipeMark, recipeStateWord, revisionName } from '../features/recipes/revision-words';
import { WithdrawDialog } from '../features/sign-offs/forms/withdraw-form';
import { paths } from '../lib/paths';
import { useSession } from '../lib/session';

const CRUMBS = [{ label: 'Recipes', to: paths.recipes }];

export function Component() {
  const { code = '' } = useParams();
  const { data: recipe, error, mutate } = useRecipe(code);
  if (recipe === undefined) {
    return (
      <Page title={code} crumbs={[...CRUMBS, { label: code }]}>
        {error === undefined ? (
          <SkeletonBlock height="480px" label="Loading the recipe" />
        ) : (
          <ReadProblem problem={error} thing="this recipe" onRetry={() => void mutate()} />
        )}
      </Page>
    );
  }
  return <RecipePage recipe={recipe} />;
}

function RecipePage({ recipe }: { recipe: Recipe }) {
  const { code, title, currentRevision } = recipe;
  const { member } = useSession();
  return (
    <Page
      title={code}
      name={title}
      crumbs={[...CRUMBS, { label: code }]}
      meta={
        <>
          {recipe.isHeld && <StateMark state="withdrawn">On hold</StateMark>}
          <StateMark state={recipeMark(recipe.state)}>{recipeStateWord(recipe.state)}</StateMark>
          <span>
            {recipe.material.name}, {recipe.finish.name}
          </span>
          <span>{recipe.effect.name}</span>
          <span>
            {recipe.machine.name}, {recipe.lens.name}
          </span>
          <TextLink to={paths.runsOf(recipe)}>Runs</TextLink>
          {member.role !== 'trainee' && <TextLink to={paths.ledgerOf(code)}>In the ledger</TextLink>}
        </>
      }
      actions={<RecipeActions recipe={recipe} />}
    >
      {recipe.holds.length > 0 && (
        <chakra.div mb="4">
          <Holds holds={recipe.holds} subjects={{ recipe, machine: recipe.machine }} mayRelease={recipe.allowedActions.includes('hold')} />
        </chakra.div>
      )}
      <CheckDue recipe={recipe} />
      {currentRevision === null ? (
        <chakra.div display="grid" gap="4">
          <NoApproved recipe={recipe} />
          <RevisionLadder key={recipe.id} recipe={recipe} />
        </chakra.div>
      ) : (
        <RevisionBody revision={currentRevision}>
          <RevisionLadder key={recipe.id} recipe={recipe} />
          {member.role !== 'trainee' && currentRevision.state === 'approved' && (
            <DeviationsPanel
              from={{ revisionId: currentRevision.id, name: `${code} revision ${currentRevision.number}` }}
              mayGrant={roleAtLeast(member.role, 'lead')}
            />
          )}
        </RevisionBody>
      )}
    </Page>
  );
}

function NoApproved({ recipe: { state, underWay, code } }: { recipe: Recipe }) {
  const isWithdrawn = state === 'withdrawn';
  return (
    <EmptyState
      kind="no-right"
      title={isWithdrawn ? 'Withdrawn: there is no approved setting' : 'No approved setting yet'}
      actions={
        underWay === null ? undefined : (
          <ButtonLink to={paths.recipeRevision(code, underWay.id)}>Open {revisionName(underWay).toLowerCase()}</ButtonLink>
        )
      }
    >
      {isWithdrawn
        ? 'Nobody may run it. The ladder says who withdrew it and why.'
        : 'Nobody at a machine sees it before a lead has signed a revision.'}
    </EmptyState>
  );
}

function RecipeActions({ recipe }: { recipe: Recipe }) {
  const [withdrawing, setWithdrawing] = useState<Recipe['revisions'][number]>();
  const announce = useStatusLine();
  const { allowedActions, current, currentRevision, underWay, revisions, code, holds } = recipe;
  const draft = underWay?.state === 'draft' ? underWay : undefined;
  return (
    <>
      {allowedActions.includes('withdraw') &&
        revisions.filter(isSigned).map((revision) => (
          <Button key={revision.id} kind="danger" onClick={() => setWithdrawing(revision)}>
            Withdraw revision {revision.number}
          </Button>
        ))}
      {allowedActions.includes('hold') && !holds.some(({ subject }) => subject === 'recipe') && (
        <PlaceHoldButton subjects={{ recipe }} size="control" />
      )}
      {currentRevision?.allowedActions.includes('transfer') && (
        <ButtonLink to={paths.transferRevision(code, currentRevision.id)}>Transfer…</ButtonLink>
      )}
      {draft !== undefined && (
        <ButtonLink kind="primary" to={paths.recipeRevision(code, draft.id)}>
          Open the draft
        </ButtonLink>
      )}
      {draft === undefined && allowedActions.includes('propose-change') && <ProposeChangeButton recipe={recipe} />}
      {withdrawing !== undefined && (
        <WithdrawDialog
          revision={withdrawing}
          recipeCode={code}
          onClose={() => setWithdrawing(undefined)}
          onWithdrawn={() => {
            setWithdrawing(undefined);
            const staying = withdrawing.state === 'scheduled' ? current : null;
            const now = staying === null ? 'has no approved setting now' : `stays at revision ${staying.number}`;
            announce(`Revision ${withdrawing.number} is withdrawn. ${code} ${now}.`);
          }}
        />
      )}
    </>
  );
}

/** What can be withdrawn: the approved revision and one that is yet to take effect. */
const isSigned = ({ state }: { state: string }) => state === 'approved' || state === 'scheduled';
