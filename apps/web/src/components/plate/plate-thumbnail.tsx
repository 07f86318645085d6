import { chakra } from '@chakra-ui/react';
import { useId, useMemo } from 'react';
import { Hatch } from './plate';
import { PlateCell } from './plate-cell';
import { PlateRing } from './plate-ring';
import { BLANK, type PlateCells, type PlateCellView, type PlateLayout } from './plate-types';
import type { ResponseScale } from './response-scale';

const MARGIN_MM = 3;
/** The ring has to survive at 40 px, so it grows with the plate. */
const RING_WEIGHT_PER_MM = 1 / 22;
const LEAST_RING_WEIGHT = 1.7;

export type PlateThumbnailProps = {
  layout: Pick<PlateLayout, 'cells'>;
  cells: PlateCells;
  scale?: ResponseScale | undefined;
  chosen?: string | undefined;
  groundColour?: string;
  /** Left out where the words beside it say the same. */
  label?: string;
  /** Height in the theme's sizes; the width follows the plate. */
  height?: string;
};

/** The plate's face below 96 px: cells and ring, no letters, no marks. */
export function PlateThumbnail({ layout, cells, scale, chosen, groundColour, label, height = 'control' }: PlateThumbnailProps) {
  const hatchId = useId();
  const frame = useMemo(() => frameOf(layout.cells), [layout]);
  const chosenCell = layout.cells.find(({ address }) => address === chosen);
  return (
    <chakra.svg
      viewBox={`${frame.xMm} ${frame.yMm} ${frame.widthMm} ${frame.heightMm}`}
      height={height}
      width="auto"
      maxWidth="56px"
      display="block"
      {...(label === undefined ? { 'aria-hidden': true } : { role: 'img', 'aria-label': label })}
    >
      <defs>
        <Hatch id={hatchId} />
      </defs>
      <chakra.rect
        x={frame.xMm + 0.2}
        y={frame.yMm + 0.2}
        width={`${frame.widthMm - 0.4}`}
        height={`${frame.heightMm - 0.4}`}
        rx={1.6}
        fill={groundColour ?? 'plate.metal'}
        stroke="plate.edge"
        strokeWidth="0.5"
      />
      {layout.cells.map((cell) => (
        <PlateCell
          key={cell.address}
          cell={cell}
          view={withoutText(cells[cell.address] ?? BLANK)}
          scale={scale}
          hatchId={hatchId}
          isRatingShown={false}
        />
      ))}
      {chosenCell !== undefined && (
        <PlateRing rect={chosenCell.rect} weight={Math.max(LEAST_RING_WEIGHT, frame.widthMm * RING_WEIGHT_PER_MM)} />
      )}
    </chakra.svg>
  );
}

/** Digits would be dust at this size. */
function withoutText(view: PlateCellView): PlateCellView {
  return view.fill.kind === 'response' ? { ...view, fill: { ...view.fill, text: '' } } : view;
}

function frameOf(cells: PlateLayout['cells']) {
  const left = Math.min(...cells.map(({ rect }) => rect.xMm)) - MARGIN_MM;
  const top = Math.min(...cells.map(({ rect }) => rect.yMm)) - MARGIN_MM;
  const right = Math.max(...cells.map(({ rect }) => rect.xMm + rect.widthMm)) + MARGIN_MM;
  const bottom = Math.max(...cells.map(({ rect }) => rect.yMm + rect.heightMm)) + MARGIN_MM;
  return { xMm: left, yMm: top, widthMm: right - left, heightMm: bottom - top };
}
