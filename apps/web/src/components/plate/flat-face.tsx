import { chakra } from '@chakra-ui/react';
import type { CouponLayout, RectMm } from '@proofplate/imaging';
import { FlatPhoto, type PlatePhoto } from './flat-photo';
import { PlateRing } from './plate-ring';

const HEIGHT_PX = 40;
const WIDEST_PX = 54;
/** Between the cells and the letters that are burnt beside them. */
const MARGIN_MM = 1.2;

export type FlatFaceProps = {
  photo: PlatePhoto;
  layout: CouponLayout;
  label: string;
  /** Address of the ringed cell. */
  chosen?: string;
};

/** The plate's face in a row, photographed: the cells alone, without letters and marks. */
export function FlatFace({ photo, layout, label, chosen }: FlatFaceProps) {
  const region = cellsRegion(layout.cells.map(({ rect }) => rect));
  const chosenCell = layout.cells.find(({ address }) => address === chosen);
  const width = Math.min(WIDEST_PX, (HEIGHT_PX * region.widthMm) / region.heightMm);
  return (
    <chakra.div style={{ width }}>
      <FlatPhoto photo={photo} plate={layout.plate} region={region} label={label}>
        {chosenCell !== undefined && (
          <chakra.svg
            viewBox={`${region.xMm} ${region.yMm} ${region.widthMm} ${region.heightMm}`}
            position="absolute"
            inset="0"
            width="full"
            height="full"
            aria-hidden="true"
          >
            <PlateRing rect={chosenCell.rect} weight={Math.max(1.7, region.widthMm / 15)} />
          </chakra.svg>
        )}
      </FlatPhoto>
    </chakra.div>
  );
}

function cellsRegion(rects: readonly RectMm[]): RectMm {
  const left = Math.min(...rects.map(({ xMm }) => xMm)) - MARGIN_MM;
  const top = Math.min(...rects.map(({ yMm }) => yMm)) - MARGIN_MM;
  const right = Math.max(...rects.map(({ xMm, widthMm }) => xMm + widthMm)) + MARGIN_MM;
  const bottom = Math.max(...rects.map(({ yMm, heightMm }) => yMm + heightMm)) + MARGIN_MM;
  return { xMm: left, yMm: top, widthMm: right - left, heightMm: bottom - top };
}
