import { chakra } from '@chakra-ui/react';
import type { RectMm } from '@proofplate/imaging';
import { useCouponLayout } from '../../../components/plate/evidence-plate';
import { FlatPhoto } from '../../../components/plate/flat-photo';
import { platePhotoOf } from '../../../components/plate/plate-photo';
import { PlateRing } from '../../../components/plate/plate-ring';
import { PlateThumbnail } from '../../../components/plate/plate-thumbnail';
import type { RecipeFace as Face } from '../recipes.api';

const HEIGHT_PX = 40;
const WIDEST_PX = 54;
/** Between the cells and the letters that are burnt beside them. */
const MARGIN_MM = 1.2;

/** The plate's face in a row: the cells alone, the cell that stands for the recipe ringed. */
export function RecipeFace({ face }: { face: Face }) {
  const { rows, columns, cellMm, gapMm, couponCode: code } = face;
  const layout = useCouponLayout({ rows, columns, cellMm, gapMm, code });
  const photo = platePhotoOf(face.photo, 'small');
  const label = `Coupon ${code}, cell ${face.address}`;
  if (photo === undefined) return <PlateThumbnail layout={layout} cells={NO_CELLS} chosen={face.address} label={label} />;
  const region = cellsRegion(layout.cells.map(({ rect }) => rect));
  const chosen = layout.cells.find(({ address }) => address === face.address);
  const width = Math.min(WIDEST_PX, (HEIGHT_PX * region.widthMm) / region.heightMm);
  return (
    <chakra.div style={{ width }}>
      <FlatPhoto photo={photo} plate={layout.plate} region={region} label={label}>
        <chakra.svg
          viewBox={`${region.xMm} ${region.yMm} ${region.widthMm} ${region.heightMm}`}
          position="absolute"
          inset="0"
          width="full"
          height="full"
          aria-hidden="true"
        >
          {chosen !== undefined && <PlateRing rect={chosen.rect} weight={Math.max(1.7, region.widthMm / 15)} />}
        </chakra.svg>
      </FlatPhoto>
    </chakra.div>
  );
}

const NO_CELLS = {};

function cellsRegion(rects: readonly RectMm[]): RectMm {
  const left = Math.min(...rects.map(({ xMm }) => xMm)) - MARGIN_MM;
  const top = Math.min(...rects.map(({ yMm }) => yMm)) - MARGIN_MM;
  const right = Math.max(...rects.map(({ xMm, widthMm }) => xMm + widthMm)) + MARGIN_MM;
  const bottom = Math.max(...rects.map(({ yMm, heightMm }) => yMm + heightMm)) + MARGIN_MM;
  return { xMm: left, yMm: top, widthMm: right - left, heightMm: bottom - top };
}
