import { Box, chakra } from '@chakra-ui/react';
import { OUTCOME_LABELS } from '@proofplate/recipe-model';
import { Button } from '../../../../components/button';
import { Dialog } from '../../../../components/dialog';
import type { OwnRating } from '../log.api';
import type { RatingConflict } from '../rating-queue';

export type ConflictDialogProps = { address: string; conflict: RatingConflict; onSettle: (keepsMine: boolean) => void };

/** The same person rated the same cell somewhere else: both values stand side by side, nothing is overwritten by itself. */
export function ConflictDialog({ address, conflict: { yours, current }, onSettle }: ConflictDialogProps) {
  return (
    <Dialog
      title={`${address} was rated somewhere else meanwhile`}
      width="wide"
      onClose={() => onSettle(false)}
      actions={
        <>
          <Button onClick={() => onSettle(false)}>Keep the stored one</Button>
          <Button kind="primary" onClick={() => onSettle(true)}>
            Take the one from here
          </Button>
        </>
      }
    >
      <p>You rated this cell on another screen after this page was loaded. Choose which of the two holds.</p>
      <Box display="grid" gridTemplateColumns={{ base: '1fr', sm: '1fr 1fr' }} gap="4" mt="3">
        <Side title="From here" rating={yours} />
        <Side title="Stored" rating={current} />
      </Box>
    </Dialog>
  );
}

function Side({ title, rating }: { title: string; rating: OwnRating | null }) {
  return (
    <Box border="hairline" borderRadius="md" p="3">
      <chakra.h3>{title}</chakra.h3>
      {rating === null ? (
        <p>Nothing</p>
      ) : (
        <>
          <chakra.p fontSize="3xl" lineHeight="2xl" fontWeight="bold">
            {rating.rating ?? 'no rating'}
          </chakra.p>
          <chakra.p color="fg.muted" overflowWrap="anywhere">
            {[rating.outcome === null ? '' : OUTCOME_LABELS[rating.outcome].toLowerCase(), ...rating.tags, rating.note]
              .filter((part) => part !== '')
              .join(', ')}
          </chakra.p>
        </>
      )}
    </Box>
  );
}
