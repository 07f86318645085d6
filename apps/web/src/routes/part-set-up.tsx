import { chakra } from '@chakra-ui/react';
import type { EnteredPart, PartOpticsFacts } from '@proofplate/recipe-model';
import { useCallback, useState } from 'react';
import { useNavigate, useSearchParams } from 'react-router';
import { SelectField } from '../components/field';
import { Page } from '../components/page';
import { ReadProblem } from '../components/read-problem';
import { SkeletonBlock } from '../components/skeletons';
import { useStatusLine } from '../components/status-line';
import { TextLink } from '../components/text-link';
import { type Machine, type MachineLens, useMachineLenses, useMachines } from '../features/machines/machines.api';
import { TurningCautions } from '../features/materials/components/turning-cautions';
import { PartForm } from '../features/part-set-up/forms/part-form';
import { keepPart, keptPart } from '../features/part-set-up/kept-part';
import { savePart, useRevisionGround, useRunPart } from '../features/part-set-up/part-set-up.api';
import { emptyPart, type TypedPart, typedFrom } from '../features/part-set-up/typed-part';
import { type Run, useRun, useRuns } from '../features/runs/runs.api';
import type { ProblemError } from '../lib/api';
import { paths } from '../lib/paths';
import { useSession } from '../lib/session';

export function Component() {
  const [params, setParams] = useSearchParams();
  const run = params.get('run') ?? '';
  const revision = params.get('revision') ?? '';
  const choose = useCallback((next: Record<string, string>) => setParams(next, { replace: true }), [setParams]);
  return (
    <Page title="Part set-up" name={run === '' ? 'round parts' : `of ${run}`}>
      <chakra.div display="grid" gap="5" gridTemplateColumns="minmax(0, 1fr)">
        <TurningCautions />
        <ForWhat run={run} revision={revision} onChoose={choose} />
        {run !== '' ? (
          <OfRun key={run} code={run} />
        ) : revision !== '' ? (
          <OfRevision key={revision} revisionId={revision} />
        ) : (
          <OfMachine machineId={params.get('machine') ?? ''} lensId={params.get('lens') ?? ''} onChoose={choose} />
        )}
      </chakra.div>
    </Page>
  );
}

type Choose = (next: Record<string, string>) => void;

/** The run that the part belongs to, or none. */
function ForWhat({ run, revision, onChoose }: { run: string; revision: string; onChoose: Choose }) {
  const { pages } = useRuns({ state: 'started' });
  const open = (pages ?? []).flatMap(({ items }) => items);
  const options = open.map(({ code, part, machine }) => ({ value: code, label: [code, part, machine.name].filter(Boolean).join(', ') }));
  const isListed = run === '' || open.some(({ code }) => code === run);
  return (
    <chakra.div maxW="form">
      <SelectField
        name="run"
        label="For the run"
        help={
          revision === ''
            ? 'With a run the machine, its lens and the focus of the setting are known, and the part is kept with it.'
            : undefined
        }
        placeholder={revision === '' ? 'none, only work it out' : 'the one that is started next'}
        options={isListed ? options : [{ value: run, label: run }, ...options]}
        value={run}
        minHeight="touch"
        onChange={(event) => onChoose(event.currentTarget.value === '' ? {} : { run: event.currentTarget.value })}
      />
    </chakra.div>
  );
}

function OfRun({ code }: { code: string }) {
  const { data: run, error, mutate } = useRun(code);
  const { data: known, error: partError, mutate: again } = useRunPart(run?.id ?? '');
  if (run === undefined) return <Waiting error={error} onRetry={() => void mutate()} />;
  if (known === undefined) return <Waiting error={partError} onRetry={() => void again()} />;
  return <RunForm run={run} facts={known.ground} saved={known.setUp?.entered} />;
}

function RunForm({
  run,
  facts,
  saved,
}: {
  run: Run;
  facts: PartOpticsFacts & { machine: Named; lens: Named };
  saved: EnteredPart | undefined;
}) {
  const { shop } = useSession();
  const navigate = useNavigate();
  const announce = useStatusLine();
  const [start] = useState(() =>
    saved === undefined ? (keptPart(run.revision.id) ?? fresh(shop.unitSystem)) : typedFrom(saved, shop.locale),
  );
  const handleTyped = useCallback((typed: TypedPart) => keepPart(run.revision.id, typed), [run.revision.id]);
  const mayChange = run.allowedActions.includes('set-up-part');
  const save = async (part: EnteredPart, { idempotencyKey }: { idempotencyKey: string }) => {
    await savePart(run.id, part, idempotencyKey);
    keepPart(run.revision.id, undefined);
    announce(`The part is kept with ${run.code}.`);
    void navigate(paths.run(run.code));
  };
  return (
    <PartForm
      start={start}
      facts={facts}
      onSave={mayChange ? save : undefined}
      onTyped={handleTyped}
      saveNote={
        <Note>
          {mayChange ? `${facts.machine.name} with ${facts.lens.name}. ` : 'The run is finished: its part stays as it was saved. '}
          <TextLink to={paths.run(run.code)}>Back to {run.code}</TextLink>
        </Note>
      }
    />
  );
}

