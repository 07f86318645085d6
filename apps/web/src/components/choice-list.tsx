import { chakra } from '@chakra-ui/react';
import { useId } from 'react';
import { Checkbox } from './facets';
import { fieldId } from './field';

export type ListChoice = { value: string; label: string };
export type ChoiceListProps = {
  name: string;
  label: string;
  help?: string;
  error?: string | undefined;
  choices: readonly ListChoice[];
  chosen: readonly string[];
  /** These stay chosen: they may be added to, not taken from. */
  fixed?: readonly string[];
  onChange: (chosen: string[]) => void;
};

/** Any number of a list; long lists scroll inside their box. */
export function ChoiceList({ name, label, help, error, choices, chosen, fixed = [], onChange }: ChoiceListProps) {
  const noteId = useId();
  const note = error ?? help;
  return (
    <chakra.fieldset id={fieldId(name)} tabIndex={-1} minW="0" {...(note === undefined ? {} : { 'aria-describedby': noteId })}>
      <chakra.legend fontWeight="semibold" fontSize="sm" lineHeight="sm" mb="1">
        {label}
      </chakra.legend>
      <chakra.div
        maxH="220px"
        overflowY="auto"
        px="3"
        py="1"
        bg="bg.panel"
        border="hairline"
        borderColor={error === undefined ? 'border.emphasized' : 'oxide.solid'}
        borderRadius="md"
        tabIndex={choices.length > 5 ? 0 : undefined}
        role="group"
        aria-label={label}
      >
        {choices.map(({ value, label: words }) => (
          <chakra.label
            key={value}
            htmlFor={`${noteId}-${value}`}
            display="grid"
            gridTemplateColumns="28px minmax(0, 1fr)"
            alignItems="center"
            minHeight={{ base: '44px', lg: '32px' }}
            fontSize="sm"
          >
            <Checkbox
              id={`${noteId}-${value}`}
              checked={chosen.includes(value)}
              disabled={fixed.includes(value)}
              onChange={(event) => onChange(event.currentTarget.checked ? [...chosen, value] : chosen.filter((other) => other !== value))}
            />
            {words}
          </chakra.label>
        ))}
      </chakra.div>
      {note !== undefined && (
        <chakra.div id={noteId} mt="1" fontSize="sm" lineHeight="sm" color={error === undefined ? 'fg.muted' : 'oxide.fg'}>
          {note}
        </chakra.div>
      )}
    </chakra.fieldset>
  );
}
