import { chakra } from '@chakra-ui/react';
import { useId, useState } from 'react';
import { RemovableChip } from './chip';

export type FacetValue = { value: string; label: string; count: number };
export type Facet = { key: string; title: string; values: readonly FacetValue[] };
/** Chosen values by facet; it lives in the address, not here. */
export type FacetChoice = Readonly<Record<string, readonly string[]>>;

const SHOWN_FIRST = 5;

export type FacetsProps = {
  facets: readonly Facet[];
  chosen: FacetChoice;
  onChange: (chosen: FacetChoice) => void;
};

/** Filters with counts; a value without a result is muted and cannot be chosen. */
export function Facets({ facets, chosen, onChange }: FacetsProps) {
  return (
    <chakra.div role="group" aria-label="Filters" display="grid" gap="4">
      {facets.map((facet) => (
        <FacetGroup
          key={facet.key}
          facet={facet}
          chosen={chosen[facet.key] ?? []}
          onChange={(values) => onChange({ ...chosen, [facet.key]: values })}
        />
      ))}
    </chakra.div>
  );
}

type FacetGroupProps = { facet: Facet; chosen: readonly string[]; onChange: (values: readonly string[]) => void };

function FacetGroup({ facet, chosen, onChange }: FacetGroupProps) {
  const [isOpen, setIsOpen] = useState(false);
  const shown = isOpen ? facet.values : facet.values.filter(({ value }, index) => index < SHOWN_FIRST || chosen.includes(value));
  const hidden = facet.values.length - shown.length;
  return (
    <chakra.fieldset minW="0">
      <chakra.legend fontSize="sm" lineHeight="sm" fontWeight="semibold" mb="1">
        {facet.title}
      </chakra.legend>
      {shown.map((value) => (
        <FacetRow
          key={value.value}
          value={value}
          isChosen={chosen.includes(value.value)}
          onToggle={(isOn) => onChange(isOn ? [...chosen, value.value] : chosen.filter((other) => other !== value.value))}
        />
      ))}
      {(hidden > 0 || isOpen) && (
        <chakra.button
          type="button"
          aria-expanded={isOpen}
          onClick={() => setIsOpen(!isOpen)}
          minHeight={{ base: '44px', lg: '30px' }}
          pl="26px"
          fontSize="sm"
          color="brand.fg"
          textDecoration="underline"
          cursor="pointer"
        >
          {isOpen ? 'Fewer' : `${hidden} more`}
        </chakra.button>
      )}
    </chakra.fieldset>
  );
}

type FacetRowProps = { value: FacetValue; isChosen: boolean; onToggle: (isOn: boolean) => void };

function FacetRow({ value: { label, count }, isChosen, onToggle }: FacetRowProps) {
  const id = useId();
  const isEmpty = count === 0 && !isChosen;
  return (
    <chakra.label
      htmlFor={id}
      display="grid"
      gridTemplateColumns="26px 1fr auto"
      alignItems="center"
      minHeight={{ base: '44px', lg: '30px' }}
      fontSize="sm"
      cursor={isEmpty ? 'not-allowed' : 'pointer'}
      color={isEmpty ? 'fg.subtle' : 'fg'}
      fontWeight={isChosen ? 'semibold' : 'normal'}
    >
      <Checkbox id={id} checked={isChosen} disabled={isEmpty} onChange={(event) => onToggle(event.currentTarget.checked)} />
      {label}
      <chakra.span color="fg.muted">{`\u00A0${count}`}</chakra.span>
    </chakra.label>
  );
}

/** Square box; the tick is drawn by the theme's own ink. */
export const Checkbox = chakra(
  'input',
  {
    base: {
      appearance: 'none',
      boxSize: '18px',
      flexShrink: '0',
      border: 'hairline',
      borderWidth: '1.5px',
      borderColor: 'border.emphasized',
      borderRadius: '3px',
      bg: 'bg.panel',
      cursor: 'inherit',
      display: 'inline-grid',
      placeItems: 'center',
      _checked: {
        bg: 'brand.solid',
        borderColor: 'brand.solid',
        _before: {
          content: '""',
          width: '9px',
          height: '5px',
          borderLeft: '2px solid',
          borderBottom: '2px solid',
          color: 'brand.contrast',
          transform: 'rotate(-45deg) translate(1px, -1px)',
        },
      },
      _disabled: { bg: 'bg.muted' },
    },
  },
  { defaultProps: { type: 'checkbox' } },
);

export type ActiveFiltersProps = FacetsProps & { onClear: () => void };

/** Every active filter as a chip that can be taken away, and one way back to the full list. */
export function ActiveFilters({ facets, chosen, onChange, onClear }: ActiveFiltersProps) {
  const active = facets.flatMap(({ key, values }) =>
    (chosen[key] ?? []).map((value) => ({ key, value, label: values.find((own) => own.value === value)?.label ?? value })),
  );
  if (active.length === 0) return null;
  return (
    <chakra.div display="flex" flexWrap="wrap" alignItems="center" gap="2">
      {active.map(({ key, value, label }) => (
        <RemovableChip
          key={`${key} ${value}`}
          label={label}
          onRemove={() => onChange({ ...chosen, [key]: (chosen[key] ?? []).filter((other) => other !== value) })}
        />
      ))}
      <chakra.button
        type="button"
        onClick={onClear}
        px="2"
        minHeight={{ base: '44px', lg: '32px' }}
        fontSize="sm"
        color="brand.fg"
        textDecoration="underline"
        cursor="pointer"
      >
        Clear all
      </chakra.button>
    </chakra.div>
  );
}
