import { chakra } from '@chakra-ui/react';
import { type FormEvent, useState } from 'react';
import { Button } from '../../../components/button';
import { TextAreaField } from '../../../components/field';
import { Panel } from '../../../components/page';
import { useStatusLine } from '../../../components/status-line';
import { finishRun, type Run } from '../runs.api';
import { useAct } from '../use-act';
import { ActProblem } from './act-problem';
import { CountField, readCount } from './count-field';
import { PieceMeasurements, type TypedPiece, typedPieces } from './piece-measurements';

const COUNT_MESSAGE = 'Enter a whole number of parts';

/** Good and scrap, measured pieces where the run proves a setting, and the end of the run. */
export function FinishRun({ run, onChange }: { run: Run; onChange: (run: Run) => void }) {
  const announce = useStatusLine();
  const [good, setGood] = useState('0');
  const [scrap, setScrap] = useState('0');
  const [notes, setNotes] = useState('');
  const [pieces, setPieces] = useState<readonly TypedPiece[]>([]);
  const [wasTried, setWasTried] = useState(false);
  const [isEmptyMeant, setIsEmptyMeant] = useState(false);
  const {
    run: act,
    busyWith,
    problem,
  } = useAct<Run>((next) => {
    announce(`${next.code} is finished: ${next.good} good, ${next.scrap} scrap.`);
    onChange(next);
  }, run.version);
  const counts = { good: readCount(good), scrap: readCount(scrap) };
  const measured = typedPieces(pieces);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    setWasTried(true);
    const { good: goodCount, scrap: scrapCount } = counts;
    if (goodCount === undefined || scrapCount === undefined || measured === undefined) return;
    // A finished run never changes again, so a tap too early must not end one without its parts.
    if (goodCount + scrapCount === 0 && !isEmptyMeant) {
      setIsEmptyMeant(true);
      return;
    }
    void act('finish', (key) => finishRun(run, { good: goodCount, scrap: scrapCount, notes, measurements: measured }, key));
  };
  // Until the first piece is released, releasing it is the act of the page.
  const isNext = run.kind !== 'production' || run.firstPiece?.ok === true;
  const errorOf = (count: number | undefined) => (wasTried && count === undefined ? COUNT_MESSAGE : undefined);
  return (
    <Panel px="5" py="4" aria-labelledby="finish-title">
      <chakra.form noValidate onSubmit={submit} display="grid" gap="4">
        <h2 id="finish-title">Count and finish</h2>
        <chakra.div display="grid" gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: 'repeat(2, minmax(0, 1fr))' }} gap="4">
          <CountField label="Good" value={good} error={errorOf(counts.good)} onChange={setGood} />
          <CountField label="Scrap" value={scrap} error={errorOf(counts.scrap)} onChange={setScrap} />
        </chakra.div>
        {run.kind === 'confirmation' && <PieceMeasurements pieces={pieces} wasTried={wasTried} onChange={setPieces} />}
        <TextAreaField
          name="run-notes"
          label="Notes"
          isOptional
          rows={2}
          value={notes}
          onChange={(event) => setNotes(event.currentTarget.value)}
        />
        <ActProblem problem={problem} />
        {isEmptyMeant && counts.good === 0 && counts.scrap === 0 && (
          <chakra.p role="alert" fontWeight="semibold" color="straw.fg">
            No part is counted yet. Count first, or finish once more to end the run without parts.
          </chakra.p>
        )}
        <Button type="submit" kind={isNext ? 'primary' : 'plain'} size="primaryAct" isBusy={busyWith === 'finish'}>
          Finish {run.code}
        </Button>
      </chakra.form>
    </Panel>
  );
}
