import { useCouponLayout } from '../../../components/plate/evidence-plate';
import { FlatFace } from '../../../components/plate/flat-face';
import { platePhotoOf } from '../../../components/plate/plate-photo';
import { PlateThumbnail } from '../../../components/plate/plate-thumbnail';
import type { RecipeFace as Face } from '../recipes.api';

/** The plate's face in a row: the cells alone, the cell that stands for the recipe ringed. */
export function RecipeFace({ face }: { face: Face }) {
  const { rows, columns, cellMm, gapMm, couponCode: code, address } = face;
  const layout = useCouponLayout({ rows, columns, cellMm, gapMm, code });
  const photo = platePhotoOf(face.photo, 'small');
  const label = `Coupon ${code}, cell ${address}`;
  if (photo === undefined) return <PlateThumbnail layout={layout} cells={NO_CELLS} chosen={address} label={label} />;
  return <FlatFace photo={photo} layout={layout} chosen={address} label={label} />;
}

const NO_CELLS = {};
