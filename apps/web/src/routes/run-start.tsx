import { chakra } from '@chakra-ui/react';
import { roleAtLeast } from '@proofplate/recipe-model';
import { useNavigate, useSearchParams } from 'react-router';
import { ButtonLink } from '../components/button';
import { Page } from '../components/page';
import { ReadProblem } from '../components/read-problem';
import { SkeletonBlock } from '../components/skeletons';
import { StartDeviations } from '../features/deviations/components/deviations-panel';
import { Holds } from '../features/holds/components/holds';
import { RunCautions } from '../features/runs/components/run-cautions';
import { RunSetUp } from '../features/runs/components/run-steps';
import { StartForm } from '../features/runs/forms/start-form';
import { type RunKind, type StartSheet, useStartSheet } from '../features/runs/runs.api';
import { useKeptTicks } from '../lib/kept-ticks';
import { paths } from '../lib/paths';
import { useSession } from '../lib/session';

const CRUMBS = [{ label: 'At the machine', to: paths.machine }, { label: 'Start a run' }];

export function Component() {
  const [params] = useSearchParams();
  const revisionId = params.get('revision') ?? '';
  const { data, error, mutate } = useStartSheet(revisionId);
  if (data === undefined)
    return (
      <Page title="Start a run" crumbs={CRUMBS}>
        {error === undefined ? (
          <SkeletonBlock height="480px" label="Loading the set-up" />
        ) : (
          <ReadProblem problem={error} thing="this setting" onRetry={() => void mutate()} />
        )}
      </Page>
    );
  return <Start sheet={data} wantedKind={params.get('kind')} />;
}

function Start({ sheet, wantedKind }: { sheet: StartSheet; wantedKind: string | null }) {
  const navigate = useNavigate();
  const { member } = useSession();
  const mayLead = roleAtLeast(member.role, 'lead');
  const { recipe, revision, machine, material, finish, effect } = sheet;
  const { ticks, setTick, forget } = useKeptTicks(revision.id);
  const kind = sheet.kinds.find((one) => one === wantedKind) ?? sheet.kinds[0];
  const subjects = { recipe, machine };
  return (
    <Page
      title="Start a run"
      name={`${recipe.code} ${revision.number === null ? 'draft' : `revision ${revision.number}`}`}
      crumbs={CRUMBS}
      meta={
        <span>
          {machine.name}: {material.name}, {finish.name}, {effect.name}
        </span>
      }
    >
      <chakra.div
        display="grid"
        gap="4"
        gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: 'repeat(2, minmax(0, 1fr))' }}
        alignItems="start"
      >
        {sheet.holds.length > 0 && (
          <chakra.div gridColumn="1 / -1">
            <Holds holds={sheet.holds} subjects={subjects} mayRelease={mayLead} />
          </chakra.div>
        )}
        {kind !== undefined && sheet.cautions.length > 0 && (
          <chakra.div gridColumn="1 / -1">
            <RunCautions cautions={sheet.cautions} />
          </chakra.div>
        )}
        <chakra.div display="grid" gap="4">
          <chakra.div display="grid" gap="4">
            <RunSetUp shown={sheet} ticks={ticks} onTick={setTick} />
            <ButtonLink to={paths.partOfRevision(revision.id)} size="glove">
              Set up a round part
            </ButtonLink>
          </chakra.div>
          {revision.state === 'approved' && (
            <StartDeviations
              from={{ revisionId: revision.id, name: `${recipe.code} revision ${revision.number}` }}
              mayGrant={mayLead}
              deviations={sheet.deviations}
            />
          )}
        </chakra.div>
        {kind === undefined ? (
          <p>This revision is {revision.state.replace('_', ' ')}: no run can be started with it.</p>
        ) : (
          <StartForm
            sheet={sheet}
            kind={asKind(kind)}
            ticks={ticks}
            onStarted={(run) => {
              forget();
              void navigate(paths.run(run.code), { replace: true });
            }}
          />
        )}
      </chakra.div>
    </Page>
  );
}

/** The server lists the kinds that may start now out of this closed list. */
const asKind = (kind: string) => kind as RunKind;
