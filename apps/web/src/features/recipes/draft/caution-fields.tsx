import { chakra } from '@chakra-ui/react';
import type { UseFormReturn } from 'react-hook-form';
import { Checkbox } from '../../../components/facets';
import { CautionIcon } from '../../../components/icons';
import type { Revision } from '../recipes.api';
import type { DraftValues } from './draft-values';

/** A last caution alone in its row takes the whole row. */
const FILLS_LAST_ROW = { '&:last-child:nth-of-type(odd)': { gridColumn: '1 / -1' } } as const;

/** Cautions come first; the author acknowledges each for itself. */
export function CautionFields({ form, cautions }: { form: UseFormReturn<DraftValues>; cautions: Revision['cautions'] }) {
  if (cautions.length === 0) return null;
  return (
    <chakra.ul
      aria-label="Cautions"
      display="grid"
      gridTemplateColumns={{ base: 'minmax(0, 1fr)', md: 'repeat(2, minmax(0, 1fr))' }}
      gap="1px"
      mb="4"
      overflow="hidden"
      bg="straw.emphasized"
      border="hairline"
      borderColor="straw.emphasized"
      borderRadius="md"
    >
      {cautions.map(({ id, level, subject, text, source }) => (
        <chakra.li
          key={id}
          display="grid"
          gridTemplateColumns="34px minmax(0, 1fr)"
          bg="straw.subtle"
          px="3.5"
          py="2.5"
          css={FILLS_LAST_ROW}
        >
          <CautionIcon />
          <div>
            <b>{level === 'never' ? `Never: ${subject}` : subject}</b>
            <chakra.p fontSize="sm" lineHeight="sm">
              {text} <chakra.span color="fg.muted">{source}</chakra.span>
            </chakra.p>
            {level === 'care' && (
              <chakra.label htmlFor={`acknowledge-${id}`} display="flex" gap="2" alignItems="center" minHeight="44px" cursor="pointer">
                <Checkbox id={`acknowledge-${id}`} value={id} {...form.register('acknowledged')} />
                <span>
                  Read and taken in<chakra.span srOnly>: {subject}</chakra.span>
                </span>
              </chakra.label>
            )}
          </div>
        </chakra.li>
      ))}
    </chakra.ul>
  );
}
