import { chakra, Flex } from '@chakra-ui/react';
import { CautionList } from '../../../components/caution-list';
import { Checkbox } from '../../../components/facets';
import { fieldId } from '../../../components/field';
import { CautionIcon } from '../../../components/icons';
import { StateShape } from '../../../components/state-mark';
import type { CouponPreview } from '../coupons.api';

/** The summary of a refused plan leads to the tick by the name of its field. */
export const READ_CAUTIONS_ID = fieldId('acknowledgedCautionIds');

export type ReadCautionsProps = {
  cautions: CouponPreview['cautions'];
  readIds: readonly string[];
  onRead: (ids: string[]) => void;
  /** Said after Save, until they are read. */
  error: string | undefined;
};

/** What to do is always in sight, the reason one tap away; that they were read is the planner's own word, never given for them. */
export function ReadCautions({ cautions, readIds, onRead, error }: ReadCautionsProps) {
  const id = READ_CAUTIONS_ID;
  if (cautions.length === 0) return null;
  const isRead = cautions.every((caution) => readIds.includes(caution.id));
  return (
    <chakra.section
      aria-label="Cautions for this work"
      display="grid"
      gap="1"
      p="3.5"
      bg="straw.subtle"
      border="hairline"
      borderColor="straw.emphasized"
      borderRadius="md"
    >
      <chakra.ul display="grid" gap="0.5">
        {cautions.map((caution) => (
          <chakra.li key={caution.id} display="flex" gap="2.5" alignItems="center" fontSize="sm" lineHeight="sm">
            <CautionIcon size={16} />
            <b>{caution.subject}</b>
          </chakra.li>
        ))}
      </chakra.ul>
      <chakra.details fontSize="sm" lineHeight="sm">
        <chakra.summary py={{ base: '5', lg: '1' }} minHeight={{ base: 'glove', lg: '7' }} cursor="pointer" color="brand.fg">
          Reasons and sources
        </chakra.summary>
        <CautionList
          cautions={cautions.map((caution) => ({ key: caution.id, act: caution.subject, reason: caution.text, source: caution.source }))}
          label="Reasons and sources"
        />
      </chakra.details>
      <chakra.label htmlFor={id} display="flex" alignItems="center" gap="2.5" minHeight={{ base: 'glove', lg: '8' }} cursor="pointer">
        <Checkbox
          id={id}
          checked={isRead}
          aria-invalid={error === undefined ? undefined : true}
          aria-describedby={error === undefined ? undefined : `${id}-note`}
          onChange={(event) => onRead(event.currentTarget.checked ? cautions.map((caution) => caution.id) : [])}
        />
        I have read {cautions.length === 1 ? 'this caution' : `these ${cautions.length} cautions`}
      </chakra.label>
      {error !== undefined && (
        <Flex id={`${id}-note`} gap="1.5" fontSize="sm" lineHeight="sm" color="oxide.fg">
          <chakra.span pt="2px" lineHeight="none">
            <StateShape state="fails" />
          </chakra.span>
          <span>{error}</span>
        </Flex>
      )}
    </chakra.section>
  );
}
