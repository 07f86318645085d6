import { chakra } from '@chakra-ui/react';
import type { RectMm } from '@proofplate/imaging';
import { type ReactNode, useLayoutEffect, useRef, useState } from 'react';
import { flatteningTransform, type PhotoPoint } from './photo-homography';

/** Layout size of the picture before its transform; only the proportion matters. */
const PICTURE_WIDTH_PX = 1000;

export type PlatePhoto = {
  url: string;
  widthPx: number;
  heightPx: number;
  /** Corners of the plate in the picture, clockwise from the origin mark. */
  corners: readonly PhotoPoint[];
};

export type FlatPhotoProps = {
  photo: PlatePhoto;
  plate: { widthMm: number; heightMm: number };
  /** Part of the plate; absent: the whole. */
  region?: RectMm;
  label: string;
  /** Drawn over the photo, in the same box. */
  children?: ReactNode;
};

/** A photograph laid flat on the plate's own millimetres; its colours stay as they are. */
export function FlatPhoto({ photo, plate, region, label, children }: FlatPhotoProps) {
  const box = useRef<HTMLDivElement>(null);
  const widthPx = useWidth(box);
  const shown = region ?? { xMm: 0, yMm: 0, ...plate };
  const picturePx = { width: PICTURE_WIDTH_PX, height: (PICTURE_WIDTH_PX * photo.heightPx) / photo.widthPx };
  const [p0, p1, p2, p3] = photo.corners;
  const transform =
    p0 === undefined || p1 === undefined || p2 === undefined || p3 === undefined
      ? undefined
      : flatteningTransform({ corners: [p0, p1, p2, p3], plate, region: shown, pxPerMm: widthPx / shown.widthMm, picturePx });
  return (
    <chakra.div
      ref={box}
      role="img"
      aria-label={label}
      position="relative"
      width="full"
      overflow="hidden"
      borderRadius="3px"
      bg="plate.metal"
      style={{ aspectRatio: `${shown.widthMm} / ${shown.heightMm}` }}
    >
      {transform !== undefined && (
        <chakra.img
          src={photo.url}
          alt=""
          position="absolute"
          left="0"
          top="0"
          maxWidth="none"
          transformOrigin="0 0"
          style={{ width: picturePx.width, height: picturePx.height, transform }}
        />
      )}
      {children}
    </chakra.div>
  );
}

/** Width of the box in pixels, followed as it changes; 0 until it is known. */
function useWidth(box: { current: HTMLDivElement | null }): number {
  const [width, setWidth] = useState(0);
  useLayoutEffect(() => {
    const element = box.current;
    if (element === null) return undefined;
    setWidth(element.clientWidth);
    if (typeof ResizeObserver === 'undefined') return undefined;
    const observer = new ResizeObserver(() => setWidth(element.clientWidth));
    observer.observe(element);
    return () => observer.disconnect();
  }, [box]);
  return width;
}
