import { chakra } from '@chakra-ui/react';
import type { LayoutCell, RectMm } from '@proofplate/imaging';
import { type KeyboardEvent, type MouseEvent, useId, useMemo, useRef } from 'react';
import { PlateCell } from './plate-cell';
import { addressAfterKey } from './plate-keys';
import { type Modules, PlateMarks } from './plate-marks';
import { PlateRing } from './plate-ring';
import { BLANK, type PlateCells, type PlateCellView, type PlateLayout } from './plate-types';
import type { ResponseScale } from './response-scale';

const RATING_KEY = /^[0-5]$/;

export type PlateProps = {
  layout: PlateLayout;
  cells: PlateCells;
  /** Accessible name: "Coupon C-0117, 8 rows, 8 columns". */
  label: string;
  /** Burnt at the lower left. */
  code?: string;
  dataMatrix?: Modules;
  /** Needed when a cell shows a response. */
  scale?: ResponseScale | undefined;
  /** Rectified photograph of the whole plate. */
  photoUrl?: string | undefined;
  /** A photo lies under the drawing: neither metal nor marks are drawn. */
  isOverPhoto?: boolean;
  /** Ground of the plate, when it is not bare metal. */
  groundColour?: string;
  chosen?: string | undefined;
  isRatingShown?: boolean;
  /** With it the plate is a grid that is moved through; without it a picture. */
  onChoose?: (address: string) => void;
  /** Enter, or a second press on the chosen cell. */
  onOpen?: (address: string) => void;
  /** Keys 0 to 5. */
  onRate?: (address: string, rating: number) => void;
};

/** The plate to scale, one millimetre of metal one unit of the drawing. */
export function Plate(props: PlateProps) {
  const { layout, label, chosen, photoUrl, isOverPhoto = false, groundColour, code, dataMatrix, onChoose } = props;
  const { widthMm, heightMm } = layout.plate;
  const hatchId = useId();
  const chosenCell = layout.cells.find(({ address }) => address === chosen);
  return (
    <chakra.svg
      viewBox={`0 0 ${widthMm} ${heightMm}`}
      display="block"
      width="full"
      height="auto"
      fontFamily="body"
      {...(onChoose === undefined ? { role: 'img', 'aria-label': label } : {})}
    >
      <defs>
        <Hatch id={hatchId} />
      </defs>
      {!isOverPhoto && (
        <>
          <chakra.rect
            x="0.15"
            y="0.15"
            width={`${widthMm - 0.3}`}
            height={`${heightMm - 0.3}`}
            rx={1}
            fill={groundColour ?? 'plate.metal'}
            stroke="plate.edge"
            strokeWidth="0.3"
          />
          {photoUrl === undefined ? (
            <PlateMarks layout={layout} code={code} dataMatrix={dataMatrix} />
          ) : (
            <image href={photoUrl} x="0" y="0" width={widthMm} height={heightMm} preserveAspectRatio="none" />
          )}
        </>
      )}
      <PlateGrid {...props} hatchId={hatchId} />
      {chosenCell !== undefined && <PlateRing rect={chosenCell.rect} />}
    </chakra.svg>
  );
}

