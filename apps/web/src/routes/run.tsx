import { chakra } from '@chakra-ui/react';
import { roleAtLeast } from '@proofplate/recipe-model';
import { useState } from 'react';
import { useParams } from 'react-router';
import { FactList } from '../components/fact-list';
import { FoldedNumbers } from '../components/numbers-panel/folded-numbers';
import { Page, Panel } from '../components/page';
import { ReadProblem } from '../components/read-problem';
import { revisionNumbers } from '../components/setting-numbers';
import { SkeletonBlock } from '../components/skeletons';
import { StateMark } from '../components/state-mark';
import { TextLink } from '../components/text-link';
import { Holds, PlaceHoldButton } from '../features/holds/components/holds';
import { RunTime } from '../features/marking-time/components/run-time';
import { SavedPartPanel } from '../features/part-set-up/components/saved-part';
import { ActProblem } from '../features/runs/components/act-problem';
import { BadResult } from '../features/runs/components/bad-result';
import { FinishRun } from '../features/runs/components/finish-run';
import { FirstPiece } from '../features/runs/components/first-piece';
import { MeasuredPieces } from '../features/runs/components/measured-pieces';
import { RunCautions } from '../features/runs/components/run-cautions';
import { RunCards, RunSetUp } from '../features/runs/components/run-steps';
import { RunStop } from '../features/runs/components/run-stop';
import { kindWord, revisionWords, runMark } from '../features/runs/run-words';
import { type Run, tickRun, useRun } from '../features/runs/runs.api';
import { ProblemError } from '../lib/api';
import { grantWords } from '../lib/deviation-words';
import { formatTime } from '../lib/format';
import { paths } from '../lib/paths';
import { useSession } from '../lib/session';
import { revalidate } from '../lib/swr';

const CRUMBS = [{ label: 'Runs', to: paths.runs }];

export function Component() {
  const { code = '' } = useParams();
  const { data: run, error, mutate } = useRun(code);
  if (run === undefined)
    return (
      <Page title={code} crumbs={[...CRUMBS, { label: code }]}>
        {error === undefined ? (
          <SkeletonBlock height="480px" label="Loading the run" />
        ) : (
          <ReadProblem problem={error} thing="this run" onRetry={() => void mutate()} />
        )}
      </Page>
    );
  const handleChange = (next: Run) => {
    void mutate(next, { revalidate: false });
    void revalidate('/api/runs?');
  };
  return <RunPage run={run} onChange={handleChange} />;
}

type RunPageProps = { run: Run; onChange: (run: Run) => void };

/** Under way the reading order is the order of safety: what stops it, cautions, setting, set-up, first piece, counts. After it the outcome leads. */
function RunPage({ run, onChange }: RunPageProps) {
  const { member } = useSession();
  const { mark, word } = runMark(run);
  const subjects = { recipe: run.recipe, machine: run.machine };
  const isOpen = run.state === 'started';
  const mayLead = roleAtLeast(member.role, 'lead');
  return (
    <Page
      title={run.code}
      name={run.jobReference === '' ? kindWord(run.kind) : `job ${run.jobReference}`}
      crumbs={[...CRUMBS, { label: run.code }]}
      meta={
        <>
          <StateMark state={mark}>{word}</StateMark>
          <span>{revisionWords(run)}</span>
          <span>{run.machine.name}</span>
          <span>
            {run.material.name}, {run.finish.name}
          </span>
        </>
      }
      actions={mayLead && isOpen && run.holds.length === 0 && <PlaceHoldButton subjects={subjects} />}
    >
      <chakra.div display="grid" gap="4" gridTemplateColumns="minmax(0, 1fr)">
        <RunStop run={run} />
        <Holds holds={run.holds} subjects={subjects} mayRelease={mayLead} />
        {isOpen && <RunCautions cautions={run.cautions} />}
        <chakra.div
          display="grid"
          gap={{ base: '4', lg: '6' }}
          gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: 'repeat(2, minmax(0, 1fr))' }}
          alignItems="start"
        >
          {isOpen && run.stop === null && <Steps key="steps" run={run} onChange={onChange} />}
          <chakra.div key="acts" display="grid" gap="4" gridTemplateColumns="minmax(0, 1fr)">
            {run.kind === 'production' && <FirstPiece run={run} onChange={onChange} />}
            {run.allowedActions.includes('finish') ? <FinishRun run={run} onChange={onChange} /> : <Counts run={run} />}
            {run.allowedActions.includes('bad-result') && <BadResult run={run} onChange={onChange} />}
            <RunFacts run={run} />
          </chakra.div>
          {run.stop !== null && <StoppedSteps run={run} />}
          {!isOpen && <Steps key="steps" run={run} onChange={onChange} />}
        </chakra.div>
        <RunTime run={{ id: run.id, code: run.code, revisionId: run.revision.id, isOpen }} />
        <SavedPartPanel run={run} mayChange={run.allowedActions.includes('set-up-part')} />
      </chakra.div>
    </Page>
  );
}

