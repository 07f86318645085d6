import { chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import type { UseFormReturn } from 'react-hook-form';
import { Button } from '../../../components/button';
import { NumberField, SelectField, TextField } from '../../../components/field';
import { Form } from '../../../components/form';
import { messageOf, readOptionalNumber } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';
import type { LensChoice, MachineBody } from '../machines.api';
import { machineBody } from './machine-body';
import { MACHINE_LABELS } from './machine-labels';
import { WARM_UP_RULE } from './machine-rules';
import type { MachineValues } from './machine-values';
import { PanelFields } from './panel-fields';
import { SourceFields } from './source-fields';

export type MachineFormProps = {
  form: UseFormReturn<MachineValues>;
  lenses: readonly LensChoice[];
  submitLabel: string;
  onSubmit: (body: MachineBody, submit: { idempotencyKey: string }) => Promise<unknown>;
};

/** One machine: its name, what its source is, and what its panel shows. */
export function MachineForm({ form, lenses, submitLabel, onSubmit }: MachineFormProps) {
  const { locale } = useSession().shop;
  const { errors, isSubmitting } = form.formState;
  return (
    <Form form={form} labels={MACHINE_LABELS} onSubmit={(values, submit) => onSubmit(machineBody(values, locale), submit)}>
      <TextField
        label="Name"
        help="As people on the floor call it."
        autoComplete="off"
        error={errors.name?.message}
        {...form.register('name', { validate: (text) => text.trim() !== '' || 'Give the machine the name that people on the floor use.' })}
      />
      <TextField
        label="Serial number"
        isOptional
        autoComplete="off"
        error={errors.serialNumber?.message}
        {...form.register('serialNumber')}
      />
      <NumberField
        label="Warm-up before marking"
        unit="min"
        isOptional
        error={errors.warmUpMinutes?.message}
        {...form.register('warmUpMinutes', { validate: (text) => messageOf(readOptionalNumber(text, WARM_UP_RULE, locale)) })}
      />
      <SelectField
        label="Lens that is mounted now"
        options={lenses.map(({ id, name }) => ({ value: id, label: name }))}
        placeholder="none, or not known"
        help="Choosing it puts it on the machine; its working distance and spot are entered on the machine’s page."
        error={errors.mountedLensId?.message}
        {...form.register('mountedLensId')}
      />
      <Part title="What the source is" note="It counts for evidence: a change here means that settings have to be proved again.">
        <SourceFields form={form} />
      </Part>
      <Part
        title="What the panel shows"
        note="Order, labels and units as the machine’s own control has them. Changing it leaves every proof as it stands."
      >
        <PanelFields form={form} />
      </Part>
      <Button type="submit" kind="primary" size="touch" isBusy={isSubmitting}>
        {submitLabel}
      </Button>
    </Form>
  );
}

function Part({ title, note, children }: { title: string; note: string; children: ReactNode }) {
  return (
    <chakra.section borderTop="hairline" pt="5" mt="2" display="grid" gap="4">
      <div>
        <chakra.h2>{title}</chakra.h2>
        <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
          {note}
        </chakra.p>
      </div>
      {children}
    </chakra.section>
  );
}
