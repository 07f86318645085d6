import { chakra, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { TextAreaField } from '../../../components/field';
import { CrossIcon, TickIcon } from '../../../components/icons';
import { Panel } from '../../../components/page';
import { StateMark } from '../../../components/state-mark';
import { TextLink } from '../../../components/text-link';
import { formatTime } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import { useSession } from '../../../lib/session';
import { judgeFirstPiece, type Run } from '../runs.api';
import { useAct } from '../use-act';
import { ActProblem } from './act-problem';
import { NextStep } from './next-step';

/** The first piece is compared before the batch goes on. */
export function FirstPiece({ run, onChange }: { run: Run; onChange: (run: Run) => void }) {
  const { shop } = useSession();
  const [note, setNote] = useState('');
  const {
    run: act,
    busyWith,
    problem,
  } = useAct<Run>((next) => {
    setNote('');
    onChange(next);
  }, run.version);
  const { firstPiece } = run;
  const mayJudge = run.allowedActions.includes('first-piece');
  const judge = (ok: boolean) => void act(ok ? 'release' : 'refuse', (key) => judgeFirstPiece(run, { ok, note }, key));
  return (
    <Panel px="5" py="4" aria-labelledby="first-piece-title" display="grid" gap="3">
      <Flex justify="space-between" align="center" wrap="wrap" gap="2">
        <h2 id="first-piece-title">First piece</h2>
        {firstPiece !== null && (
          <StateMark state={firstPiece.ok ? 'passes' : 'fails'}>{firstPiece.ok ? 'Released' : 'Not released'}</StateMark>
        )}
      </Flex>
      {firstPiece !== null && (
        <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
          {firstPiece.byName}, {formatTime(firstPiece.at, shop.timeZone)}
          {firstPiece.note === '' ? '' : `: ${firstPiece.note}`}
        </chakra.p>
      )}
      {firstPiece?.ok === false && mayJudge && (
        <NextStep>
          <b>Stop the batch.</b> Check lens, focus and every value against the card, then mark another piece. If that does not match either,
          tell a lead: a lead can put the setting on hold.
        </NextStep>
      )}
      {firstPiece === null && run.stop !== null && <p>It was not looked at before the setting was stopped.</p>}
      {mayJudge && firstPiece?.ok !== true && (
        <>
          <p>
            Mark one piece and hold it beside <TextLink to={paths.machineWith(run.recipe.id)}>the mark to match</TextLink>. Good parts count
            from here on only.
          </p>
          <TextAreaField
            name="first-piece-note"
            label="Note"
            isOptional
            rows={1}
            value={note}
            onChange={(event) => setNote(event.currentTarget.value)}
          />
          <ActProblem problem={problem} />
          <chakra.div display="grid" gridTemplateColumns={{ base: '1fr', sm: '1fr 1fr' }} gap="3">
            <Button kind="primary" size="primaryAct" icon={<TickIcon />} isBusy={busyWith === 'release'} onClick={() => judge(true)}>
              It matches
            </Button>
            <Button size="primaryAct" icon={<CrossIcon />} isBusy={busyWith === 'refuse'} onClick={() => judge(false)}>
              It does not match
            </Button>
          </chakra.div>
        </>
      )}
    </Panel>
  );
}
