import { chakra, Flex } from '@chakra-ui/react';
import { PANEL_UNITS } from '@proofplate/physics';
import { ASSIST_LABELS, FILL_LABELS, STEP_PURPOSE_LABELS } from '@proofplate/recipe-model';
import { useMemo } from 'react';
import { type UseFormReturn, useFieldArray, useWatch } from 'react-hook-form';
import { Button } from '../../../components/button';
import { NumberField, SelectField } from '../../../components/field';
import { PlusIcon } from '../../../components/icons';
import { Panel } from '../../../components/page';
import { DELAYS, stepTitle } from '../../../components/setting-rows';
import { measuredCalibration } from '../../../lib/measured-calibration';
import { type Revision, useCalibrations } from '../recipes.api';
import { type DraftValues, emptyStep } from './draft-values';
import { MoveButtons } from './move-buttons';
import { fieldHelp, optionsOf } from './panel-field-words';
import type { FieldMessages } from './read-draft';
import { type NumbersMachine, TypedNumbers } from './typed-numbers';

const MOST_STEPS = 20;

type Editing = { form: UseFormReturn<DraftValues>; messages: FieldMessages; revision: Revision };

/** Mark steps 1 … n, typed in the panel's units and order; what follows from each stands beside it. */
export function StepFields(editing: Editing) {
  const { form, revision } = editing;
  const { fields, append, remove, swap } = useFieldArray({ control: form.control, name: 'steps' });
  const on = useNumbersMachine(form, revision);
  return (
    <chakra.section aria-label="Mark steps" display="grid" gap="4">
      {fields.map((field, index) => (
        <OneStep
          key={field.id}
          {...editing}
          index={index}
          count={fields.length}
          on={on}
          onRemove={() => remove(index)}
          onMove={(by) => swap(index, index + by)}
        />
      ))}
      {fields.length > 1 && (
        <Panel px="5" py="4" aria-label="All steps together">
          <h2>All steps together</h2>
          <LiveNumbers form={form} on={on} label="What follows from all steps" />
        </Panel>
      )}
      <div>
        <Button icon={<PlusIcon />} disabled={fields.length >= MOST_STEPS} onClick={() => append(emptyStep(revision.profile.panel.fields))}>
          Add a mark step
        </Button>
      </div>
    </chakra.section>
  );
}

type OneStepProps = Editing & { index: number; count: number; on: NumbersMachine; onRemove: () => void; onMove: (by: -1 | 1) => void };

function OneStep({ form, messages, revision, index, count, on, onRemove, onMove }: OneStepProps) {
  const stored = revision.steps[index];
  const name = `steps.${index}` as const;
  const title = stored === undefined ? `Step ${index + 1}` : stepTitle(stored, index, count);
  return (
    <Panel px="5" py="4" aria-label={title}>
      <Flex justify="space-between" align="center" gap="3" wrap="wrap" mb="3">
        <h2>{title}</h2>
        {count > 1 && (
          <Flex gap="1">
            <MoveButtons what={`step ${index + 1}`} isFirst={index === 0} isLast={index === count - 1} onMove={onMove} />
            <Button kind="quiet" onClick={onRemove} aria-label={`Take out step ${index + 1}`}>
              Take out
            </Button>
          </Flex>
        )}
      </Flex>
      <chakra.div display="grid" gap="5" gridTemplateColumns={{ base: 'minmax(0, 1fr)', xl: 'minmax(0, 1fr) 300px' }}>
        <chakra.div
          display="grid"
          gap="4"
          gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: 'repeat(2, minmax(0, 1fr))' }}
          alignContent="start"
        >
          <SelectField label="Purpose" options={optionsOf(STEP_PURPOSE_LABELS)} {...form.register(`${name}.purpose`)} />
          {revision.profile.panel.fields.map((field) => (
            <NumberField
              key={field.parameter}
              label={field.label}
              unit={PANEL_UNITS[field.unit].symbol}
              help={fieldHelp(field)}
              error={messages[`${name}.values.${field.parameter}`]}
              {...form.register(`${name}.values.${field.parameter}`)}
            />
          ))}
          <SelectField label="Fill" options={optionsOf(FILL_LABELS)} {...form.register(`${name}.fill`)} />
          <SelectField label="Assist" options={optionsOf(ASSIST_LABELS)} {...form.register(`${name}.assist`)} />
          <NumberField
            label="Pause after it"
            unit="s"
            isOptional
            error={messages[`${name}.pauseAfterS`]}
            {...form.register(`${name}.pauseAfterS`)}
          />
          <Delays form={form} messages={messages} name={name} />
        </chakra.div>
        <div>
          <h3>What follows from it</h3>
          <LiveNumbers form={form} on={on} index={index} label={`What follows from step ${index + 1}`} />
        </div>
      </chakra.div>
    </Panel>
  );
}

type LiveNumbersProps = { form: UseFormReturn<DraftValues>; on: NumbersMachine; label: string; index?: number };

/** Watches what is typed by itself, so that a key renders these numbers and not the fields. */
function LiveNumbers({ form, on, label, index }: LiveNumbersProps) {
  const steps = useWatch({ control: form.control, name: 'steps' });
  const step = index === undefined ? undefined : steps[index];
  if (index !== undefined && step === undefined) return null;
  return <TypedNumbers {...on} steps={step === undefined ? steps : [step]} label={label} shows={step === undefined ? 'totals' : 'steps'} />;
}

/** Machine, lens and calibration that the draft is worked out with. */
function useNumbersMachine(form: UseFormReturn<DraftValues>, revision: Revision): NumbersMachine {
  const { profile, optics, doseCaution, recipe } = revision;
  const calibrationId = useWatch({ control: form.control, name: 'calibrationId' });
  const cited = useCalibrations(recipe.machine.id).data?.items.find(({ id }) => id === calibrationId);
  return useMemo(() => {
    const { physical, panel } = profile;
    const machine = { physical, panel, ...(cited === undefined ? {} : { calibration: measuredCalibration(cited) }) };
    return { machine, ground: { optics: { physical, ...optics }, panel, doseCaution } };
  }, [profile, optics, doseCaution, cited]);
}

function Delays({ form, messages, name }: Pick<Editing, 'form' | 'messages'> & { name: `steps.${number}` }) {
  return (
    <chakra.details gridColumn={{ sm: '1 / -1' }}>
      <chakra.summary py="2" color="brand.fg" cursor="pointer">
        Delays of the scan head
      </chakra.summary>
      <chakra.div display="grid" gap="4" mt="2" gridTemplateColumns="repeat(2, minmax(0, 1fr))">
        {DELAYS.map(({ key, label }) => (
          <NumberField
            key={key}
            label={label}
            unit="µs"
            isOptional
            error={messages[`${name}.delaysUs.${key}`]}
            {...form.register(`${name}.delaysUs.${key}`)}
          />
        ))}
      </chakra.div>
    </chakra.details>
  );
}
