import { chakra } from '@chakra-ui/react';
import { PANEL_UNITS } from '@proofplate/physics';
import { ASSIST_LABELS, FILL_LABELS, type Panel, STEP_PURPOSE_LABELS } from '@proofplate/recipe-model';
import { type UseFormReturn, useWatch } from 'react-hook-form';
import { NumberField, SelectField } from '../../../components/field';
import { messageAt } from '../../../components/form';
import { Panel as Card } from '../../../components/page';
import { useSession } from '../../../lib/session';
import { fieldHelp, optionsOf } from '../draft/panel-field-words';
import { readSteps } from '../draft/read-draft';
import { type NumbersMachine, TypedNumbers } from '../draft/typed-numbers';
import type { StartValues } from './start-values';

/** The first mark step, typed in the panel's units and order. */
export function StartStepFields({ form, panel, on }: { form: UseFormReturn<StartValues>; panel: Panel; on: NumbersMachine | undefined }) {
  const { locale } = useSession().shop;
  return (
    <Card px="5" py="4" aria-labelledby="start-step">
      <chakra.h2 id="start-step" mb="3">
        First mark step
      </chakra.h2>
      <chakra.div display="grid" gap="4" gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: 'repeat(2, minmax(0, 1fr))' }}>
        <SelectField label="Purpose" options={optionsOf(STEP_PURPOSE_LABELS)} {...form.register('steps.0.purpose')} />
        {panel.fields.map((field) => {
          const name = `steps.0.values.${field.parameter}` as const;
          const validate = (_: unknown, { steps }: StartValues) => readSteps(steps, panel.fields, locale).messages[name] ?? true;
          return (
            <NumberField
              key={field.parameter}
              label={field.label}
              unit={PANEL_UNITS[field.unit].symbol}
              help={fieldHelp(field)}
              error={messageAt(form.formState.errors, name)}
              {...form.register(name, { validate })}
            />
          );
        })}
        <SelectField label="Fill" options={optionsOf(FILL_LABELS)} {...form.register('steps.0.fill')} />
        <SelectField label="Assist" options={optionsOf(ASSIST_LABELS)} {...form.register('steps.0.assist')} />
      </chakra.div>
      <chakra.h3 mt="4">What follows from it</chakra.h3>
      {on === undefined ? (
        <chakra.p color="fg.muted">Choose the lens first: the spot depends on it.</chakra.p>
      ) : (
        <StartNumbers form={form} on={on} />
      )}
    </Card>
  );
}

function StartNumbers({ form, on }: { form: UseFormReturn<StartValues>; on: NumbersMachine }) {
  const steps = useWatch({ control: form.control, name: 'steps' });
  return <TypedNumbers {...on} steps={steps} label="What follows from the first step" shows="steps" />;
}
