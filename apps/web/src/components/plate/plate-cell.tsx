import { chakra } from '@chakra-ui/react';
import type { LayoutCell } from '@proofplate/imaging';
import { memo } from 'react';
import { cividis, inkOn } from './cividis';
import type { PlateCellView } from './plate-types';
import { type ResponseScale, scalePosition } from './response-scale';

const FLAG_SHARE = 0.34;
const MOST_DIGITS_AT_FULL_SIZE = 4;

export type PlateCellProps = {
  cell: LayoutCell;
  view: PlateCellView;
  scale: ResponseScale | undefined;
  hatchId: string;
  isRatingShown: boolean;
};

/** What stands in one cell; where it stands and who may choose it is the plate's. */
export const PlateCell = memo(function PlateCell({ cell, view, scale, hatchId, isRatingShown }: PlateCellProps) {
  const { xMm, yMm, widthMm } = cell.rect;
  return (
    <>
      <CellGround cell={cell} view={view} scale={scale} hatchId={hatchId} />
      {view.isFlagged === true && (
        <>
          <chakra.rect
            x={xMm + 0.2}
            y={yMm + 0.2}
            width={`${widthMm - 0.4}`}
            height={`${widthMm - 0.4}`}
            fill="none"
            stroke="plate.burn"
            strokeWidth="0.4"
          />
          <chakra.path
            d={`M${xMm + widthMm * (1 - FLAG_SHARE)} ${yMm}H${xMm + widthMm}V${yMm + widthMm * FLAG_SHARE}z`}
            fill="plate.burn"
          />
        </>
      )}
      {isRatingShown && view.rating !== undefined && view.fill.kind !== 'response' && <RatingDigit cell={cell} rating={view.rating} />}
    </>
  );
});

function CellGround({ cell, view: { fill }, scale, hatchId }: Pick<PlateCellProps, 'cell' | 'view' | 'scale' | 'hatchId'>) {
  const { xMm, yMm, widthMm, heightMm } = cell.rect;
  const place = { x: xMm, y: yMm, width: widthMm, height: heightMm };
  switch (fill.kind) {
    case 'photo':
      return <rect {...place} fill="transparent" stroke="#ffffff" strokeOpacity="0.7" strokeWidth="0.12" />;
    case 'colour':
      return <rect {...place} fill={fill.colour} />;
    case 'missing':
      return <rect {...place} fill={`url(#${hatchId})`} />;
    case 'blank':
      return <rect {...place} fill="#000000" fillOpacity="0.06" stroke="#000000" strokeOpacity="0.28" strokeWidth="0.12" />;
    case 'response': {
      const colour = cividis(scale === undefined ? 0.5 : scalePosition(scale, fill.value));
      return (
        <>
          <rect {...place} fill={colour} />
          <text
            x={xMm + widthMm / 2}
            y={yMm + heightMm * 0.62}
            style={lettering(digitSizeMm(fill.text, widthMm))}
            textAnchor="middle"
            fill={inkOn(colour)}
          >
            {fill.text}
          </text>
        </>
      );
    }
  }
}

function RatingDigit({ cell, rating }: { cell: LayoutCell; rating: number }) {
  const { xMm, yMm, widthMm, heightMm } = cell.rect;
  return (
    <text
      x={xMm + widthMm * 0.92}
      y={yMm + heightMm * 0.92}
      style={lettering(widthMm * 0.34)}
      textAnchor="end"
      fill="#ffffff"
      stroke="#14161A"
      strokeWidth={widthMm * 0.06}
      paintOrder="stroke"
    >
      {rating}
    </text>
  );
}

/** As a style, since the reset gives every element the font of its parent; one pixel is one millimetre here. */
function lettering(sizeMm: number) {
  return { fontSize: `${sizeMm}px`, fontWeight: 600 };
}

function digitSizeMm(text: string, cellMm: number): number {
  return cellMm * 0.35 * Math.min(1, MOST_DIGITS_AT_FULL_SIZE / text.length);
}
