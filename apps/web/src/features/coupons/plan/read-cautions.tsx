import { chakra } from '@chakra-ui/react';
import { useId } from 'react';
import { CautionList } from '../../../components/caution-list';
import { Checkbox } from '../../../components/facets';
import type { CouponPreview } from '../coupons.api';

export type ReadCautionsProps = {
  cautions: CouponPreview['cautions'];
  readIds: readonly string[];
  onRead: (ids: readonly string[]) => void;
};

/** The cautions of the work, and the planner's own word that they were read; nobody's word is given for them. */
export function ReadCautions({ cautions, readIds, onRead }: ReadCautionsProps) {
  const id = useId();
  if (cautions.length === 0) return null;
  const isRead = cautions.every((caution) => readIds.includes(caution.id));
  return (
    <chakra.div display="grid" gap="2">
      <CautionList
        cautions={cautions.map((caution) => ({ key: caution.id, act: caution.subject, reason: caution.text, source: caution.source }))}
        label="Cautions for this work"
      />
      <chakra.label htmlFor={id} display="flex" alignItems="center" gap="2.5" minHeight={{ base: 'touch', lg: '8' }} cursor="pointer">
        <Checkbox
          id={id}
          checked={isRead}
          onChange={(event) => onRead(event.currentTarget.checked ? cautions.map((caution) => caution.id) : [])}
        />
        I have read {cautions.length === 1 ? 'this caution' : `these ${cautions.length} cautions`}
      </chakra.label>
    </chakra.div>
  );
}
