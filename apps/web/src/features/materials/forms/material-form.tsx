import { chakra } from '@chakra-ui/react';
import { MATERIAL_FAMILIES, MATERIAL_FAMILY_KEYS, type MaterialFamily, materialFamilyOf } from '@proofplate/recipe-model';
import { useId } from 'react';
import { type UseFormReturn, useWatch } from 'react-hook-form';
import { Button } from '../../../components/button';
import { NumberField, TextAreaField, TextField } from '../../../components/field';
import { Form, messageAt, useSummaryForm } from '../../../components/form';
import { ProblemNotice } from '../../../components/problem-notice';
import { asSentence } from '../../../lib/format';
import { messageOf, type NumberRule, readOptionalNumber } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';
import { useCautions } from '../cautions.api';
import type { Material, MaterialBody } from '../materials.api';
import { type MaterialValues, materialBody, materialValues, PROPERTY_RULES, THICKNESS } from './material-values';

const LABELS: Readonly<Record<string, string>> = {
  name: 'Name',
  family: 'What it is',
  grade: 'Grade or alloy',
  standardDesignation: 'Designation of a standard',
  supplier: 'Supplier',
  thicknessMm: 'Usual thickness',
  ...Object.fromEntries(
    PROPERTY_RULES.flatMap(({ key, label }) => [
      [`properties.${key}.value`, label],
      [`properties.${key}.source`, `Source of the ${label.toLowerCase()}`],
    ]),
  ),
  notes: 'Notes',
};

export type MaterialFormProps = {
  material?: Material | undefined;
  onSubmit: (body: MaterialBody, submit: { idempotencyKey: string }) => Promise<unknown>;
};

/** A material; without one, a new material. */
export function MaterialForm({ material, onSubmit }: MaterialFormProps) {
  const { locale } = useSession().shop;
  const form = useSummaryForm<MaterialValues>({ defaultValues: materialValues(material, locale) });
  const { errors, isSubmitting } = form.formState;
  return (
    <Form form={form} labels={LABELS} onSubmit={(values, submit) => onSubmit(materialBody(values, locale), submit)}>
      <TextField
        label="Name"
        help="As it stands on the rack, such as dial blank 1.5 mm."
        autoComplete="off"
        error={errors.name?.message}
        {...form.register('name', { validate: (text) => text.trim() !== '' || 'Give the material the name that people in the shop use.' })}
      />
      <FamilyField form={form} />
      <TextField label="Grade or alloy" isOptional error={errors.grade?.message} {...form.register('grade')} />
      <TextField
        label="Designation of a standard"
        isOptional
        error={errors.standardDesignation?.message}
        {...form.register('standardDesignation')}
      />
      <TextField label="Supplier" isOptional error={errors.supplier?.message} {...form.register('supplier')} />
      <NumberField
        label="Usual thickness"
        rule={THICKNESS}
        isOptional
        error={errors.thicknessMm?.message}
        {...form.register('thicknessMm', { validate: (text) => messageOf(readOptionalNumber(text, THICKNESS, locale)) })}
      />
      <PropertyFields form={form} />
      <TextAreaField label="Notes" isOptional error={errors.notes?.message} {...form.register('notes')} />
      <Button type="submit" kind="primary" size="touch" isBusy={isSubmitting}>
        {material === undefined ? 'Add the material' : 'Save the material'}
      </Button>
    </Form>
  );
}

/** Any word of the trade; the family that it stands for is said at once, because cautions hang on it. */
function FamilyField({ form }: { form: UseFormReturn<MaterialValues> }) {
  const listId = useId();
  const word = useWatch({ control: form.control, name: 'family' });
  const family = materialFamilyOf(word);
  const heard =
    word.trim() === '' ? 'Such as stainless steel, 316L, vinyl or PMMA.' : `This counts as: ${MATERIAL_FAMILIES[family].label}.`;
  return (
    <>
      <TextField
        label="What it is"
        list={listId}
        autoComplete="off"
        help={<span aria-live="polite">{heard}</span>}
        error={form.formState.errors.family?.message}
        {...form.register('family', {
          validate: (text) => text.trim() !== '' || 'Say what the material is, such as stainless steel or acrylic.',
        })}
      />
      <datalist id={listId}>
        {MATERIAL_FAMILY_KEYS.map((key) => (
          <option key={key} value={MATERIAL_FAMILIES[key].label} />
        ))}
      </datalist>
      {word.trim() !== '' && <NeverMarkedFamily family={family} />}
    </>
  );
}

/** A family that must never be marked is said before the material is added: it may be kept in the list, and nothing more. */
function NeverMarkedFamily({ family }: { family: MaterialFamily }) {
  const cautions = useCautions().data?.items ?? [];
  const never = cautions.filter(({ level, appliesTo }) => level === 'never' && appliesTo.families?.includes(family) === true);
  return never.map(({ id, subject, text, source }) => (
    <ProblemNotice
      key={id}
      what={`Never. ${asSentence(subject)}`}
      safe={text}
      todo={`Source: ${asSentence(source)} Added, it stands in the list with this refusal; no coupon can be planned on it, no recipe drafted and no run started.`}
    />
  ));
}

function PropertyFields({ form }: { form: UseFormReturn<MaterialValues> }) {
  const { errors } = form.formState;
  const isOpen = PROPERTY_RULES.some(
    ({ key }) => form.getValues(`properties.${key}.value`) !== '' || messageAt(errors, `properties.${key}.source`) !== undefined,
  );
  return (
    <chakra.details open={isOpen}>
      <chakra.summary py="2.5" fontWeight="semibold" cursor="pointer">
        Numbers of the material
      </chakra.summary>
      <chakra.p mb="3" fontSize="sm" lineHeight="sm" color="fg.muted">
        For heat and depth. Each number needs its source; without it nothing is worked out from it.
      </chakra.p>
      <chakra.div display="grid" gap="4">
        {PROPERTY_RULES.map(({ key, label, rule }) => (
          <PropertyPair key={key} form={form} name={key} label={label} rule={rule} />
        ))}
      </chakra.div>
    </chakra.details>
  );
}

type PropertyPairProps = { form: UseFormReturn<MaterialValues>; name: keyof MaterialValues['properties']; label: string; rule: NumberRule };

function PropertyPair({ form, name, label, rule }: PropertyPairProps) {
  const { locale } = useSession().shop;
  const { errors } = form.formState;
  const [value, source] = [`properties.${name}.value`, `properties.${name}.source`] as const;
  const sourceMessage = (text: string) =>
    form.getValues(value).trim() === '' || text.trim() !== '' || 'Say where the number comes from; without a source it is not kept.';
  return (
    <chakra.div display="grid" gap="3" gridTemplateColumns={{ base: '1fr', sm: 'repeat(2, minmax(0, 1fr))' }}>
      <NumberField
        label={label}
        unit={rule.unit}
        isOptional
        error={messageAt(errors, value)}
        {...form.register(value, { validate: (text) => messageOf(readOptionalNumber(text, rule, locale)) })}
      />
      <TextField
        label="Source"
        isOptional
        error={messageAt(errors, source)}
        {...form.register(source, { validate: sourceMessage })}
        aria-label={`Source of the ${label.toLowerCase()}`}
      />
    </chakra.div>
  );
}