function Steps({ run, onChange }: RunPageProps) {
  const [problem, setProblem] = useState<ProblemError>();
  const ticks = new Set(Object.keys(run.ticks));
  const handleTick = async (key: string, isTicked: boolean) => {
    setProblem(undefined);
    try {
      onChange(await tickRun(run, key, isTicked));
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      setProblem(error);
    }
  };
  const onTick = run.allowedActions.includes('tick') ? (key: string, isTicked: boolean) => void handleTick(key, isTicked) : undefined;
  return (
    <chakra.div display="grid" gap="4" gridTemplateColumns="minmax(0, 1fr)">
      <ActProblem problem={problem} />
      <RunCards shown={run} ticks={ticks} onTick={onTick} />
      <FoldedNumbers summary="Numbers behind this setting" label="Numbers behind this setting" groups={revisionNumbers(run)} />
      <RunSetUp shown={run} ticks={ticks} onTick={onTick} />
    </chakra.div>
  );
}

/** Nobody dials in what was stopped; it can still be looked up. */
function StoppedSteps({ run }: { run: Run }) {
  return (
    <chakra.details>
      <chakra.summary
        display="list-item"
        py="2.5"
        minHeight={{ base: 'glove', lg: '0' }}
        width="fit-content"
        color="brand.fg"
        cursor="pointer"
      >
        What was dialled in
      </chakra.summary>
      <RunCards shown={run} ticks={new Set(Object.keys(run.ticks))} />
    </chakra.details>
  );
}

function Counts({ run }: { run: Run }) {
  return (
    <Panel px="5" py="4" aria-label="Counts">
      <chakra.p fontSize="3xl" lineHeight="title">
        <b>{run.good}</b> good, <b>{run.scrap}</b> scrap
      </chakra.p>
      {run.notes !== '' && <p>{run.notes}</p>}
      <MeasuredPieces measurements={run.measurements} />
    </Panel>
  );
}

function CitedDeviation({ deviation }: { deviation: NonNullable<Run['deviation']> }) {
  const { shop } = useSession();
  return (
    <>
      {deviation.description}
      <chakra.span display="block" fontSize="sm" lineHeight="sm" color="fg.muted">
        {grantWords(deviation, shop.timeZone)}
      </chakra.span>
    </>
  );
}

function RunFacts({ run }: { run: Run }) {
  const { shop, member } = useSession();
  const time = (at: string) => formatTime(at, shop.timeZone);
  const facts = [
    {
      label: 'Recipe',
      value: (
        <TextLink to={member.role === 'trainee' ? paths.machineWith(run.recipe.id) : paths.recipe(run.recipe.code)}>
          {revisionWords(run)}
        </TextLink>
      ),
    },
    { label: 'Kind', value: kindWord(run.kind) },
    { label: 'Lens fitted', value: run.lensFitted?.name ?? 'not said' },
    { label: 'Part', value: run.part === '' ? 'not said' : run.part },
    { label: 'Lot', value: run.lot === '' ? 'not said' : run.lot },
    ...(run.deviation === null ? [] : [{ label: 'Deviation', value: <CitedDeviation deviation={run.deviation} /> }]),
    { label: 'Started', value: `${time(run.startedAt)}, ${run.startedBy.name}` },
    ...(run.finishedAt === null ? [] : [{ label: 'Finished', value: time(run.finishedAt) }]),
    { label: 'Content digest', value: run.contentHash.slice(0, 12) },
  ];
  return (
    <Panel px="5" py="3" aria-label="About the run">
      <FactList facts={facts} />
    </Panel>
  );
}
