import type { TransferOutcome } from '@proofplate/recipe-model';
import { type MarkState, StateMark } from '../../../components/state-mark';

const LOOKS: Readonly<Record<TransferOutcome, { state: MarkState; word: string }>> = {
  equivalent: { state: 'passes', word: 'Equivalent by these numbers' },
  'not equivalent': { state: 'caution', word: 'Not equivalent' },
  'not known': { state: 'unknown', word: 'Not known' },
};

/** How a transfer turns out: a word and a shape of its own for each. */
export function OutcomeMark({ outcome }: { outcome: TransferOutcome }) {
  const { state, word } = LOOKS[outcome];
  return <StateMark state={state}>{word}</StateMark>;
}
