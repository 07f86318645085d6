import { Controller } from 'react-hook-form';
import { Button } from '../../../components/button';
import { ChoiceList } from '../../../components/choice-list';
import { TextField } from '../../../components/field';
import { Form, messageAt, useSummaryForm } from '../../../components/form';
import { changeMaterialGroup, createMaterialGroup, type MaterialGroup, useMaterials } from '../materials.api';

type Values = { name: string; materialIds: string[] };
const LABELS: Readonly<Record<keyof Values, string>> = { name: 'Name', materialIds: 'Materials' };

/** A group; without one, a new group. */
export function GroupForm({ group, onDone }: { group?: MaterialGroup | undefined; onDone: () => void }) {
  const form = useSummaryForm<Values>({
    defaultValues: { name: group?.name ?? '', materialIds: (group?.materials ?? []).map(({ id }) => id) },
  });
  const { data } = useMaterials();
  const { errors, isSubmitting } = form.formState;
  const submit = async ({ name, materialIds }: Values, { idempotencyKey }: { idempotencyKey: string }) => {
    const body = { name: name.trim(), materialIds };
    await (group === undefined ? createMaterialGroup(body, idempotencyKey) : changeMaterialGroup(group, body));
    onDone();
  };
  return (
    <Form form={form} labels={LABELS} onSubmit={submit}>
      <TextField
        label={LABELS.name}
        autoComplete="off"
        error={errors.name?.message}
        {...form.register('name', { validate: (text) => text.trim() !== '' || 'Name the group.' })}
      />
      <Controller
        control={form.control}
        name="materialIds"
        render={({ field }) => (
          <ChoiceList
            name={field.name}
            label={LABELS.materialIds}
            help="Every one by name: an approval covers exactly these."
            error={messageAt(errors, 'materialIds')}
            choices={choicesOf(group, data?.items ?? [])}
            chosen={field.value}
            onChange={field.onChange}
          />
        )}
      />
      <Button type="submit" kind="primary" size="touch" isBusy={isSubmitting}>
        {group === undefined ? 'Add the group' : 'Save the group'}
      </Button>
    </Form>
  );
}

/** Materials in use, and those of the group that are archived by now. */
function choicesOf(group: MaterialGroup | undefined, inUse: readonly { id: string; name: string }[]) {
  const archived = (group?.materials ?? []).filter(({ id }) => inUse.every((material) => material.id !== id));
  return [...inUse, ...archived].map(({ id, name }) => ({ value: id, label: name }));
}
