import { Box, chakra } from '@chakra-ui/react';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { ProblemNotice } from '../../../components/problem-notice';
import type { ProblemError } from '../../../lib/api';
import { formatDay, formatPercentChange, formatQuantity } from '../../../lib/format';
import { useAct } from '../use-act';
import { type CraterPlace, type CraterSpot, readSpotsAgain, saveCraterSpot } from './craters.api';

type SaveSpotDialogProps = { couponId: string; spot: CraterSpot; place: CraterPlace; onClose: () => void; onSaved: () => void };

/** Old and new side by side before the machine takes the new one. */
export function SaveSpotDialog({ couponId, spot, place, onClose, onSaved }: SaveSpotDialogProps) {
  const act = useAct();
  const handleSave = () =>
    act.run(async (idempotencyKey) => {
      await saveCraterSpot(couponId, { spot, place }, idempotencyKey);
      onSaved();
    });
  return (
    <Dialog
      title={`Measured spot of ${place.machineName} with ${place.lensName}`}
      width="wide"
      onClose={onClose}
      actions={
        <>
          <Button onClick={onClose}>Keep the old one</Button>
          <Button kind="primary" isBusy={act.isBusy} onClick={() => void handleSave()}>
            Save {formatQuantity(spot.diameterUm, 'um')}
          </Button>
        </>
      }
    >
      <Box display="grid" gap="3" gridTemplateColumns={{ base: 'minmax(0, 1fr)', sm: 'repeat(2, minmax(0, 1fr))' }}>
        <Old place={place} />
        <Spot title="New" diameterUm={spot.diameterUm} method={spot.method} day={spot.measuredOn} change={changeOf(spot, place)} />
      </Box>
      <chakra.p mt="3">
        Fluence, overlap and dose of every setting on this machine with this lens are worked out with the spot in use, so they move with it.
        What is set and signed in recipes stays as it is. The old spot stays in the machine’s history.
      </chakra.p>
      {act.problem !== undefined && <SaveProblem problem={act.problem} onRead={() => void readSpotsAgain(couponId)} />}
    </Dialog>
  );
}

function Old({ place: { measuredSpotUm, spotMethod, spotMeasuredOn } }: { place: CraterPlace }) {
  if (measuredSpotUm !== null) return <Spot title="Old" diameterUm={measuredSpotUm} method={spotMethod ?? ''} day={spotMeasuredOn} />;
  return (
    <chakra.section aria-label="Old">
      <chakra.h3 color="fg.muted">Old</chakra.h3>
      <p>Nobody has measured one: the spot is worked out from beam and lens.</p>
    </chakra.section>
  );
}

type SpotProps = { title: string; diameterUm: number; method: string; day: string | null; change?: string | undefined };

function Spot({ title, diameterUm, method, day, change }: SpotProps) {
  return (
    <chakra.section aria-label={title}>
      <chakra.h3 color="fg.muted">{title}</chakra.h3>
      <chakra.p fontSize="xl" lineHeight="xl" fontWeight="semibold">
        {formatQuantity(diameterUm, 'um')}
        {change !== undefined && (
          <chakra.span fontSize="md" fontWeight="normal">
            {' '}
            {change}
          </chakra.span>
        )}
      </chakra.p>
      <chakra.p color="fg.muted">
        {method}
        {day !== null && `, ${formatDay(day)}`}
      </chakra.p>
    </chakra.section>
  );
}

function changeOf({ diameterUm }: CraterSpot, { measuredSpotUm }: CraterPlace): string | undefined {
  if (measuredSpotUm === null) return undefined;
  return `(${formatPercentChange(diameterUm / measuredSpotUm - 1, { decimals: 1 })})`;
}

function SaveProblem({ problem, onRead }: { problem: ProblemError; onRead: () => void }) {
  const isLost = problem.status === 0;
  return (
    <Box mt="3">
      <ProblemNotice
        what={isLost ? 'No answer came from the server.' : `${problem.title}.`}
        safe={isLost ? 'Whether the spot was saved is not known.' : 'The measured spot is as it was.'}
        todo={isLost ? 'Press again when the connection is back: it is saved once.' : problem.detail}
        actions={!isLost && <Button onClick={onRead}>Read the craters and the lens again</Button>}
      />
    </Box>
  );
}
