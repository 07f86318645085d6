import { chakra } from '@chakra-ui/react';
import { useId } from 'react';
import { Button } from '../../../components/button';

export const MOST_PARTS = 1_000_000;

export type CountFieldProps = { label: string; value: string; error?: string | undefined; onChange: (value: string) => void };

/** A number of parts: typed, or one more and one less with a gloved thumb. */
export function CountField({ label, value, error, onChange }: CountFieldProps) {
  const id = useId();
  const count = readCount(value) ?? 0;
  const step = (by: number) => onChange(String(Math.min(MOST_PARTS, Math.max(0, count + by))));
  return (
    <chakra.div minW="0">
      <chakra.label htmlFor={id} display="block" fontWeight="semibold" mb="1">
        {label}
      </chakra.label>
      <chakra.div display="grid" gridTemplateColumns="72px minmax(0, 1fr) 72px" gap="2">
        <Button
          size="primaryAct"
          minHeight="primaryAct"
          shape="square"
          aspectRatio="auto"
          fontSize="3xl"
          aria-label={`One ${label.toLowerCase()} fewer`}
          onClick={() => step(-1)}
        >
          −
        </Button>
        <Input
          id={id}
          type="text"
          inputMode="numeric"
          autoComplete="off"
          value={value}
          aria-invalid={error === undefined ? undefined : true}
          aria-describedby={error === undefined ? undefined : `${id}-error`}
          onFocus={(event) => event.currentTarget.select()}
          onChange={(event) => onChange(event.currentTarget.value)}
        />
        <Button
          size="primaryAct"
          minHeight="primaryAct"
          shape="square"
          aspectRatio="auto"
          fontSize="3xl"
          aria-label={`One ${label.toLowerCase()} more`}
          onClick={() => step(1)}
        >
          +
        </Button>
      </chakra.div>
      {error !== undefined && (
        <chakra.p id={`${id}-error`} mt="1" fontSize="sm" color="oxide.fg">
          {error}
        </chakra.p>
      )}
    </chakra.div>
  );
}

/** The number of parts in the field; undefined for anything but a whole number that can be counted. */
export function readCount(text: string): number | undefined {
  const plain = text.trim();
  if (!/^\d{1,7}$/.test(plain)) return undefined;
  const count = Number(plain);
  return count <= MOST_PARTS ? count : undefined;
}

const Input = chakra('input', {
  base: {
    width: 'full',
    minW: '0',
    height: 'primaryAct',
    textAlign: 'center',
    fontSize: '5xl',
    fontWeight: 'semibold',
    bg: 'bg.panel',
    border: 'hairline',
    borderColor: 'border.emphasized',
    borderRadius: 'md',
    _invalid: { borderColor: 'oxide.solid', boxShadow: 'inset 0 0 0 1px var(--pp-colors-oxide-solid)' },
  },
});
