import { chakra } from '@chakra-ui/react';
import { asSentence } from '../lib/format';
import { CautionIcon } from './icons';

export type GeneralCaution = { id: string; subject: string; text: string; source: string };

export type GeneralCautionsProps = {
  cautions: readonly GeneralCaution[];
  /** What they are for, first in the row. */
  lead?: string;
};

/** Cautions in one row, each with what to do; why and from where behind one tap. */
export function GeneralCautions({ cautions, lead = 'With every job' }: GeneralCautionsProps) {
  if (cautions.length === 0) return null;
  return (
    <chakra.details bg="straw.subtle" border="hairline" borderColor="straw.emphasized" borderRadius="md">
      <chakra.summary
        cursor="pointer"
        display="grid"
        gridTemplateColumns="34px minmax(0, 1fr) auto"
        alignItems="center"
        minHeight={{ base: 'glove', lg: 'touch' }}
        px="3.5"
        py="1.5"
        fontSize="sm"
        lineHeight="sm"
        borderRadius="md"
      >
        <chakra.span lineHeight="none">
          <CautionIcon size={20} />
        </chakra.span>
        {/* On a phone two lines of them keep the setting near; the press that tells why shows each one whole. */}
        <chakra.span lineClamp={{ base: 2, sm: 'none' }}>
          <b>{lead}: </b>
          {cautions.map(({ subject }) => asSentence(subject)).join(' ')}
        </chakra.span>
        <chakra.span pl="4" color="brand.fg" textDecoration="underline">
          Why
        </chakra.span>
      </chakra.summary>
      <chakra.ul px="3.5" pb="3" display="grid" gap="2" fontSize="sm" lineHeight="sm">
        {cautions.map(({ id, subject, text, source }) => (
          <chakra.li key={id} pl="34px">
            <b>{asSentence(subject)}</b> {text} <chakra.span color="fg.muted">{source}</chakra.span>
          </chakra.li>
        ))}
      </chakra.ul>
    </chakra.details>
  );
}
