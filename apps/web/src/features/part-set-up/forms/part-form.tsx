import { chakra } from '@chakra-ui/react';
import type { EnteredPart, PartOpticsFacts } from '@proofplate/recipe-model';
import { type ReactNode, useEffect } from 'react';
import type { Resolver } from 'react-hook-form';
import { Button } from '../../../components/button';
import { Form, useSummaryForm } from '../../../components/form';
import { Panel } from '../../../components/page';
import { useSession } from '../../../lib/session';
import { NotChecked } from '../components/not-checked';
import { PartFacts } from '../components/part-facts';
import { PartPicture } from '../components/part-picture';
import { PartTable } from '../components/part-table';
import { FIELD_LABELS } from '../part-words';
import type { TypedPart } from '../typed-part';
import { type WorkedPart, workPart } from '../work-part';
import { PartFields } from './part-fields';

export type PartFormProps = {
  start: TypedPart;
  facts: PartOpticsFacts;
  /** Absent where there is no run to keep the part with. */
  onSave?: ((part: EnteredPart, submit: { idempotencyKey: string }) => Promise<void>) | undefined;
  onTyped: (typed: TypedPart) => void;
  /** Beside the button, or in its place. */
  saveNote: ReactNode;
};

/** Fields at the left, what follows from them at the right, at every key. */
export function PartForm({ start, facts, onSave, onTyped, saveNote }: PartFormProps) {
  const { shop } = useSession();
  const resolver: Resolver<TypedPart> = (values) => {
    const { messages, missing } = workPart(values, facts, shop.locale);
    const empty = Object.fromEntries(missing.map((field) => [field, { type: 'missing', message: 'Enter this length.' }]));
    const wrong = Object.fromEntries(Object.entries(messages).map(([field, message]) => [field, { type: 'refused', message }]));
    const errors = { ...empty, ...wrong };
    return Object.keys(errors).length > 0 ? { values: {}, errors } : { values, errors: {} };
  };
  const form = useSummaryForm<TypedPart>({ defaultValues: start, resolver });
  const typed = form.watch();
  const worked = workPart(typed, facts, shop.locale);
  const refused = Object.entries(form.formState.errors).flatMap(([field, error]) => (error?.message ? [[field, error.message]] : []));
  const messages = { ...Object.fromEntries(refused), ...worked.messages };
  useEffect(() => {
    const { unsubscribe } = form.watch((values) => onTyped({ ...start, ...values }));
    return unsubscribe;
  }, [form, onTyped, start]);
  const submit = async (values: TypedPart, act: { idempotencyKey: string }) => onSave?.(workPart(values, facts, shop.locale).part, act);
  return (
    <chakra.div
      display="grid"
      gap={{ base: '6', lg: '8' }}
      gridTemplateColumns={{ base: 'minmax(0, 1fr)', lg: 'minmax(0, 440px) minmax(0, 1fr)' }}
      alignItems="start"
    >
      <Form form={form} labels={FIELD_LABELS} onSubmit={submit}>
        <PartFields form={form} typed={typed} messages={messages} />
        {onSave !== undefined && (
          <Button type="submit" kind="primary" size="primaryAct" isBusy={form.formState.isSubmitting}>
            Save with the run
          </Button>
        )}
        {saveNote}
      </Form>
      <WhatFollows worked={worked} typed={typed} />
    </chakra.div>
  );
}

function WhatFollows({ worked: { part, results, messages, missing }, typed }: { worked: WorkedPart; typed: TypedPart }) {
  const { shop } = useSession();
  const problems = [...new Set(Object.values(messages))];
  const [shownIn, locale] = [typed.shownIn, shop.locale];
  return (
    <chakra.div display="grid" gap="4" minW="0">
      <Panel px="5" py="4" aria-label="What to enter" aria-live="polite">
        {results === null ? (
          problems.length > 0 ? (
            problems.map((problem) => <p key={problem}>{problem}</p>)
          ) : (
            <p>Still needed: {missing.map((field) => FIELD_LABELS[field].toLowerCase()).join(', ')}.</p>
          )
        ) : (
          <PartFacts results={results} shownIn={shownIn} locale={locale} />
        )}
      </Panel>
      {results !== null && (
        <>
          <Panel px="5" py="4" aria-label="The part">
            <PartPicture part={part} results={results} locale={locale} />
          </Panel>
          <NotChecked side={part.side} />
          <chakra.details>
            <chakra.summary py="2" color="brand.fg" cursor="pointer">
              All measures, with formula and source
            </chakra.summary>
            <PartTable results={results} shownIn={shownIn} locale={locale} />
          </chakra.details>
        </>
      )}
    </chakra.div>
  );
}
