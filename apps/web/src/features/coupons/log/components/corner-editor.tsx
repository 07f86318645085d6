import { Box, chakra, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../../components/button';
import { Dialog } from '../../../../components/dialog';
import { useCouponLayout } from '../../../../components/plate/evidence-plate';
import { FlatPhoto } from '../../../../components/plate/flat-photo';
import { Plate } from '../../../../components/plate/plate';
import { ProblemNotice } from '../../../../components/problem-notice';
import { Switch } from '../../../../components/switch';
import { ProblemError } from '../../../../lib/api';
import type { Coupon, TestGrid } from '../../coupons.api';
import {
  CORNER_NAMES,
  type CornerHistory,
  type Corners,
  isComplete,
  moved,
  nudgeOf,
  placed,
  startCorners,
  undone,
  withChange,
  withoutTrace,
} from '../corner-history';
import { type Photo, setCorners } from '../log.api';
import { CornerStage } from './corner-stage';

/** Two lines of words and the quiet button below them, as the first step needs on a narrow screen. */
const HEAD_HEIGHT = { base: '112px', sm: '72px', lg: '48px' };

const NUDGES = [
  { key: 'ArrowLeft', label: 'left', sign: '←' },
  { key: 'ArrowUp', label: 'up', sign: '↑' },
  { key: 'ArrowDown', label: 'down', sign: '↓' },
  { key: 'ArrowRight', label: 'right', sign: '→' },
] as const;

export type CornerEditorProps = { coupon: Coupon; grid: TestGrid; photo: Photo; onClose: () => void; onSaved: () => void };

/** Says where the plate lies in a photo. The photo itself stays as it is: corners are kept as fractions of it. */
export function CornerEditor({ coupon, grid, photo, onClose, onSaved }: CornerEditorProps) {
  const [history, setHistory] = useState<CornerHistory>({ present: photo.corners ?? [], past: [] });
  const [active, setActive] = useState(0);
  const [isGridShown, setIsGridShown] = useState(true);
  const [isNudging, setIsNudging] = useState(false);
  const [isBusy, setIsBusy] = useState(false);
  const [problem, setProblem] = useState<ProblemError>();
  const corners = history.present;
  const { urls, widthPx, heightPx } = photo;
  if (urls === null || widthPx === null || heightPx === null) return null;

  const change = (next: Corners) => setHistory((before) => withChange(before, next));
  const handlePlace = (point: { x: number; y: number }) => {
    if (isComplete(corners)) return;
    change(placed(corners, point));
    setActive(corners.length);
  };
  const handleNudge = (key: string) => {
    const step = nudgeOf(key, false);
    const corner = corners[active];
    if (step === undefined || corner === undefined) return;
    change(moved(corners, active, { x: corner.x + step.x / widthPx, y: corner.y + step.y / heightPx }));
  };
  const handleSave = async () => {
    setIsBusy(true);
    setProblem(undefined);
    try {
      await setCorners(photo, corners);
      onSaved();
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      setProblem(error);
      setIsBusy(false);
    }
  };
  return (
    <Dialog
      title="Corners of the plate"
      width="broad"
      onClose={onClose}
      actions={
        <>
          <Button disabled={history.past.length === 0} onClick={() => setHistory(undone)}>
            Undo
          </Button>
          <Button onClick={() => change([])}>Place them anew</Button>
          <Button kind="primary" disabled={!isComplete(corners)} isBusy={isBusy} onClick={() => void handleSave()}>
            Save the corners
          </Button>
        </>
      }
    >
      {problem !== undefined && (
        <ProblemNotice what={`${problem.title}.`} safe="The corners that you set are still here." todo={cornerProblemWords(problem)} />
      )}
      <NextCorner corners={corners} onStart={() => change(startCorners)} />
      <Box display="grid" gridTemplateColumns={{ base: '1fr', md: 'minmax(0, 1.7fr) minmax(0, 1fr)' }} gap="5" mt="3">
        <CornerStage
          url={urls.large}
          widthPx={widthPx}
          heightPx={heightPx}
          corners={corners}
          active={active}
          isNudging={isNudging}
          onActive={setActive}
          onPlace={handlePlace}
          onMove={(index, point, isStart) =>
            setHistory((before) => (isStart ? withChange : withoutTrace)(before, moved(before.present, index, point)))
          }
        />
        <Box onFocus={() => setIsNudging(true)} onBlur={() => setIsNudging(false)}>
          <NudgeButtons active={active} isDisabled={corners[active] === undefined} onNudge={handleNudge} />
        </Box>
        <Box gridColumn={{ md: '2' }}>
          {isComplete(corners) && (
            <>
              <Flex justify="space-between" align="center" mt="3" mb="1.5" fontSize="sm">
                <chakra.span fontWeight="semibold">Laid flat</chakra.span>
                <Switch label="Cells over it" isOn={isGridShown} onChange={setIsGridShown} />
              </Flex>
              <FlatPreview coupon={coupon} grid={grid} photo={{ url: urls.large, widthPx, heightPx, corners }} isGridShown={isGridShown} />
            </>
          )}
        </Box>
      </Box>
    </Dialog>
  );
}

function NextCorner({ corners, onStart }: { corners: Corners; onStart: () => void }) {
  // one height for every step: the picture must not move under the finger
  if (isComplete(corners)) {
    return (
      <Flex align="center" minHeight={HEAD_HEIGHT}>
        <chakra.p color="fg.muted">Drag a corner, or choose it and press the arrow keys: 1 pixel, with Shift 10.</chakra.p>
      </Flex>
    );
  }
  return (
    <Flex columnGap="3" align="center" wrap="wrap" role="status" minHeight={HEAD_HEIGHT}>
      <span>
        Press corner {corners.length + 1} of the plate: the one <b>{CORNER_NAMES[corners.length]}</b>, on the edge of the metal.
        {corners.length === 0 && ' The origin mark stands next to A1, where the letters and the numbers begin.'}
      </span>
      {corners.length === 0 && (
        <Button kind="quiet" px="0" onClick={onStart}>
          Place all four, then move them
        </Button>
      )}
    </Flex>
  );
}

function NudgeButtons({ active, isDisabled, onNudge }: { active: number; isDisabled: boolean; onNudge: (key: string) => void }) {
  return (
    <Box display="grid" gridTemplateColumns="repeat(4, 44px)" gap="2" role="group" aria-label={`Move corner ${active + 1}`}>
      <chakra.span gridColumn="1 / -1" fontSize="sm" fontWeight="semibold">
        Corner {active + 1}
      </chakra.span>
      {NUDGES.map(({ key, label, sign }) => (
        <Button key={key} size="touch" shape="square" aria-label={`One pixel ${label}`} disabled={isDisabled} onClick={() => onNudge(key)}>
          {sign}
        </Button>
      ))}
    </Box>
  );
}

type FlatPreviewProps = {
  coupon: Coupon;
  grid: TestGrid;
  photo: { url: string; widthPx: number; heightPx: number; corners: Corners };
  isGridShown: boolean;
};

function FlatPreview({ coupon, grid: { rows, columns, cellMm, gapMm }, photo, isGridShown }: FlatPreviewProps) {
  const layout = useCouponLayout({ rows, columns, cellMm, gapMm, code: coupon.code });
  const cells = Object.fromEntries(layout.cells.map(({ address }) => [address, { fill: { kind: 'photo' as const } }]));
  return (
    <FlatPhoto photo={photo} plate={layout.plate} label="The plate, laid flat by these corners">
      {isGridShown && (
        <Box position="absolute" inset="0" aria-hidden="true">
          <Plate layout={layout} cells={cells} label="" isOverPhoto />
        </Box>
      )}
    </FlatPhoto>
  );
}

function cornerProblemWords({ status, detail }: ProblemError): string {
  if (status === 0) return 'The server did not answer. Try again when the connection is back.';
  return status === 412
    ? 'Somebody set the corners of this photo meanwhile. Close this, look at them, and set them again if need be.'
    : detail;
}
