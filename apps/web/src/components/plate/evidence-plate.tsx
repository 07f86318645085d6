import { chakra } from '@chakra-ui/react';
import { type CouponLayout, couponLayout } from '@proofplate/imaging';
import { useMemo } from 'react';
import { FlatPhoto, type PlatePhoto } from './flat-photo';
import { Plate } from './plate';
import { PlateRing } from './plate-ring';
import type { PlateCells } from './plate-types';

/** Bare metal around the close-up of a cell, in parts of the cell's side. */
const CLOSE_UP_MARGIN = 0.18;

export type EvidencePlateShape = { rows: number; columns: number; cellMm: number; gapMm: number; code: string };

export function useCouponLayout({ rows, columns, cellMm, gapMm, code }: EvidencePlateShape): CouponLayout {
  return useMemo(() => couponLayout({ rows, columns, cellMm, gapMm, reference: code }), [rows, columns, cellMm, gapMm, code]);
}

export type EvidencePlateProps = {
  shape: EvidencePlateShape;
  /** Absent or without corners: the plate is drawn. */
  photo: PlatePhoto | undefined;
  /** Address of the ringed cell. */
  chosen: string;
  /** Width of the widest plate beside it, mm: all plates of a row share one scale. */
  widestMm?: number;
};

/** The plate that a setting rests on, to scale, with its cell ringed. */
export function EvidencePlate({ shape, photo, chosen, widestMm }: EvidencePlateProps) {
  const layout = useCouponLayout(shape);
  const { widthMm, heightMm } = layout.plate;
  const label = `Coupon ${shape.code}, cell ${chosen} ringed`;
  const chosenCell = layout.cells.find(({ address }) => address === chosen);
  return (
    <chakra.div style={{ width: `${(widthMm / Math.max(widestMm ?? widthMm, widthMm)) * 100}%` }}>
      {photo === undefined ? (
        <Plate layout={layout} cells={NO_CELLS} label={label} code={shape.code} chosen={chosen} />
      ) : (
        <FlatPhoto photo={photo} plate={layout.plate} label={label}>
          <chakra.svg viewBox={`0 0 ${widthMm} ${heightMm}`} position="absolute" inset="0" width="full" height="full" aria-hidden="true">
            {chosenCell !== undefined && <PlateRing rect={chosenCell.rect} weight={1.2} />}
          </chakra.svg>
        </FlatPhoto>
      )}
    </chakra.div>
  );
}

const NO_CELLS: PlateCells = {};

export type CellCloseUpProps = { shape: EvidencePlateShape; photo: PlatePhoto | undefined; address: string };

/** One cell with a rim of bare metal; hatched where no photo shows it. */
export function CellCloseUp({ shape, photo, address }: CellCloseUpProps) {
  const layout = useCouponLayout(shape);
  const cell = layout.cells.find((own) => own.address === address);
  if (cell === undefined || photo === undefined) return <NoPicture label={`Cell ${address} of ${shape.code}, no photo`} />;
  const margin = cell.rect.widthMm * CLOSE_UP_MARGIN;
  const region = {
    xMm: cell.rect.xMm - margin,
    yMm: cell.rect.yMm - margin,
    widthMm: cell.rect.widthMm + 2 * margin,
    heightMm: cell.rect.heightMm + 2 * margin,
  };
  return <FlatPhoto photo={photo} plate={layout.plate} region={region} label={`Cell ${address} of ${shape.code}`} />;
}

function NoPicture({ label }: { label: string }) {
  return (
    <chakra.div
      role="img"
      aria-label={label}
      width="full"
      aspectRatio="1"
      borderRadius="3px"
      border="hairline"
      borderColor="border.emphasized"
      backgroundImage="repeating-linear-gradient(45deg, var(--pp-colors-plate-metal) 0 5px, var(--pp-colors-border-emphasized) 5px 6px)"
    />
  );
}
