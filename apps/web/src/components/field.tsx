import { chakra, Flex } from '@chakra-ui/react';
import { type ComponentProps, type ReactNode, useState } from 'react';
import { shopLocale } from '../lib/format';
import { conversionWords, type NumberRule, shownUnit } from '../lib/read-number';
import { ChevronDownIcon } from './icons';
import { StateShape } from './state-mark';
import { VisuallyHidden } from './visually-hidden';

/** Id of the control of a form field: the error summary links to it. */
export function fieldId(name: string): string {
  return `field-${name.replaceAll('.', '-')}`;
}

export type FieldProps = {
  /** Name within the form; the error summary finds the control by it. */
  name: string;
  label: string;
  help?: ReactNode;
  /** Takes the place of the help and says the way out. */
  error?: string | undefined;
  /** Stands inside the field and in the accessible name. */
  unit?: string;
  isOptional?: boolean;
  children: (control: ControlProps) => ReactNode;
};

export type ControlProps = { id: string; 'aria-describedby'?: string; 'aria-invalid'?: true };

/** Label above, control, help or error under it. */
export function Field({ name, label, help, error, unit, isOptional = false, children }: FieldProps) {
  const id = fieldId(name);
  const note = error ?? help;
  const control: ControlProps = {
    id,
    ...(note === undefined ? {} : { 'aria-describedby': `${id}-note` }),
    ...(error === undefined ? {} : { 'aria-invalid': true as const }),
  };
  return (
    <chakra.div minW="0">
      <chakra.label htmlFor={id} display="block" fontWeight="semibold" fontSize="sm" lineHeight="sm" mb="1">
        {label}
        {unit !== undefined && unit !== '' && <VisuallyHidden>, {unit}</VisuallyHidden>}
        {isOptional && (
          <chakra.span fontWeight="normal" color="fg.muted">
            {' '}
            optional
          </chakra.span>
        )}
      </chakra.label>
      {children(control)}
      {error === undefined ? (
        help !== undefined && (
          <chakra.div id={`${id}-note`} mt="1" fontSize="sm" lineHeight="sm" color="fg.muted">
            {help}
          </chakra.div>
        )
      ) : (
        <Flex id={`${id}-note`} mt="1" gap="1.5" fontSize="sm" lineHeight="sm" color="oxide.fg">
          <chakra.span pt="2px" lineHeight="none">
            <StateShape state="fails" />
          </chakra.span>
          <span>{error}</span>
        </Flex>
      )}
    </chakra.div>
  );
}

const boxBase = {
  border: 'hairline',
  borderColor: 'border.emphasized',
  borderRadius: 'md',
  bg: 'bg.panel',
  color: 'fg',
  fontSize: 'md',
  width: 'full',
} as const;

/** Frame of a text control with something inside it, at the right or left. */
export const InputFrame = chakra('span', {
  base: {
    ...boxBase,
    display: 'flex',
    alignItems: 'center',
    gap: '1.5',
    px: '3',
    cursor: 'text',
    '&:has(:focus-visible)': { outline: '2px solid', outlineColor: 'brand.focusRing', outlineOffset: '2px' },
    '&:has([aria-invalid=true])': { borderColor: 'oxide.solid', boxShadow: 'inset 0 0 0 1px var(--pp-colors-oxide-solid)' },
    '&:has(:disabled)': { bg: 'bg.muted', color: 'fg.subtle' },
  },
  variants: {
    size: {
      control: { minHeight: { base: 'touch', lg: 'control' } },
      touch: { minHeight: 'touch' },
      glove: { minHeight: { base: 'glove', lg: 'act' }, fontSize: 'lg' },
    },
  },
  defaultVariants: { size: 'control' },
});

const Input = chakra('input', {
  base: {
    flex: '1',
    minW: '0',
    alignSelf: 'stretch',
    bg: 'transparent',
    outline: 'none !important',
    color: 'inherit',
    fontSize: 'inherit',
  },
});

type InputProps = ComponentProps<typeof Input>;
type FrameSize = 'control' | 'touch' | 'glove';

