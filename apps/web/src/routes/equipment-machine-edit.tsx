import { useNavigate, useParams } from 'react-router';
import { EmptyState } from '../components/empty-state';
import { useSummaryForm } from '../components/form';
import { Page } from '../components/page';
import { ReadProblem } from '../components/read-problem';
import { SkeletonForm } from '../components/skeletons';
import { useStatusLine } from '../components/status-line';
import { useLenses } from '../features/lenses/lenses.api';
import { MachineFormWithPreview } from '../features/machines/forms/machine-form-with-preview';
import { type MachineValues, machineValues } from '../features/machines/forms/machine-values';
import { changeMachine, type Machine, type MachineBody, useMachine } from '../features/machines/machines.api';
import { paths } from '../lib/paths';
import { useSession } from '../lib/session';

export function Component() {
  const { machineId = '' } = useParams();
  const { data: machine, error, mutate } = useMachine(machineId);
  return (
    <Page
      title={machine === undefined ? 'Change a machine' : `Change ${machine.name}`}
      crumbs={[
        { label: 'Equipment', to: paths.equipment },
        { label: machine?.name ?? 'Machine', to: paths.machineDetail(machineId) },
        { label: 'Change' },
      ]}
    >
      {machine === undefined && error === undefined && <SkeletonForm fields={8} />}
      {machine === undefined && error !== undefined && <ReadProblem problem={error} thing="this machine" onRetry={() => void mutate()} />}
      {machine?.allowedActions.includes('edit') === false && (
        <EmptyState kind="no-right" title="You cannot change this machine">
          {machine.archivedAt === null ? 'A lead or an owner of the shop can.' : 'It is archived. A lead can restore it on its page.'}
        </EmptyState>
      )}
      {machine?.allowedActions.includes('edit') === true && <EditForm key={machine.version} machine={machine} />}
    </Page>
  );
}

function EditForm({ machine }: { machine: Machine }) {
  const { locale } = useSession().shop;
  const { data: lenses } = useLenses();
  const form = useSummaryForm<MachineValues>({ defaultValues: machineValues(machine, locale) });
  const navigate = useNavigate();
  const announce = useStatusLine();
  const submit = async (body: MachineBody) => {
    const changed = await changeMachine(machine, body);
    announce(whatHappened(machine, changed));
    await navigate(paths.machineDetail(machine.id));
  };
  return <MachineFormWithPreview form={form} lenses={lenses?.items ?? []} submitLabel="Save the machine" onSubmit={submit} />;
}

function whatHappened({ profile: before }: Machine, { name, profile }: Machine): string {
  if (profile.number === before.number) return `${name} is saved.`;
  if (profile.physicalNumber === before.physicalNumber) return `${name} is saved: the panel is version ${profile.number} now.`;
  return `${name} is saved as version ${profile.number}. The source changed, so its settings have to be proved again.`;
}
