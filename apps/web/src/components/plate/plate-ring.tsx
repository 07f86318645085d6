import { chakra } from '@chakra-ui/react';
import type { RectMm } from '@proofplate/imaging';

/** Ring around the chosen cell: yellow between two dark lines, outside the cell so that it never tints what was burnt. */
export function PlateRing({ rect, weight = 1 }: { rect: RectMm; weight?: number }) {
  const reach = 0.3 * weight;
  const place = {
    x: rect.xMm - reach,
    y: rect.yMm - reach,
    width: `${rect.widthMm + 2 * reach}`,
    height: `${rect.heightMm + 2 * reach}`,
    rx: 0.3,
    fill: 'none',
    pointerEvents: 'none',
  } as const;
  return (
    <chakra.g aria-hidden="true">
      <chakra.rect {...place} stroke="plate.ringLine" strokeWidth={`${0.9 * weight}`} />
      <chakra.rect {...place} stroke="plate.ring" strokeWidth={`${0.51 * weight}`} />
    </chakra.g>
  );
}