export type TextFieldProps = Omit<FieldProps, 'children'> &
  Omit<InputProps, keyof FieldProps | 'size'> & { size?: FrameSize; icon?: ReactNode };

/** One line of text. Spread `register('…')` of react-hook-form into it. */
export function TextField({ name, label, help, error, unit, isOptional, size = 'control', icon, ...input }: TextFieldProps) {
  return (
    <Field name={name} label={label} help={help} error={error} unit={unit} isOptional={isOptional}>
      {(control) => (
        <InputFrame size={size}>
          {icon}
          <Input type="text" name={name} {...input} {...control} />
          {unit !== undefined && (
            <chakra.span color="fg.muted" whiteSpace="nowrap" aria-hidden="true">
              {unit}
            </chakra.span>
          )}
        </InputFrame>
      )}
    </Field>
  );
}

/** With its rule, a field has the rule's unit and says under it what a number with another unit is in its own. */
export type NumberFieldProps = TextFieldProps & { rule?: NumberRule };

/**
 * A number with its unit, as text: a wheel or an arrow key must never change a setting. What was typed stays as typed; reading it
 * ("0,03 mm", "850 lpi") is the caller's.
 */
export function NumberField({ rule, unit = rule === undefined ? undefined : shownUnit(rule), onChange, ...props }: NumberFieldProps) {
  const [typed, setTyped] = useState('');
  const conversion = rule === undefined ? undefined : conversionWords(typed, rule, shopLocale());
  return (
    <TextField
      inputMode="decimal"
      autoComplete="off"
      spellCheck={false}
      {...props}
      {...(unit === undefined ? {} : { unit })}
      {...(conversion === undefined ? {} : { help: conversion })}
      onChange={(event) => {
        setTyped(event.target.value);
        onChange?.(event);
      }}
    />
  );
}

const TextArea = chakra('textarea', {
  base: {
    ...boxBase,
    px: '3',
    py: '2',
    minHeight: '16',
    resize: 'vertical',
    _invalid: { borderColor: 'oxide.solid', boxShadow: 'inset 0 0 0 1px var(--pp-colors-oxide-solid)' },
  },
});

export type TextAreaFieldProps = Omit<FieldProps, 'children' | 'unit'> & Omit<ComponentProps<typeof TextArea>, keyof FieldProps>;

export function TextAreaField({ name, label, help, error, isOptional, ...area }: TextAreaFieldProps) {
  return (
    <Field name={name} label={label} help={help} error={error} isOptional={isOptional}>
      {(control) => <TextArea rows={3} name={name} {...area} {...control} />}
    </Field>
  );
}

const Select = chakra('select', {
  base: {
    ...boxBase,
    minHeight: { base: 'touch', lg: 'control' },
    pl: '3',
    pr: '9',
    appearance: 'none',
    cursor: 'pointer',
    _invalid: { borderColor: 'oxide.solid', boxShadow: 'inset 0 0 0 1px var(--pp-colors-oxide-solid)' },
    _disabled: { bg: 'bg.muted', color: 'fg.subtle', cursor: 'not-allowed' },
  },
});

export type SelectOption = { value: string; label: string; isDisabled?: boolean };
export type SelectFieldProps = Omit<FieldProps, 'children' | 'unit'> &
  Omit<ComponentProps<typeof Select>, keyof FieldProps> & { options: readonly SelectOption[]; placeholder?: string };

export function SelectField({ name, label, help, error, isOptional, options, placeholder, ...select }: SelectFieldProps) {
  return (
    <Field name={name} label={label} help={help} error={error} isOptional={isOptional}>
      {(control) => (
        <chakra.span display="block" position="relative">
          <Select name={name} {...select} {...control}>
            {placeholder !== undefined && <option value="">{placeholder}</option>}
            {options.map(({ value, label: text, isDisabled }) => (
              <option key={value} value={value} disabled={isDisabled}>
                {text}
              </option>
            ))}
          </Select>
          <chakra.span position="absolute" right="3" top="50%" mt="-10px" color="fg.muted" pointerEvents="none" lineHeight="none">
            <ChevronDownIcon />
          </chakra.span>
        </chakra.span>
      )}
    </Field>
  );
}
