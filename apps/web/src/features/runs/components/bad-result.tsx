import { chakra } from '@chakra-ui/react';
import { codesOf, OUTCOME_LABELS, type Outcome } from '@proofplate/recipe-model';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { Panel } from '../../../components/page';
import { StateMark } from '../../../components/state-mark';
import { useStatusLine } from '../../../components/status-line';
import { formatTime } from '../../../lib/format';
import { useSession } from '../../../lib/session';
import { type BadOutcome, type Run, tellBadResult } from '../runs.api';
import { useAct } from '../use-act';
import { ActProblem } from './act-problem';
import { NextStep } from './next-step';

const isBad = (outcome: Outcome): outcome is BadOutcome => outcome !== 'good';
const BAD_OUTCOMES = codesOf(OUTCOME_LABELS).filter(isBad);

/** Two taps: that it went wrong, and how. */
export function BadResult({ run, onChange }: { run: Run; onChange: (run: Run) => void }) {
  const { shop } = useSession();
  const announce = useStatusLine();
  const [isOpen, setIsOpen] = useState(false);
  const {
    run: act,
    busyWith,
    problem,
  } = useAct<Run>((next) => {
    setIsOpen(false);
    announce('The bad result is kept with the run, and the leads are told.');
    onChange(next);
  }, run.version);
  const { badResult } = run;
  return (
    <Panel px="5" py="4" aria-labelledby="bad-result-title" display="grid" gap="3">
      <h2 id="bad-result-title">Bad result</h2>
      {badResult !== null && (
        <div>
          <StateMark state="fails">{OUTCOME_LABELS[badResult.outcome]}</StateMark>
          <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
            {badResult.byName}, {formatTime(badResult.at, shop.timeZone)}
            {badResult.note === '' ? '' : `: ${badResult.note}`}
          </chakra.p>
        </div>
      )}
      {badResult !== null && (
        <NextStep>
          {run.state === 'started' && <b>Stop the batch. </b>}
          Keep the pieces apart. The leads were told by letter; a lead decides about the pieces and can put the setting on hold.
        </NextStep>
      )}
      <ActProblem problem={problem} />
      {isOpen ? (
        <chakra.div
          role="group"
          aria-label="What went wrong"
          display="grid"
          gridTemplateColumns={{ base: 'repeat(2, minmax(0, 1fr))', sm: 'repeat(3, minmax(0, 1fr))' }}
          gap="2"
        >
          {BAD_OUTCOMES.map((outcome) => (
            <Button
              key={outcome}
              size="glove"
              minHeight="glove"
              isBusy={busyWith === outcome}
              onClick={() => void act(outcome, (key) => tellBadResult(run, { outcome, note: '' }, key))}
            >
              {OUTCOME_LABELS[outcome]}
            </Button>
          ))}
          <Button kind="quiet" size="glove" minHeight="glove" onClick={() => setIsOpen(false)}>
            Back
          </Button>
        </chakra.div>
      ) : (
        <Button kind="danger" size="glove" onClick={() => setIsOpen(true)}>
          {badResult === null ? 'It went wrong' : 'It went wrong otherwise'}
        </Button>
      )}
    </Panel>
  );
}
