import { chakra } from '@chakra-ui/react';
import { useRef } from 'react';
import { ActBar } from '../../../components/act-bar';
import { Button } from '../../../components/button';
import { SelectField, TextField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { StartIcon } from '../../../components/icons';
import { grantWords } from '../../../lib/deviation-words';
import { uuidFromRandom } from '../../../lib/device-id';
import { setUpTick } from '../../../lib/kept-ticks';
import { useSession } from '../../../lib/session';
import { kindWord } from '../run-words';
import { type Run, type RunKind, type StartSheet, startRun } from '../runs.api';

const LABELS = {
  lensFittedId: 'Lens fitted now',
  kind: 'Kind of run',
  jobReference: 'Job',
  part: 'Part',
  lot: 'Lot',
  deviationId: 'Deviation',
  ticks: 'Set-up',
};
type Values = { lensFittedId: string; kind: RunKind; jobReference: string; part: string; lot: string; deviationId: string; ticks: string };

export type StartFormProps = { sheet: StartSheet; kind: RunKind; ticks: ReadonlySet<string>; onStarted: (run: Run) => void };

/** The last look before the batch: what is fitted, what is done, which job. */
export function StartForm({ sheet, kind, ticks, onStarted }: StartFormProps) {
  const { shop } = useSession();
  const clientId = useRef(uuidFromRandom());
  const form = useSummaryForm<Values>({
    defaultValues: { lensFittedId: '', kind, jobReference: '', part: '', lot: '', deviationId: '', ticks: '' },
  });
  const { errors, isSubmitting } = form.formState;
  const cited = sheet.deviations.find(({ id }) => id === form.watch('deviationId'));
  const openSteps = sheet.setUpSteps.flatMap(({ mustTick }, index) => (mustTick && !ticks.has(setUpTick(index)) ? [index + 1] : []));
  const submit = async ({ deviationId, ticks: _shown, ...values }: Values, { idempotencyKey }: { idempotencyKey: string }) => {
    const body = {
      ...values,
      clientId: clientId.current,
      revisionId: sheet.revision.id,
      ticks: [...ticks],
      ...(deviationId === '' ? {} : { deviationId }),
    };
    onStarted(await startRun(body, idempotencyKey));
  };
  return (
    <Form form={form} labels={LABELS} onSubmit={submit}>
      <SelectField
        label={LABELS.lensFittedId}
        help={`The setting was proved with ${sheet.lens.name}. Look at the machine, then say which lens is fitted.`}
        placeholder="Look, then choose"
        options={sheet.lenses.map(({ id, name }) => ({ value: id, label: name }))}
        minHeight={{ base: 'glove', lg: 'act' }}
        error={errors.lensFittedId?.message}
        {...form.register('lensFittedId', {
          required: 'Say which lens is fitted',
          validate: (id) => id === sheet.lens.id || `Fit ${sheet.lens.name} first: another lens makes another mark`,
        })}
      />
      {sheet.kinds.length > 1 && (
        <SelectField
          label={LABELS.kind}
          options={sheet.kinds.map((value) => ({ value, label: kindWord(asKind(value)) }))}
          minHeight={{ base: 'glove', lg: 'act' }}
          {...form.register('kind')}
        />
      )}
      <TextField
        label={LABELS.jobReference}
        isOptional
        size="glove"
        autoComplete="off"
        error={errors.jobReference?.message}
        {...form.register('jobReference')}
      />
      <chakra.div display="grid" gridTemplateColumns={{ base: '1fr', sm: '1fr 1fr' }} gap="4">
        <TextField label={LABELS.part} isOptional size="glove" autoComplete="off" error={errors.part?.message} {...form.register('part')} />
        <TextField label={LABELS.lot} isOptional size="glove" autoComplete="off" error={errors.lot?.message} {...form.register('lot')} />
      </chakra.div>
      {sheet.deviations.length > 0 && (
        <SelectField
          label={LABELS.deviationId}
          isOptional
          placeholder="none: mark as the setting says"
          help={cited === undefined ? undefined : grantWords(cited, shop.timeZone)}
          options={sheet.deviations.map(({ id, description }) => ({ value: id, label: description }))}
          minHeight={{ base: 'glove', lg: 'act' }}
          error={errors.deviationId?.message}
          {...form.register('deviationId')}
        />
      )}
      <input
        type="hidden"
        {...form.register('ticks', { validate: () => openSteps.length === 0 || `Do and tick step ${openSteps.join(', ')} first` })}
      />
      <ActBar>
        <Button type="submit" kind="primary" size="primaryAct" icon={<StartIcon />} isBusy={isSubmitting} disabled={sheet.holds.length > 0}>
          Start the run
        </Button>
      </ActBar>
    </Form>
  );
}

/** The server lists the kinds that may start now out of this closed list. */
const asKind = (kind: string) => kind as RunKind;