function OfRevision({ revisionId }: { revisionId: string }) {
  const { shop } = useSession();
  const { data: facts, error, mutate } = useRevisionGround(revisionId);
  const [start] = useState(() => keptPart(revisionId) ?? fresh(shop.unitSystem));
  const handleTyped = useCallback((typed: TypedPart) => keepPart(revisionId, typed), [revisionId]);
  if (facts === undefined) return <Waiting error={error} onRetry={() => void mutate()} />;
  return (
    <PartForm
      start={start}
      facts={facts}
      onTyped={handleTyped}
      saveNote={
        <Note>
          {facts.machine.name} with {facts.lens.name}. What you typed stays in this tab until the run is started, and is saved from the
          run’s page. <TextLink to={paths.startRun(revisionId)}>Start the run</TextLink>
        </Note>
      }
    />
  );
}

function OfMachine({ machineId, lensId, onChoose }: { machineId: string; lensId: string; onChoose: Choose }) {
  const { member } = useSession();
  if (member.role === 'trainee')
    return <p>Choose one of your runs, or come here from “Start a run”: the machine and its lens are known then.</p>;
  return <MachineChoice machineId={machineId} lensId={lensId} onChoose={onChoose} />;
}

function MachineChoice({ machineId, lensId, onChoose }: { machineId: string; lensId: string; onChoose: Choose }) {
  const { data, error, mutate } = useMachines();
  if (data === undefined) return <Waiting error={error} onRetry={() => void mutate()} />;
  const machine = data.items.find(({ id }) => id === machineId);
  return (
    <>
      <chakra.div maxW="form">
        <SelectField
          name="machine"
          label="Machine"
          placeholder="Choose the machine"
          options={data.items.map(({ id, name }) => ({ value: id, label: name }))}
          value={machine?.id ?? ''}
          minHeight="touch"
          onChange={(event) => onChoose({ machine: event.currentTarget.value })}
        />
      </chakra.div>
      {machine !== undefined && <LensChoice key={machine.id} machine={machine} lensId={lensId} onChoose={onChoose} />}
    </>
  );
}

function LensChoice({ machine, lensId, onChoose }: { machine: Machine; lensId: string; onChoose: Choose }) {
  const { data, error, mutate } = useMachineLenses(machine.id);
  const { shop } = useSession();
  const [start] = useState(() => fresh(shop.unitSystem));
  if (data === undefined) return <Waiting error={error} onRetry={() => void mutate()} />;
  const lens = data.items.find((one) => one.lensId === lensId);
  return (
    <>
      <chakra.div maxW="form">
        <SelectField
          name="lens"
          label="Lens"
          placeholder="Choose the lens"
          options={data.items.map((one) => ({ value: one.lensId, label: one.lensName }))}
          value={lens?.lensId ?? ''}
          minHeight="touch"
          onChange={(event) => onChoose({ machine: machine.id, lens: event.currentTarget.value })}
        />
      </chakra.div>
      {lens !== undefined && (
        <PartForm
          key={lens.lensId}
          start={start}
          facts={factsOf(machine, lens)}
          onTyped={ignore}
          saveNote={<Note>In focus, as no setting is chosen. Choose a run above to keep the part with it.</Note>}
        />
      )}
    </>
  );
}

function factsOf({ profile: { physical } }: Machine, { focalLengthMm, fieldSizeMm, measuredSpotUm }: MachineLens): PartOpticsFacts {
  const { wavelengthNm, m2 = null, beamDiameterMm = null } = physical;
  return { wavelengthNm, m2, beamDiameterMm, focalLengthMm, fieldSizeMm, measuredSpotUm, focusOffsetsMm: [] };
}

type Named = { id: string; name: string };

const fresh = (unitSystem: string) => emptyPart(unitSystem === 'inch' ? 'in' : 'mm');
/** Without a setting there is nothing to keep it under. */
const ignore = () => undefined;

function Note({ children }: { children: React.ReactNode }) {
  return (
    <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
      {children}
    </chakra.p>
  );
}

function Waiting({ error, onRetry }: { error: ProblemError | undefined; onRetry: () => void }) {
  if (error === undefined) return <SkeletonBlock height="320px" label="Loading the part set-up" />;
  return <ReadProblem problem={error} thing="what the part is worked out with" onRetry={onRetry} />;
}
