import { useMemo } from 'react';
import { useCouponLayout } from '../../../components/plate/evidence-plate';
import { FlatFace } from '../../../components/plate/flat-face';
import { platePhotoOf } from '../../../components/plate/plate-photo';
import { PlateThumbnail } from '../../../components/plate/plate-thumbnail';
import type { PlateCells } from '../../../components/plate/plate-types';
import { type ResponseScale, responseScale } from '../../../components/plate/response-scale';
import type { CouponFace as Face } from '../coupons.api';

const RATING_SCALE: ResponseScale = { isLogarithmic: false, min: 0, max: 5 };

/** The plate of a row: its photo; without one its ratings once there are any, else the dose of its cells. */
export function CouponFace({ face, code }: { face: Face; code: string }) {
  const { rows, columns, cellMm, gapMm, values, shows } = face;
  const layout = useCouponLayout({ rows, columns, cellMm, gapMm, code });
  const photo = platePhotoOf(face.photo, 'small');
  const scale = shows === 'rating' ? RATING_SCALE : responseScale(values.filter((value) => value !== null));
  const cells = useMemo(() => {
    const views: Record<string, PlateCells[string]> = {};
    for (const { address, row, column } of layout.cells) {
      const value = values[row * columns + column] ?? null;
      views[address] = { fill: value === null ? { kind: 'blank' } : { kind: 'response', value, text: '' } };
    }
    return views;
  }, [layout, values, columns]);
  const plate = `Plate of ${code}, ${rows} by ${columns} cells`;
  if (photo !== undefined) return <FlatFace photo={photo} layout={layout} label={`${plate}, photographed`} />;
  const label = `${plate}, coloured by ${shows}`;
  return <PlateThumbnail layout={layout} cells={cells} scale={scale} label={label} />;
}
