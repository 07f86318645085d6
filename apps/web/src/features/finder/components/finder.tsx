import { chakra, Flex } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonBlock } from '../../../components/skeletons';
import { formatCount } from '../../../lib/format';
import type { Choice, FinderAnswer, FinderResult } from '../finder.api';
import { isPartNamed } from '../sentence';
import { useSentence } from '../use-sentence';
import { Answer } from './answer';
import { Cautions } from './cautions';
import { ChooseRecipe } from './choose-recipe';
import { FinderSentence } from './finder-sentence';
import { NearMisses } from './near-misses';
import { AnswerNotices, Forbidden, Withdrawn } from './notices';
import { WordsField } from './words-field';

export type FinderProps = {
  /** Holds on the answer with what may be done about them; they come before everything else. */
  holds: (answer: FinderAnswer) => ReactNode;
  /** What a lead may do with the setting that is shown. */
  leadActs: (answer: FinderAnswer) => ReactNode;
  /** How long a part takes with the setting that is shown. */
  time: (answer: FinderAnswer) => ReactNode;
  /** Asks for the setting of the sentence. */
  ask: (choice: Choice) => ReactNode;
};

/** The sentence and what it leads to. The reading order is the order of safety: job, holds, cautions, setting, mark, set-up, signature, acts. */
export function Finder({ holds, leadActs, time, ask }: FinderProps) {
  const { choice, finder, choose, setWords, show, startOver } = useSentence();
  const { data, error, isLoading, mutate } = finder;
  if (data === undefined) {
    const isGone = error?.status === 404;
    return error === undefined || isGone ? (
      <SkeletonBlock height="160px" label="Loading the finder" />
    ) : (
      <ReadProblem problem={error} thing="the finder" onRetry={() => void mutate()} />
    );
  }
  return (
    <chakra.div display="grid" gap={{ base: '3', sm: '4' }} gridTemplateColumns="minmax(0, 1fr)">
      <FinderSentence
        result={data}
        choice={choice}
        onChoose={choose}
        trailing={
          <>
            <WordsField words={choice.words ?? ''} onWords={setWords} />
            <Flex align="center" gap={{ base: '3', sm: '4' }} wrap="wrap" justify="flex-end" ml="auto">
              {!isLoading && data.answer !== null && leadActs(data.answer)}
              <chakra.b role="status" whiteSpace="nowrap">
                {isLoading ? 'Looking' : countWords(data)}
              </chakra.b>
              <StartOver onClick={startOver} />
            </Flex>
          </>
        }
      />
      {/* The last answer stays in the slots while the next is fetched, but never its setting: it belongs to another sentence. */}
      {isLoading ? (
        <SkeletonBlock height="420px" label="Looking" />
      ) : (
        <Outcome
          result={data}
          choice={choice}
          holds={data.answer === null ? null : holds(data.answer)}
          time={data.answer === null ? null : time(data.answer)}
          ask={ask(choice)}
          onShow={show}
        />
      )}
    </chakra.div>
  );
}

type OutcomeProps = {
  result: FinderResult;
  choice: Choice;
  holds: ReactNode;
  time: ReactNode;
  ask: ReactNode;
  onShow: ReturnType<typeof useSentence>['show'];
};

function Outcome({ result, choice, holds, time, ask, onShow }: OutcomeProps) {
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
  if (!isPartNamed(choice)) return <Begin count={matchCount} />;
  return (
    <>
      <Withdrawn recipes={withdrawn} />
      {matchCount > 0 ? (
        <ChooseRecipe recipes={matches} count={matchCount} onShow={onShow} />
      ) : (
        <None result={result} choice={choice} ask={ask} onShow={onShow} />
      )}
    </>
  );
}

function None({ result: { nearMisses }, choice, ask, onShow }: Pick<OutcomeProps, 'result' | 'choice' | 'ask' | 'onShow'>) {
  if (choice.material === undefined)
    return (
      <section>
        <chakra.h2 fontSize="2xl" lineHeight="title">
          Nothing approved is called “{choice.words}”
        </chakra.h2>
        <chakra.p color="fg.muted">Take a word away, or choose the material in the sentence.</chakra.p>
      </section>
    );
  return (
    <>
      <div>
        <chakra.h2 fontSize="3xl" lineHeight="title">
          No approved recipe for this yet
        </chakra.h2>
        <chakra.p color="fg.muted">
          Do not try a setting on a customer’s part.{' '}
          {nearMisses.length > 0 ? 'These approved recipes come nearest; what differs is named.' : 'Nothing approved comes near it.'}
        </chakra.p>
      </div>
      <div>
        <NearMisses misses={nearMisses} onShow={onShow} />
      </div>
      {ask}
    </>
  );
}

function Begin({ count }: { count: number }) {
  return (
    <chakra.p color="fg.muted" fontSize="lg">
      {count === 0
        ? 'No recipe is approved yet. As soon as a lead has signed one, it is found here.'
        : 'Choose the material, type a few letters of it, or scan the code of a set-up sheet. The one approved setting comes up by itself.'}
    </chakra.p>
  );
}

function StartOver({ onClick }: { onClick: () => void }) {
  return (
    <chakra.button
      type="button"
      onClick={onClick}
      minHeight={{ base: 'glove', lg: 'control' }}
      px="1"
      whiteSpace="nowrap"
      color="brand.fg"
      textDecoration="underline"
      textUnderlineOffset="3px"
      cursor="pointer"
      borderRadius="sm"
    >
      Start over
    </chakra.button>
  );
}

function countWords({ isForbidden, matchCount }: FinderResult): string {
  if (isForbidden) return 'Must not be marked';
  return matchCount === 0 ? 'No approved recipe' : formatCount(matchCount, 'approved recipe');
}
