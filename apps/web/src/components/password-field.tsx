import { chakra } from '@chakra-ui/react';
import { type ComponentProps, useState } from 'react';
import { Field, type FieldProps, InputFrame } from './field';

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

export type PasswordFieldProps = Omit<FieldProps, 'children' | 'unit'> &
  Omit<ComponentProps<typeof Input>, keyof FieldProps | 'size' | 'type'> & { autoComplete: 'current-password' | 'new-password' };

/** A password that can be shown; password managers and pasting work. */
export function PasswordField({ name, label, help, error, isOptional, ...input }: PasswordFieldProps) {
  const [isShown, setIsShown] = useState(false);
  return (
    <Field name={name} label={label} help={help} error={error} isOptional={isOptional}>
      {(control) => (
        <InputFrame pr="0">
          <Input name={name} type={isShown ? 'text' : 'password'} autoCapitalize="none" spellCheck={false} {...input} {...control} />
          <chakra.button
            type="button"
            aria-pressed={isShown}
            aria-label={`Show ${label.toLowerCase()}`}
            onClick={() => setIsShown(!isShown)}
            alignSelf="stretch"
            px="3"
            color="brand.fg"
            fontSize="sm"
            fontWeight="semibold"
            borderRadius="md"
            cursor="pointer"
          >
            {isShown ? 'Hide' : 'Show'}
          </chakra.button>
        </InputFrame>
      )}
    </Field>
  );
}
