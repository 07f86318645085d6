import { chakra } from '@chakra-ui/react';
import type { Panel } from '@proofplate/recipe-model';
import { useMemo } from 'react';
import type { UseFormReturn } from 'react-hook-form';
import { Button } from '../../../components/button';
import { SelectField, TextAreaField, TextField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { Panel as Card } from '../../../components/page';
import { measuredCalibration } from '../../../lib/measured-calibration';
import { useSession } from '../../../lib/session';
import { readSteps } from '../draft/read-draft';
import type { NumbersMachine } from '../draft/typed-numbers';
import {
  type Named,
  type Revision,
  startRecipe,
  useCalibrations,
  useGroundChoices,
  useLensChoices,
  useMachineChoices,
} from '../recipes.api';
import { StartStepFields } from './start-step-fields';
import { emptyStart, ROUTE_OPTIONS, START_LABELS, type StartValues } from './start-values';

const MOST_TITLE = 160;
const MOST_REASON = 2000;

/** Begins a recipe whose setting was not found on a coupon of the shop; the draft that it gives is edited, proved and signed like any other. */
export function StartRecipe({ onStarted }: { onStarted: (draft: Revision) => void }) {
  const { shop } = useSession();
  const form = useSummaryForm<StartValues>({ defaultValues: emptyStart() });
  const machineId = form.watch('machineId');
  const on = useStartMachine(form);
  const panel = useMachineChoices().data?.items.find(({ id }) => id === machineId)?.profile.panel;
  const handleSubmit = async (values: StartValues, { idempotencyKey }: { idempotencyKey: string }) => {
    const { steps: typed, title, ...rest } = values;
    const { steps } = readSteps(typed, panel?.fields ?? [], shop.locale);
    onStarted(await startRecipe({ ...rest, ...(title.trim() === '' ? {} : { title }), steps }, idempotencyKey));
  };
  return (
    <Form form={form} labels={labelsOf(panel)} onSubmit={handleSubmit}>
      <WhatFor form={form} />
      <WhereFrom form={form} />
      {panel === undefined ? (
        <chakra.p color="fg.muted">Choose the machine first: its panel says what can be typed.</chakra.p>
      ) : (
        <StartStepFields form={form} panel={panel} on={on} />
      )}
      <div>
        <Button type="submit" kind="primary" isBusy={form.formState.isSubmitting}>
          Begin the draft
        </Button>
        <chakra.p mt="2" fontSize="sm" color="fg.muted">
          It stays a draft. Nobody at a machine sees it before a lead has written the grounds and it is signed.
        </chakra.p>
      </div>
    </Form>
  );
}

/** Machine, lens and newest power table, as soon as both are chosen. */
function useStartMachine(form: UseFormReturn<StartValues>): NumbersMachine | undefined {
  const [machineId, lensId] = form.watch(['machineId', 'lensId']);
  const profile = useMachineChoices().data?.items.find(({ id }) => id === machineId)?.profile;
  const lens = useLensChoices(machineId).data?.items.find((own) => own.lensId === lensId);
  const [newest] = useCalibrations(machineId).data?.items ?? [];
  return useMemo(() => {
    if (profile === undefined || lens === undefined) return undefined;
    const { physical, panel } = profile;
    const { focalLengthMm, measuredSpotUm } = lens;
    const machine = { physical, panel, ...(newest === undefined ? {} : { calibration: measuredCalibration(newest) }) };
    return { machine, ground: { optics: { physical, focalLengthMm, measuredSpotUm }, panel } };
  }, [profile, lens, newest]);
}

type Filled = { form: UseFormReturn<StartValues> };

/** The five keys of the recipe. */
function WhatFor({ form }: Filled) {
  const { errors } = form.formState;
  const machines = useMachineChoices().data?.items ?? [];
  const lenses = useLensChoices(form.watch('machineId')).data?.items ?? [];
  const { materials, finishes, effects } = useGroundChoices();
  // lenses belong to the machine
  const machine = form.register('machineId', { required: 'Choose the machine.', onChange: () => form.setValue('lensId', '') });
  return (
    <Card px="5" py="4" aria-labelledby="start-what">
      <chakra.h2 id="start-what" mb="3">
        What it is for
      </chakra.h2>
      <chakra.div display="grid" gap="4" gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: 'repeat(2, minmax(0, 1fr))' }}>
        <SelectField label={START_LABELS.machineId} {...CHOOSE} options={named(machines)} error={errors.machineId?.message} {...machine} />
        <SelectField
          label={START_LABELS.lensId}
          {...CHOOSE}
          options={lenses.map(({ lensId, lensName }) => ({ value: lensId, label: lensName }))}
          error={errors.lensId?.message}
          {...form.register('lensId', { required: 'Choose the lens.' })}
        />
        <SelectField
          label={START_LABELS.materialId}
          {...CHOOSE}
          options={named(materials)}
          error={errors.materialId?.message}
          {...form.register('materialId', { required: 'Choose the material.' })}
        />
        <SelectField
          label={START_LABELS.finishId}
          {...CHOOSE}
          options={named(finishes)}
          error={errors.finishId?.message}
          {...form.register('finishId', { required: 'Choose the finish.' })}
        />
        <SelectField
          label={START_LABELS.effectId}
          {...CHOOSE}
          options={named(effects)}
          error={errors.effectId?.message}
          {...form.register('effectId', { required: 'Choose the effect that is wanted.' })}
        />
        <TextField
          label={START_LABELS.title}
          isOptional
          maxLength={MOST_TITLE}
          help="Without one: from material, finish and effect."
          error={errors.title?.message}
          {...form.register('title')}
        />
      </chakra.div>
    </Card>
  );
}

function WhereFrom({ form }: Filled) {
  const { errors } = form.formState;
  return (
    <Card px="5" py="4" aria-labelledby="start-where">
      <chakra.h2 id="start-where" mb="3">
        Where it comes from
      </chakra.h2>
      <chakra.div display="grid" gap="4">
        <SelectField label={START_LABELS.route} options={ROUTE_OPTIONS} error={errors.route?.message} {...form.register('route')} />
        <TextAreaField
          label={START_LABELS.reason}
          maxLength={MOST_REASON}
          help="Who used it, on what and since when, or which paper of the customer. A lead writes the grounds for it in the draft; they show wherever the setting shows."
          error={errors.reason?.message}
          {...form.register('reason', { validate: (text) => text.trim() !== '' || 'Say where the setting comes from.' })}
        />
      </chakra.div>
    </Card>
  );
}

const CHOOSE = { placeholder: 'Choose' };
const named = (choices: readonly Named[] | undefined) => (choices ?? []).map(({ id, name }) => ({ value: id, label: name }));

function labelsOf(panel: Panel | undefined): Readonly<Record<string, string>> {
  const setting = (panel?.fields ?? []).map(({ parameter, label }) => [`steps.0.values.${parameter}`, label] as const);
  return { ...START_LABELS, ...Object.fromEntries(setting) };
}
