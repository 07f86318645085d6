import { couponLayout } from '@proofplate/imaging';
import { useMemo } from 'react';
import { PlateThumbnail } from '../../../components/plate/plate-thumbnail';
import type { PlateCells } from '../../../components/plate/plate-types';
import { type ResponseScale, responseScale } from '../../../components/plate/response-scale';
import type { CouponFace as Face } from '../coupons.api';

const RATING_SCALE: ResponseScale = { isLogarithmic: false, min: 0, max: 5 };

/** The plate of a row: its ratings once there are any, else the dose of its cells. */
export function CouponFace({ face, code, height }: { face: Face; code: string; height?: string }) {
  const { rows, columns, values, shows } = face;
  const layout = useMemo(() => couponLayout({ rows, columns, reference: code }), [rows, columns, code]);
  const scale = shows === 'rating' ? RATING_SCALE : responseScale(values.filter((value) => value !== null));
  const cells = useMemo(() => {
    const views: Record<string, PlateCells[string]> = {};
    for (const { address, row, column } of layout.cells) {
      const value = values[row * columns + column] ?? null;
      views[address] = { fill: value === null ? { kind: 'blank' } : { kind: 'response', value, text: '' } };
    }
    return views;
  }, [layout, values, columns]);
  const label = `Plate of ${code}, ${rows} by ${columns} cells, coloured by ${shows}`;
  return <PlateThumbnail layout={layout} cells={cells} scale={scale} label={label} {...(height === undefined ? {} : { height })} />;
}
