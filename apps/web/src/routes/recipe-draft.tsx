import { useState } from 'react';
import { useNavigate, useParams } from 'react-router';
import { Button, ButtonLink } from '../components/button';
import { Page } from '../components/page';
import { ReadProblem } from '../components/read-problem';
import { SkeletonBlock } from '../components/skeletons';
import { StateMark } from '../components/state-mark';
import { useStatusLine } from '../components/status-line';
import { RevisionBody } from '../features/recipes/components/revision-body';
import { DraftEditor } from '../features/recipes/draft/draft-editor';
import { DiscardDialog } from '../features/recipes/forms/discard-dialog';
import { ProposeChangeButton } from '../features/recipes/forms/propose-change-button';
import { type Revision, useRevision } from '../features/recipes/recipes.api';
import { markOf, revisionName } from '../features/recipes/revision-words';
import { DraftChecks } from '../features/sign-offs/components/draft-checks';
import { RecallButton } from '../features/sign-offs/forms/recall-button';
import { paths } from '../lib/paths';

/** One revision: its draft to be written, or what was submitted, to be read. */
export function Component() {
  const { code = '', revisionId } = useParams();
  const { data: revision, error, mutate } = useRevision(revisionId);
  if (revision !== undefined) return <RevisionPage revision={revision} />;
  return (
    <Page
      title={code}
      crumbs={[
        { label: 'Recipes', to: paths.recipes },
        { label: code, to: paths.recipe(code) },
      ]}
    >
      {error === undefined ? (
        <SkeletonBlock height="560px" label="Loading the revision" />
      ) : (
        <ReadProblem problem={error} thing="this revision" onRetry={() => void mutate()} />
      )}
    </Page>
  );
}

function RevisionPage({ revision }: { revision: Revision }) {
  const navigate = useNavigate();
  const announce = useStatusLine();
  const { recipe, author, reason, allowedActions, state } = revision;
  const isEditor = state === 'draft' && allowedActions.includes('edit');
  const handleSubmitted = (submitted: Revision) => {
    announce(`Revision ${submitted.number} of ${recipe.code} waits for a lead.`);
    void navigate(paths.recipe(recipe.code));
  };
  return (
    <Page
      title={recipe.code}
      name={`${recipe.title}, ${revisionName(revision).toLowerCase()}`}
      crumbs={[
        { label: 'Recipes', to: paths.recipes },
        { label: recipe.code, to: paths.recipe(recipe.code) },
        { label: revisionName(revision) },
      ]}
      meta={
        <>
          <StateMark state={markOf(revision)} />
          <span>
            {recipe.material.name}, {recipe.finish.name}, {recipe.effect.name}
          </span>
          <span>
            {recipe.machine.name}, {recipe.lens.name}
          </span>
          <span>by {author.name}</span>
          {!isEditor && reason !== '' && <span>Reason: {reason}</span>}
        </>
      }
      actions={<RevisionActions revision={revision} />}
    >
      {isEditor ? (
        <DraftEditor key={revision.id} revision={revision}>
          {({ flush, isSaved }) => <DraftChecks revision={revision} flush={flush} isSaved={isSaved} onSubmitted={handleSubmitted} />}
        </DraftEditor>
      ) : (
        <RevisionBody revision={revision} />
      )}
    </Page>
  );
}

function RevisionActions({ revision }: { revision: Revision }) {
  const navigate = useNavigate();
  const announce = useStatusLine();
  const [isDiscarding, setIsDiscarding] = useState(false);
  const { allowedActions, recipe, id, comparedWith } = revision;
  const may = (action: string) => allowedActions.includes(action);
  return (
    <>
      {comparedWith !== null && <ButtonLink to={`${paths.compareRevisions(recipe.code)}?ids=${comparedWith.id},${id}`}>Compare</ButtonLink>}
      {may('recall') && <RecallButton revision={revision} />}
      {may('transfer') && <ButtonLink to={paths.transferRevision(recipe.code, id)}>Transfer…</ButtonLink>}
      {may('copy') && <ProposeChangeButton recipe={recipe} basedOnId={id} kind="plain" label="Propose a change from it" />}
      {(may('approve') || may('return')) && (
        <ButtonLink kind="primary" to={paths.signOff(id)}>
          Review and sign
        </ButtonLink>
      )}
      {may('discard') && (
        <Button kind="quiet" color="oxide.fg" onClick={() => setIsDiscarding(true)}>
          Throw away
        </Button>
      )}
      {isDiscarding && (
        <DiscardDialog
          revision={revision}
          onClose={() => setIsDiscarding(false)}
          onDiscarded={() => {
            announce(`The draft of ${recipe.code} is thrown away.`);
            void navigate(paths.recipe(recipe.code));
          }}
        />
      )}
    </>
  );
}
