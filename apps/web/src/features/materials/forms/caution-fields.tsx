import {
  type CautionScope,
  MATERIAL_FAMILIES,
  MATERIAL_FAMILY_KEYS,
  type MaterialFamily,
  SOURCE_KIND_LABELS,
  SOURCE_KINDS,
  type SourceKind,
} from '@proofplate/recipe-model';
import { Controller, type UseFormReturn } from 'react-hook-form';
import { ChoiceList } from '../../../components/choice-list';
import { TextAreaField, TextField } from '../../../components/field';
import { messageAt } from '../../../components/form';
import { Switch } from '../../../components/switch';
import { useEffects } from '../effects.api';
import { useMaterials } from '../materials.api';

/** The caution form as it is typed. An empty list is no condition. Names follow the request. */
export type CautionValues = {
  level: 'care' | 'never';
  subject: string;
  text: string;
  source: string;
  appliesTo: {
    families: MaterialFamily[];
    materialIds: string[];
    sourceKinds: SourceKind[];
    effectKeys: string[];
    roundPart: boolean;
  };
};

export const CAUTION_LABELS: Readonly<Record<string, string>> = {
  level: 'How strong',
  subject: 'What to do',
  text: 'Why',
  source: 'Source',
  'appliesTo.families': 'Families of material',
  'appliesTo.materialIds': 'Materials of the shop',
  'appliesTo.sourceKinds': 'Kinds of source',
  'appliesTo.effectKeys': 'Effects',
  'appliesTo.roundPart': 'Only round parts that turn',
};

type FormProps = { form: UseFormReturn<CautionValues> };

/** The words of a caution: the act first, then why, then who says so. */
export function CautionWords({ form }: FormProps) {
  const { errors } = form.formState;
  const needed = (message: string) => ({ validate: (text: string) => text.trim() !== '' || message });
  return (
    <>
      <TextField
        label="What to do"
        autoComplete="off"
        help="Begin with the act, such as keep the extraction running."
        error={errors.subject?.message}
        {...form.register('subject', needed('Begin with what to do, such as “Keep the extraction running”.'))}
      />
      <TextAreaField label="Why" error={errors.text?.message} {...form.register('text', needed('Say why; people follow a reason.'))} />
      <TextAreaField
        label="Source"
        rows={2}
        help="The manual and its page, a data sheet, or who decided it and when."
        error={errors.source?.message}
        {...form.register('source', needed('Name the source, such as the manual and its page, or who decided it and when.'))}
      />
    </>
  );
}

/** What it applies to. `kept` is what it applies to already: that may be added to, not taken from. */
export function CautionScopeFields({ form, kept }: FormProps & { kept?: CautionScope }) {
  const { data: materials } = useMaterials();
  const { data: effects } = useEffects();
  const isNew = kept === undefined;
  const lists = [
    { name: 'families', choices: MATERIAL_FAMILY_KEYS.map((value) => ({ value, label: MATERIAL_FAMILIES[value].label })) },
    { name: 'materialIds', choices: (materials?.items ?? []).map(({ id, name }) => ({ value: id, label: name })) },
    { name: 'effectKeys', choices: (effects?.items ?? []).map(({ key, name }) => ({ value: key, label: name })) },
    { name: 'sourceKinds', choices: SOURCE_KINDS.map((value) => ({ value, label: SOURCE_KIND_LABELS[value] })) },
  ] as const;
  return (
    <>
      {lists
        .filter(({ name, choices }) => choices.length > 0 && (isNew || kept[name] !== undefined))
        .map(({ name, choices }) => (
          <Controller
            key={name}
            control={form.control}
            name={`appliesTo.${name}`}
            render={({ field }) => (
              <ChoiceList
                name={field.name}
                label={CAUTION_LABELS[`appliesTo.${name}`] ?? ''}
                error={messageAt(form.formState.errors, `appliesTo.${name}`)}
                choices={choices}
                chosen={field.value}
                fixed={kept?.[name] ?? []}
                onChange={field.onChange}
              />
            )}
          />
        ))}
      {isNew && (
        <Controller
          control={form.control}
          name="appliesTo.roundPart"
          render={({ field }) => (
            <Switch label={CAUTION_LABELS['appliesTo.roundPart'] ?? ''} isOn={field.value} onChange={field.onChange} />
          )}
        />
      )}
    </>
  );
}

export function typedScope(scope: CautionScope): CautionValues['appliesTo'] {
  return {
    families: [...(scope.families ?? [])],
    materialIds: [...(scope.materialIds ?? [])],
    sourceKinds: [...(scope.sourceKinds ?? [])],
    effectKeys: [...(scope.effectKeys ?? [])],
    roundPart: scope.roundPart === true,
  };
}

export function scopeBody({ families, materialIds, sourceKinds, effectKeys, roundPart }: CautionValues['appliesTo']): CautionScope {
  return {
    ...(families.length === 0 ? {} : { families }),
    ...(materialIds.length === 0 ? {} : { materialIds }),
    ...(sourceKinds.length === 0 ? {} : { sourceKinds }),
    ...(effectKeys.length === 0 ? {} : { effectKeys }),
    ...(roundPart ? { roundPart } : {}),
  };
}
