import { chakra } from '@chakra-ui/react';
import { roleAtLeast } from '@proofplate/recipe-model';
import { useParams } from 'react-router';
import { Button, ButtonLink } from '../components/button';
import { Page } from '../components/page';
import { ReadProblem } from '../components/read-problem';
import { SkeletonBlock } from '../components/skeletons';
import { useArchiving } from '../components/use-archiving';
import { Holds, PlaceHoldButton } from '../features/holds/components/holds';
import { useOpenHolds } from '../features/holds/holds.api';
import { useLenses } from '../features/lenses/lenses.api';
import { Calibrations } from '../features/machines/components/calibrations';
import { MachineFacts } from '../features/machines/components/machine-facts';
import { MachineLenses } from '../features/machines/components/machine-lenses';
import { PanelPreview } from '../features/machines/components/panel-preview';
import { ProfileHistory } from '../features/machines/components/profile-history';
import { type Machine, setMachineArchived, useMachine } from '../features/machines/machines.api';
import { MachineTime } from '../features/marking-time/components/machine-time';
import { PowerShifts } from '../features/recipes/power/power-shifts';
import { paths } from '../lib/paths';
import { useSession } from '../lib/session';

export function Component() {
  const { machineId = '' } = useParams();
  const { data: machine, error, mutate } = useMachine(machineId);
  const name = machine?.name ?? 'Machine';
  return (
    <Page
      title={name}
      crumbs={[{ label: 'Equipment', to: paths.equipment }, { label: name }]}
      meta={machine !== undefined && <Meta machine={machine} />}
      actions={machine !== undefined && <Acts machine={machine} />}
    >
      {machine === undefined && error === undefined && <SkeletonBlock height="480px" label="Loading the machine" />}
      {machine === undefined && error !== undefined && <ReadProblem problem={error} thing="this machine" onRetry={() => void mutate()} />}
      {machine !== undefined && <MachineHolds machine={machine} />}
      {machine !== undefined && <Sections machine={machine} />}
    </Page>
  );
}

function Meta({ machine: { profile, archivedAt } }: { machine: Machine }) {
  return (
    <>
      <span>Profile version {profile.number}</span>
      {archivedAt !== null && <b>Archived: it is no choice for new work</b>}
    </>
  );
}

/** Open holds on this very machine; undefined until they were read. */
function useHoldsOn(machineId: string) {
  return useOpenHolds().data?.items.filter(({ subject, subjectId }) => subject === 'machine' && subjectId === machineId);
}

function MachineHolds({ machine }: { machine: Machine }) {
  const { member } = useSession();
  const holds = useHoldsOn(machine.id) ?? [];
  if (holds.length === 0) return null;
  return (
    <chakra.div mb="4">
      <Holds holds={holds} subjects={{ machine }} mayRelease={roleAtLeast(member.role, 'lead')} />
    </chakra.div>
  );
}

function Acts({ machine }: { machine: Machine }) {
  const archive = useArchiving(setMachineArchived);
  const { member } = useSession();
  const mayHold = useHoldsOn(machine.id)?.length === 0 && machine.archivedAt === null && roleAtLeast(member.role, 'lead');
  return (
    <>
      {machine.allowedActions.includes('archive') && (
        <Button kind="quiet" onClick={() => void archive(machine, true)}>
          Archive
        </Button>
      )}
      {machine.allowedActions.includes('restore') && <Button onClick={() => void archive(machine, false)}>Restore</Button>}
      {mayHold && <PlaceHoldButton subjects={{ machine }} size="control" />}
      {machine.allowedActions.includes('edit') && (
        <ButtonLink kind="primary" to={paths.editMachine(machine.id)}>
          Change
        </ButtonLink>
      )}
    </>
  );
}

function Sections({ machine }: { machine: Machine }) {
  const { data: lenses } = useLenses();
  return (
    <chakra.div
      display="grid"
      gap="6"
      gridTemplateColumns={{ base: 'minmax(0, 1fr)', xl: 'minmax(0, 1fr) minmax(0, 440px)' }}
      alignItems="start"
    >
      <chakra.div display="grid" gap="6" gridTemplateColumns="minmax(0, 1fr)">
        <MachineLenses machine={machine} lenses={lenses?.items ?? []} />
        <Calibrations machine={machine} />
        <PowerShifts machine={machine} />
        <MachineTime machine={machine} />
      </chakra.div>
      <chakra.div display="grid" gap="4" gridTemplateColumns="minmax(0, 1fr)">
        <chakra.section aria-labelledby="panel-title">
          <chakra.h2 id="panel-title" srOnly>
            What the panel shows
          </chakra.h2>
          <PanelPreview panel={machine.profile.panel} />
        </chakra.section>
        <MachineFacts machine={machine} />
        <ProfileHistory machineId={machine.id} />
      </chakra.div>
    </chakra.div>
  );
}
