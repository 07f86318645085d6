import { chakra } from '@chakra-ui/react';
import {
  FOCUS_ALLOWANCE_LABELS,
  FOCUS_ALLOWANCES,
  FOCUS_PLACE_LABELS,
  FOCUS_PLACES,
  PART_SHAPES,
  PART_SIDE_LABELS,
  PART_SIDES,
  type PartLength,
} from '@proofplate/recipe-model';
import type { ReactNode } from 'react';
import type { UseFormReturn } from 'react-hook-form';
import { NumberField, SelectField } from '../../../components/field';
import { Segmented } from '../../../components/segmented';
import { FIELD_LABELS, SHAPE_WORDS } from '../part-words';
import { lengthsOf, type PartMessages, type TypedPart } from '../typed-part';

export type PartFieldsProps = { form: UseFormReturn<TypedPart>; typed: TypedPart; messages: PartMessages };

const LENGTH_HELP: Partial<Record<PartLength, string>> = {
  smallDiameter: 'Of the surface that is marked',
  largeDiameter: 'Of the surface that is marked',
  artworkHeight: 'It lies in the middle of the length.',
  seam: 'Above zero: overlap. Below zero, such as −0.5: gap. Empty: edge to edge.',
};

/** Shape and lengths first, then the artwork, then what may be lost. */
export function PartFields({ form, typed, messages }: PartFieldsProps) {
  const set =
    <Name extends 'shape' | 'side' | 'wrap' | 'shownIn'>(name: Name) =>
    (value: TypedPart[Name]) =>
      // Name picks one field of TypedPart; the form's own type cannot follow that.
      form.setValue(name as 'shape', value as TypedPart['shape'], { shouldDirty: true, shouldValidate: form.formState.isSubmitted });
  const lengths = lengthsOf(typed);
  const ofPart = lengths.filter((field) => !field.startsWith('artwork') && field !== 'seam');
  const length = (field: PartLength) => (
    <NumberField
      key={field}
      size="touch"
      label={FIELD_LABELS[field]}
      unit={typed.shownIn}
      isOptional={field === 'seam'}
      help={LENGTH_HELP[field]}
      error={messages[field]}
      {...form.register(field)}
    />
  );
  return (
    <>
      <Choice label={FIELD_LABELS.shownIn}>
        <Segmented label={FIELD_LABELS.shownIn} choices={UNITS} value={typed.shownIn} onChange={set('shownIn')} isWide />
      </Choice>
      <Choice label={FIELD_LABELS.shape}>
        <Segmented label={FIELD_LABELS.shape} choices={SHAPES} value={typed.shape} onChange={set('shape')} isWide />
      </Choice>
      <Choice label={FIELD_LABELS.side} error={messages.side}>
        <Segmented label={FIELD_LABELS.side} choices={SIDES} value={typed.side} onChange={set('side')} isWide />
      </Choice>
      <Pair>{ofPart.map(length)}</Pair>
      <Choice label="Artwork round the part">
        <Segmented label="Artwork round the part" choices={WRAPS} value={typed.wrap} onChange={set('wrap')} isWide />
      </Choice>
      <Pair>{lengths.filter((field) => !ofPart.includes(field)).map(length)}</Pair>
      <AllowedLoss form={form} messages={messages} />
      <Steps form={form} messages={messages} />
    </>
  );
}

function AllowedLoss({ form, messages }: Omit<PartFieldsProps, 'typed'>) {
  return (
    <>
      <Pair>
        <SelectField label={FIELD_LABELS.allowance} options={ALLOWANCES} minHeight="touch" {...form.register('allowance')} />
        <NumberField
          size="touch"
          label={FIELD_LABELS.allowancePercent}
          unit="%"
          error={messages.allowancePercent}
          {...form.register('allowancePercent')}
        />
      </Pair>
      <Pair>
        <SelectField label={FIELD_LABELS.focusAt} options={PLACES} minHeight="touch" {...form.register('focusAt')} />
        <NumberField
          size="touch"
          label={FIELD_LABELS.steepestEdgeDeg}
          unit="°"
          isOptional
          error={messages.steepestEdgeDeg}
          {...form.register('steepestEdgeDeg')}
        />
      </Pair>
    </>
  );
}

function Steps({ form, messages }: Omit<PartFieldsProps, 'typed'>) {
  return (
    <Pair>
      <NumberField
        size="touch"
        label={FIELD_LABELS.indexSteps}
        isOptional
        help="Empty: as few as the focus allows. 1: without turning."
        error={messages.indexSteps}
        {...form.register('indexSteps')}
      />
      <NumberField
        size="touch"
        label={FIELD_LABELS.stepsPerTurn}
        isOptional
        help="Gear included"
        error={messages.stepsPerTurn}
        {...form.register('stepsPerTurn')}
      />
    </Pair>
  );
}

function Pair({ children }: { children: ReactNode }) {
  return (
    <chakra.div display="grid" gap="4" gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: 'repeat(2, minmax(0, 1fr))' }} alignItems="start">
      {children}
    </chakra.div>
  );
}

function Choice({ label, error, children }: { label: string; error?: string | undefined; children: ReactNode }) {
  return (
    <chakra.div minW="0">
      <chakra.p aria-hidden="true" fontWeight="semibold" fontSize="sm" lineHeight="sm" mb="1">
        {label}
      </chakra.p>
      {children}
      {error !== undefined && (
        <chakra.p mt="1" fontSize="sm" lineHeight="sm" color="oxide.fg">
          {error}
        </chakra.p>
      )}
    </chakra.div>
  );
}

const UNITS = [
  { value: 'mm', label: 'mm' },
  { value: 'in', label: 'inch' },
] as const;
const SHAPES = PART_SHAPES.map((value) => ({ value, label: SHAPE_WORDS[value] }));
const SIDES = PART_SIDES.map((value) => ({ value, label: PART_SIDE_LABELS[value] }));
const WRAPS = [
  { value: 'whole turn', label: 'Whole turn' },
  { value: 'part of a turn', label: 'Part of it' },
] as const;
const ALLOWANCES = FOCUS_ALLOWANCES.map((value) => ({ value, label: FOCUS_ALLOWANCE_LABELS[value] }));
const PLACES = FOCUS_PLACES.map((value) => ({ value, label: FOCUS_PLACE_LABELS[value] }));