function PlateGrid({ layout, cells, label, scale, chosen, isRatingShown = true, hatchId, ...on }: PlateProps & { hatchId: string }) {
  const grid = useRef<SVGGElement>(null);
  const rows = useMemo(() => Array.from({ length: layout.rows }, (_, row) => layout.cells.filter((cell) => cell.row === row)), [layout]);
  const isGrid = on.onChoose !== undefined;
  const stopCell = layout.cells.find(({ address }) => address === chosen) ?? layout.cells[0];
  const stop = stopCell?.address;

  const handleKeyDown = (event: KeyboardEvent<SVGGElement>) => {
    if (stop === undefined || event.altKey) return;
    const next = addressAfterKey(stop, { key: event.key, isCtrl: event.ctrlKey || event.metaKey }, layout);
    if (next !== undefined) {
      event.preventDefault();
      on.onChoose?.(next);
      cellElement(grid.current, next)?.focus();
    }
    if (event.key === 'Enter') on.onOpen?.(stop);
    if (RATING_KEY.test(event.key) && !event.ctrlKey && !event.metaKey) on.onRate?.(stop, Number(event.key));
  };
  const handleClick = (event: MouseEvent<SVGGElement>) => {
    const address = addressAt(event.target);
    if (address === undefined) return;
    if (address === chosen) on.onOpen?.(address);
    on.onChoose?.(address);
    cellElement(grid.current, address)?.focus();
  };

  return (
    <chakra.g
      ref={grid}
      {...(isGrid
        ? {
            role: 'grid',
            'aria-label': label,
            'aria-rowcount': layout.rows,
            'aria-colcount': layout.columns,
            onKeyDown: handleKeyDown,
            onClick: handleClick,
          }
        : { 'aria-hidden': true })}
      css={GRID_STYLE}
    >
      {rows.map((rowCells, row) => (
        <g key={rowCells[0]?.address ?? row} {...(isGrid ? { role: 'row', 'aria-rowindex': row + 1 } : {})}>
          {rowCells.map((cell) => {
            const view = cells[cell.address] ?? BLANK;
            const own = { cell, view, scale, hatchId, isRatingShown };
            if (!isGrid) return <PlateCell key={cell.address} {...own} />;
            return (
              <g key={cell.address} {...gridCell(cell, view, { isChosen: cell.address === chosen, isStop: cell.address === stop })}>
                <PlateCell {...own} />
              </g>
            );
          })}
        </g>
      ))}
      {isGrid && stopCell !== undefined && <FocusFrame rect={stopCell.rect} />}
    </chakra.g>
  );
}

// An outline is drawn in whole pixels of the drawing, which are millimetres here: far too thick. The focus has a rectangle instead.
const GRID_STYLE = {
  '& [role=gridcell]': { cursor: 'pointer', outline: 'none' },
  '& [data-focus]': { visibility: 'hidden' },
  '&:has([role=gridcell]:focus-visible) [data-focus]': { visibility: 'visible' },
} as const;

const FOCUS_REACH_MM = 1.05;

function FocusFrame({ rect }: { rect: RectMm }) {
  return (
    <chakra.rect
      data-focus=""
      x={rect.xMm - FOCUS_REACH_MM}
      y={rect.yMm - FOCUS_REACH_MM}
      width={`${rect.widthMm + 2 * FOCUS_REACH_MM}`}
      height={`${rect.heightMm + 2 * FOCUS_REACH_MM}`}
      rx={0.6}
      fill="none"
      stroke="#1D3F78"
      strokeWidth="0.35"
      pointerEvents="none"
    />
  );
}

/** Diagonal lines on the metal: nothing was measured here. */
export function Hatch({ id }: { id: string }) {
  return (
    <pattern id={id} width="1.2" height="1.2" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
      <chakra.rect width="1.2" height="1.2" fill="plate.metal" />
      <chakra.path d="M0 0v1.2" stroke="plate.mark" strokeWidth="0.5" />
    </pattern>
  );
}

function gridCell(cell: LayoutCell, view: PlateCellView, { isChosen, isStop }: { isChosen: boolean; isStop: boolean }) {
  return {
    role: 'gridcell',
    'data-address': cell.address,
    'aria-label': spokenCell(cell.address, view),
    'aria-colindex': cell.column + 1,
    'aria-selected': isChosen,
    tabIndex: isStop ? 0 : -1,
  };
}

function spokenCell(address: string, view: PlateCellView): string {
  return [
    address,
    view.description,
    view.fill.kind === 'missing' ? 'not measured' : undefined,
    view.rating === undefined ? undefined : `rated ${view.rating}`,
    view.isFlagged === true ? 'above a limit' : undefined,
  ]
    .filter((part) => part !== undefined && part !== '')
    .join(', ');
}

function cellElement(grid: SVGGElement | null, address: string): SVGGElement | null {
  return grid?.querySelector<SVGGElement>(`[data-address="${CSS.escape(address)}"]`) ?? null;
}

function addressAt(target: EventTarget): string | undefined {
  return target instanceof Element ? (target.closest('[data-address]')?.getAttribute('data-address') ?? undefined) : undefined;
}
