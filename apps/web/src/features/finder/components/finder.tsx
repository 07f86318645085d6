import { chakra, Flex } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonBlock } from '../../../components/skeletons';
import { formatCount } from '../../../lib/format';
import type { Choice, FinderAnswer, FinderResult } from '../finder.api';
import { useSentence } from '../use-sentence';
import { FinderSentence } from './finder-sentence';
import { FirstSteps } from './first-steps';
import { FoldedOnPhone } from './folded-on-phone';
import { Outcome } from './outcome';
import { WordsField } from './words-field';

export type FinderProps = {
  /** Holds on the answer with what may be done about them; they come before everything else. */
  holds: (answer: FinderAnswer) => ReactNode;
  /** What a lead may do with the setting that is shown. */
  leadActs: (answer: FinderAnswer) => ReactNode;
  /** How long a part takes with the setting that is shown. */
  time: (answer: FinderAnswer) => ReactNode;
  /** Asks for the setting of the sentence. */
  ask: (choice: Choice, result: FinderResult) => ReactNode;
};

/** The sentence and what it leads to. The reading order is the order of safety: job, holds, cautions, setting, mark, set-up, signature, acts. */
export function Finder({ holds, leadActs, time, ask }: FinderProps) {
  const { choice, finder, choose, setWords, show, lookFor, startOver } = useSentence();
  const { data, error, isLoading, mutate } = finder;
  if (data === undefined) {
    const isGone = error?.status === 404;
    return error === undefined || isGone ? (
      <SkeletonBlock height="160px" label="Loading the finder" />
    ) : (
      <ReadProblem problem={error} thing="the finder" onRetry={() => void mutate()} />
    );
  }
  if (data.approvedCount === 0 && data.withdrawn.length === 0) return <FirstSteps result={data} />;
  return (
    <chakra.div display="grid" gap={{ base: '3', sm: '4' }} gridTemplateColumns="minmax(0, 1fr)">
      <FoldedOnPhone result={data} isAnswered={!isLoading && data.answer !== null}>
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
                  {isLoading ? 'Looking' : countWords(data, choice)}
                </chakra.b>
                <StartOver onClick={startOver} />
              </Flex>
            </>
          }
        />
      </FoldedOnPhone>
      {/* The last answer stays in the slots while the next is fetched, but never its setting: it belongs to another sentence. */}
      {isLoading ? (
        <SkeletonBlock height="420px" label="Looking" />
      ) : (
        <Outcome
          result={data}
          choice={choice}
          holds={data.answer === null ? null : holds(data.answer)}
          time={data.answer === null ? null : time(data.answer)}
          ask={ask(choice, data)}
          onShow={show}
          onLookFor={lookFor}
        />
      )}
    </chakra.div>
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

function countWords({ isForbidden, matchCount, answer }: FinderResult, { recipe }: Choice): string {
  if (isForbidden) return 'Must not be marked';
  return matchCount === 0 || (recipe !== undefined && answer === null) ? 'No approved recipe' : formatCount(matchCount, 'approved recipe');
}
