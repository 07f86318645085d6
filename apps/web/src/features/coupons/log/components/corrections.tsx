import { chakra, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../../components/button';
import { Dialog } from '../../../../components/dialog';
import { Panel } from '../../../../components/page';
import { formatTime } from '../../../../lib/format';
import type { Coupon } from '../../coupons.api';
import { CorrectionForm } from '../forms/correction-form';
import type { Inspection } from '../log.api';

/** What was found wrong after the seal; the coupon itself stays as it was sealed. */
export function Corrections({ coupon, inspection, timeZone }: { coupon: Coupon; inspection: Inspection; timeZone: string }) {
  const [isWriting, setIsWriting] = useState(false);
  const mayCorrect = inspection.allowedActions.includes('correct');
  if (!mayCorrect && inspection.corrections.length === 0) return null;
  return (
    <Panel px="5" py="3" aria-label="Corrections">
      <Flex justify="space-between" align="center" gap="3" wrap="wrap">
        <h2>Corrections</h2>
        {mayCorrect && <Button onClick={() => setIsWriting(true)}>Correct something</Button>}
      </Flex>
      {inspection.corrections.length === 0 ? (
        <chakra.p color="fg.muted">None. A sealed coupon never changes; what was found wrong later stands here.</chakra.p>
      ) : (
        <chakra.ul display="grid" gap="2" mt="1">
          {inspection.corrections.map(({ id, address, text, reason, by, at }) => (
            <chakra.li key={id} overflowWrap="anywhere">
              <b>{address ?? 'The coupon'}</b>: {text}
              <chakra.div fontSize="sm" lineHeight="sm" color="fg.muted">
                {reason}. {by}, {formatTime(at, timeZone)}
              </chakra.div>
            </chakra.li>
          ))}
        </chakra.ul>
      )}
      {isWriting && (
        <Dialog title={`Correct ${coupon.code}`} onClose={() => setIsWriting(false)}>
          <CorrectionForm coupon={coupon} onDone={() => setIsWriting(false)} />
        </Dialog>
      )}
    </Panel>
  );
}
