import { chakra, Flex } from '@chakra-ui/react';
import { FILL_LABELS } from '@proofplate/recipe-model';
import { type ReactNode, useState } from 'react';
import { ActBar } from '../../../components/act-bar';
import { Button } from '../../../components/button';
import { ProblemNotice } from '../../../components/problem-notice';
import { VisuallyHidden } from '../../../components/visually-hidden';
import type { Coupon, CouponCell, ShopCaution } from '../coupons.api';
import { CoolDown, CoolDownSetting, useCoolDownSetting, useSecondsLeft } from './cool-down';
import { DialList } from './dial-list';
import { DiffersDialog } from './differs-dialog';
import { MarkCautions } from './mark-cautions';
import { cellSetBefore, dialRows, lastDone, notOnPanel } from './marking-order';
import { PausedNotice, usePause } from './pause';
import { SkipDialog } from './skip-dialog';
import type { Marking } from './use-marking';

export type MarkCellsProps = {
  coupon: Coupon;
  ordered: readonly CouponCell[];
  current: CouponCell;
  /** They stand before the setting. */
  cautions: readonly ShopCaution[];
  marking: Marking;
  locale: string;
  clock: ReactNode;
};

/** One cell at a time, in the order of the run. */
export function MarkCells({ coupon, ordered, current, cautions, marking, locale, clock }: MarkCellsProps) {
  const [open, setOpen] = useState<'differs' | 'skip'>();
  const [coolDownS, setCoolDownS] = useCoolDownSetting();
  const [coolUntilMs, setCoolUntilMs] = useState<number>();
  const secondsLeft = useSecondsLeft(coolUntilMs);
  const pause = usePause();
  const { panel } = coupon.profile;
  const before = cellSetBefore(ordered, current);
  const set = current.parameters;
  const beforeSet = before === undefined ? undefined : (before.actualParameters ?? before.parameters);
  const coolDown = () => setCoolUntilMs(coolDownS === 0 ? undefined : Date.now() + coolDownS * 1000);
  const undoable = lastDone(ordered);
  const handleMarked = async () => {
    if (await marking.mark(current, { outcome: 'marked' })) coolDown();
  };
  const handleSkip = async (note: string) => {
    if (await marking.mark(current, { outcome: 'skipped', note })) setOpen(undefined);
  };
  if (pause.isPaused) return <PausedNotice pause={pause} />;
  return (
    // the bar of two rows is taller than the foot of a page allows for; nothing may stay under it
    <chakra.div display="grid" gap="3" maxW="640px" pb={{ base: '24', lg: '0' }}>
      <MarkCautions cautions={cautions} />
      <CellHead current={current} ordered={ordered} />
      <chakra.p role="status" color="fg.muted" _empty={{ display: 'none' }}>
        {marking.note}
      </chakra.p>
      {marking.problem !== undefined && open === undefined && (
        <ProblemNotice
          what={`${marking.problem.address} was not saved.`}
          safe="Every cell before it is kept."
          todo={marking.problem.error.detail}
          actions={
            <Button size="glove" onClick={marking.retry}>
              Try again
            </Button>
          }
        />
      )}
      <CoolDown secondsLeft={secondsLeft} onSkip={() => setCoolUntilMs(undefined)} />
      <DialList label={`Setting of ${current.address}`} rows={dialRows(panel, set, beforeSet)} isFirst={before === undefined} />
      <NotDialled coupon={coupon} current={current} />
      <Flex gap="3" align="center" justify="space-between" wrap="wrap">
        <CoolDownSetting seconds={coolDownS} locale={locale} onChange={setCoolDownS} />
        <Flex gap="2" wrap="wrap">
          {clock}
          <Button size="glove" onClick={pause.begin}>
            Pause
          </Button>
        </Flex>
      </Flex>
      <ActBar>
        <chakra.div display="grid" gridTemplateColumns="repeat(3, minmax(0, 1fr))" gap="2" css={{ '& > *': { px: '2' } }}>
          <Button size="glove" disabled={undoable === undefined} onClick={() => undoable !== undefined && void marking.undo(undoable)}>
            Undo {undoable?.address}
          </Button>
          <Button size="glove" onClick={() => setOpen('differs')}>
            Differs
          </Button>
          <Button size="glove" onClick={() => setOpen('skip')}>
            Skip
          </Button>
          <Button kind="primary" size="primaryAct" gridColumn="1 / -1" isBusy={marking.isBusy} onClick={() => void handleMarked()}>
            {current.address} marked
          </Button>
        </chakra.div>
      </ActBar>
      {open === 'differs' && (
        <DiffersDialog
          cell={current}
          panel={panel}
          locale={locale}
          onClose={() => setOpen(undefined)}
          onDiffers={async (differs) => {
            await marking.markOrThrow(current, { outcome: 'differs', ...differs });
            setOpen(undefined);
            coolDown();
          }}
        />
      )}
      {open === 'skip' && (
        <SkipDialog
          address={current.address}
          isBusy={marking.isBusy}
          problem={marking.problem === undefined ? undefined : `Not saved. ${marking.problem.error.detail}`}
          onClose={() => setOpen(undefined)}
          onSkip={(note) => void handleSkip(note)}
        />
      )}
    </chakra.div>
  );
}

function CellHead({ current, ordered }: { current: CouponCell; ordered: readonly CouponCell[] }) {
  const done = ordered.filter(({ markState }) => markState !== 'planned').length;
  return (
    <Flex align="baseline" justify="space-between" gap="4" aria-live="polite">
      <chakra.h2 fontSize="5xl" lineHeight="5xl">
        <VisuallyHidden>Cell </VisuallyHidden>
        {current.address}
      </chakra.h2>
      <chakra.span color="fg.muted">
        {done} of {ordered.length} done
      </chakra.span>
    </Flex>
  );
}

/** What the panel has no field for, and how the square is filled: not dialled in, but not to be forgotten. */
function NotDialled({ coupon, current: { parameters } }: { coupon: Coupon; current: CouponCell }) {
  const missing = notOnPanel(coupon.profile.panel, parameters);
  const drawnBy = coupon.grids[0]?.fillDrawnBy === 'artwork' ? 'drawn in the artwork' : 'drawn by the machine';
  return (
    <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
      Fill: {FILL_LABELS[parameters.fill].toLowerCase()}, {drawnBy}.{missing.length > 0 && ` Not on this panel: ${missing.join(', ')}.`}
    </chakra.p>
  );
}
