import { useNavigate } from 'react-router';
import { useSummaryForm } from '../components/form';
import { Page } from '../components/page';
import { useStatusLine } from '../components/status-line';
import { useLenses } from '../features/lenses/lenses.api';
import { MachineFormWithPreview } from '../features/machines/forms/machine-form-with-preview';
import { type MachineValues, newMachineValues } from '../features/machines/forms/machine-values';
import { createMachine, type MachineBody } from '../features/machines/machines.api';
import { paths } from '../lib/paths';
import { useSession } from '../lib/session';

export function Component() {
  const { locale } = useSession().shop;
  const { data: lenses } = useLenses();
  const form = useSummaryForm<MachineValues>({ defaultValues: newMachineValues(locale) });
  const navigate = useNavigate();
  const announce = useStatusLine();
  const submit = async (body: MachineBody, { idempotencyKey }: { idempotencyKey: string }) => {
    const machine = await createMachine(body, idempotencyKey);
    announce(`${machine.name} is added.`);
    await navigate(paths.machineDetail(machine.id));
  };
  return (
    <Page title="Add a machine" crumbs={[{ label: 'Equipment', to: paths.equipment }, { label: 'Add a machine' }]}>
      <MachineFormWithPreview form={form} lenses={lenses?.items ?? []} submitLabel="Add the machine" onSubmit={submit} />
    </Page>
  );
}
