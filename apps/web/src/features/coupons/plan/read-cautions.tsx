import { chakra } from '@chakra-ui/react';
import { useId } from 'react';
import { CautionList } from '../../../components/caution-list';
import { Checkbox } from '../../../components/facets';
import { CautionIcon } from '../../../components/icons';
import type { CouponPreview } from '../coupons.api';

export type ReadCautionsProps = {
  cautions: CouponPreview['cautions'];
  readIds: readonly string[];
  onRead: (ids: readonly string[]) => void;
};

/** What to do is always in sight, the reason one tap away; that they were read is the planner's own word, never given for them. */
export function ReadCautions({ cautions, readIds, onRead }: ReadCautionsProps) {
  const id = useId();
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
        <chakra.summary py="1" minHeight={{ base: 'touch', lg: '7' }} cursor="pointer" color="brand.fg">
          Reasons and sources
        </chakra.summary>
        <CautionList
          cautions={cautions.map((caution) => ({ key: caution.id, act: caution.subject, reason: caution.text, source: caution.source }))}
          label="Reasons and sources"
        />
      </chakra.details>
      <chakra.label htmlFor={id} display="flex" alignItems="center" gap="2.5" minHeight={{ base: 'touch', lg: '8' }} cursor="pointer">
        <Checkbox
          id={id}
          checked={isRead}
          onChange={(event) => onRead(event.currentTarget.checked ? cautions.map((caution) => caution.id) : [])}
        />
        I have read {cautions.length === 1 ? 'this caution' : `these ${cautions.length} cautions`}
      </chakra.label>
    </chakra.section>
  );
}
