import { Box, chakra, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../../components/button';
import { Dialog } from '../../../../components/dialog';
import { TextField } from '../../../../components/field';
import { SealIcon } from '../../../../components/icons';
import { ProblemNotice } from '../../../../components/problem-notice';
import { StateShape } from '../../../../components/state-mark';
import type { ProblemError } from '../../../../lib/api';
import type { Coupon } from '../../coupons.api';
import { useAct } from '../../use-act';
import { finishInspection, type Inspection, type MissingItem, sealCoupon } from '../log.api';

export type SealDialogProps = { coupon: Coupon; inspection: Inspection; onClose: () => void; onDone: (words: string) => void };

/** What is still missing, in plain words, and the two last steps of a coupon: the inspection ends, then the seal. */
export function SealDialog({ coupon, inspection, onClose, onDone }: SealDialogProps) {
  const [reason, setReason] = useState('');
  const act = useAct();
  const isMarked = inspection.state === 'marked';
  const missing = isMarked ? inspection.missingToInspect : inspection.missingToSeal;
  const unrated = missing.find(({ code }) => code === 'ratings');
  const canNameReason = isMarked && unrated !== undefined && reason.trim() !== '';
  const isReady = missing.every(({ isBlocking, code }) => !isBlocking || (code === 'ratings' && canNameReason));

  const handleInspect = () =>
    act.run(async (idempotencyKey) => {
      const addresses = new Set(canNameReason ? unrated.addresses : []);
      const cells = coupon.cells.filter(({ address }) => addresses.has(address));
      const unratedCells = cells.map(({ id: cellId }) => ({ cellId, reason: reason.trim() }));
      await finishInspection(coupon.id, inspection.version, { unratedCells, idempotencyKey });
    });
  const handleSeal = () =>
    act.run(async (idempotencyKey) => {
      await sealCoupon(coupon.id, inspection.version, idempotencyKey);
      onDone(`${coupon.code} is sealed.`);
    });
  return (
    <Dialog
      title={`Seal ${coupon.code}`}
      width="wide"
      onClose={onClose}
      actions={
        isMarked ? (
          <Button kind="primary" disabled={!isReady} isBusy={act.isBusy} onClick={() => void handleInspect()}>
            Finish the inspection
          </Button>
        ) : (
          <Button kind="primary" icon={<SealIcon />} disabled={!isReady} isBusy={act.isBusy} onClick={() => void handleSeal()}>
            Seal {coupon.code}
          </Button>
        )
      }
    >
      <p>
        {isMarked
          ? 'First the inspection ends, then the coupon is sealed. From the seal on nothing of it changes any more, and it can be cited as evidence.'
          : 'From the seal on nothing of the coupon changes any more, and it can be cited as evidence. Mistakes found later stand beside it as corrections.'}
      </p>
      {act.problem !== undefined && <ActProblem problem={act.problem} />}
      <Missing missing={missing} isMarked={isMarked} />
      {isMarked && unrated !== undefined && (
        <Box mt="3">
          <TextField
            name="unrated-reason"
            label={`Why ${unrated.addresses.length === 1 ? 'this cell is' : 'these cells are'} not rated`}
            help="Rate them on the plate, or give one reason here for all of them."
            maxLength={500}
            value={reason}
            onChange={({ target }) => setReason(target.value)}
          />
        </Box>
      )}
    </Dialog>
  );
}

function Missing({ missing, isMarked }: { missing: readonly MissingItem[]; isMarked: boolean }) {
  if (missing.length === 0) {
    return (
      <Flex gap="2" mt="3" color="brand.fg" align="center">
        <StateShape state="passes" />
        {isMarked ? 'Every cell is rated or skipped, and the criteria are on record.' : 'Nothing is missing.'}
      </Flex>
    );
  }
  return (
    <chakra.ul mt="3" display="grid" gap="2" aria-label="What is missing">
      {missing.map(({ code, text, addresses, isBlocking }) => (
        <chakra.li key={code} display="grid" gridTemplateColumns="24px minmax(0, 1fr)">
          <chakra.span pt="4px" lineHeight="none" color={isBlocking ? 'oxide.fg' : 'straw.fg'}>
            <StateShape state={isBlocking ? 'fails' : 'caution'} />
          </chakra.span>
          <span>
            {text}
            {addresses.length > 0 && (
              <chakra.span display="block" fontSize="sm" lineHeight="sm" color="fg.muted" overflowWrap="anywhere">
                {addresses.join(', ')}
              </chakra.span>
            )}
          </span>
        </chakra.li>
      ))}
    </chakra.ul>
  );
}

function ActProblem({ problem }: { problem: ProblemError }) {
  return (
    <Box mt="3">
      <ProblemNotice
        what={problem.status === 0 ? 'No answer came from the server.' : `${problem.title}.`}
        safe={problem.status === 0 ? 'Whether it was carried out is not known.' : 'The coupon is as it was.'}
        todo={problem.status === 0 ? 'Press again when the connection is back: it is carried out once.' : problem.detail}
      />
    </Box>
  );
}
