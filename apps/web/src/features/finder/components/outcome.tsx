import { chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import type { Choice, FinderRecipe, FinderResult } from '../finder.api';
import { isPartNamed } from '../sentence';
import { Answer } from './answer';
import { Cautions } from './cautions';
import { ChooseRecipe } from './choose-recipe';
import { NearMisses } from './near-misses';
import { AnswerNotices, Forbidden, Withdrawn } from './notices';

export type OutcomeProps = {
  result: FinderResult;
  choice: Choice;
  holds: ReactNode;
  time: ReactNode;
  ask: ReactNode;
  onShow: (recipe: FinderRecipe) => void;
  /** Looks for another setting for what this recipe was for. */
  onLookFor: (recipe: FinderRecipe) => void;
};

/** What the sentence leads to: a stop, the one approved setting, a choice of several, or what comes nearest. */
export function Outcome({ result, choice, holds, time, ask, onShow, onLookFor }: OutcomeProps) {
  const { answer, cautions, isForbidden, matches, matchCount, withdrawn } = result;
  if (isForbidden) return <Forbidden cautions={cautions} />;
  if (answer !== null)
    return (
      <>
        {holds}
        <AnswerNotices answer={answer} />
        <Cautions cautions={cautions} answer={answer} />
        <Answer key={answer.revisionId} answer={answer} time={time} />
      </>
    );
  if (choice.recipe !== undefined) return withdrawn.length > 0 ? <Withdrawn recipes={withdrawn} onLookFor={onLookFor} /> : <NotApproved />;
  return (
    <>
      <Withdrawn recipes={withdrawn} />
      {!isPartNamed(choice) ? (
        <Begin result={result} />
      ) : matchCount > 0 ? (
        <ChooseRecipe recipes={matches} count={matchCount} onShow={onShow} />
      ) : (
        <None result={result} choice={choice} ask={ask} onShow={onShow} />
      )}
    </>
  );
}

function None({ result: { nearMisses }, choice, ask, onShow }: Pick<OutcomeProps, 'result' | 'choice' | 'ask' | 'onShow'>) {
  const isByWords = choice.material === undefined;
  const noneNear = `Nothing approved comes near it.${isByWords ? ' Take a word away, or choose the material in the sentence.' : ''}`;
  return (
    <>
      <div>
        <chakra.h2 fontSize="3xl" lineHeight="title" overflowWrap="anywhere">
          {isByWords ? `No approved recipe has all of “${choice.words}”` : 'No approved recipe for this yet'}
        </chakra.h2>
        <chakra.p color="fg.muted">
          Do not try a setting on a customer’s part.{' '}
          {nearMisses.length > 0 ? 'These approved recipes come nearest; what differs is named.' : noneNear}
        </chakra.p>
      </div>
      <div>
        <NearMisses misses={nearMisses} onShow={onShow} />
      </div>
      {ask}
    </>
  );
}

function Begin({ result: { matchCount, approvedCount } }: { result: FinderResult }) {
  return (
    <chakra.p color="fg.muted" fontSize="lg">
      {beginWords(matchCount, approvedCount)}
    </chakra.p>
  );
}

function beginWords(matchCount: number, approvedCount: number): string {
  if (approvedCount === 0) return 'No recipe is approved now. As soon as a lead has signed one, it is found here.';
  if (matchCount === 0)
    return 'No recipe is approved for what is chosen so far. Choose another machine or lens, or the material to see what comes nearest.';
  return 'Choose the material, type a few letters of it, or scan the code of a set-up sheet. The one approved setting comes up by itself.';
}

/** A link to a recipe that no lead has signed yet. */
function NotApproved() {
  return (
    <section>
      <chakra.h2 fontSize="2xl" lineHeight="title">
        This recipe has no approved setting
      </chakra.h2>
      <chakra.p color="fg.muted">Do not mark with it. Start over, and say what is to be marked.</chakra.p>
    </section>
  );
}
