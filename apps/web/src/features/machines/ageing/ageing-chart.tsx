import { chakra } from '@chakra-ui/react';
import { useRef } from 'react';
import { axisTicks } from '../../../components/chart/axis-ticks';
import { useDrawnWidth } from '../../../components/chart/use-drawn-width';
import { formatDay, formatNumber } from '../../../lib/format';
import type { AgeingPoint } from './ageing-series';

const WIDEST = 640;
const HEIGHT = 220;
const MARGIN = { left: 44, right: 56, top: 24, bottom: 34 };

/** Watts over the days of the readings, from zero, so that a drop looks as large as it is. */
export function AgeingChart({ points, label }: { points: readonly AgeingPoint[]; label: string }) {
  const frame = useRef<HTMLDivElement>(null);
  const width = useDrawnWidth(frame, WIDEST);
  const days = points.map(({ measuredOn }) => Date.parse(measuredOn));
  const [first, last] = [Math.min(...days), Math.max(...days)];
  const ticks = axisTicks(Math.max(...points.map(({ watts }) => watts)));
  const top = ticks.at(-1) ?? 1;
  const x = (day: number) => MARGIN.left + ((day - first) / Math.max(1, last - first)) * (width - MARGIN.left - MARGIN.right);
  const y = (watts: number) => HEIGHT - MARGIN.bottom - (watts / top) * (HEIGHT - MARGIN.top - MARGIN.bottom);
  const placed = points.map((point, index) => ({ ...point, x: x(days[index] ?? first), y: y(point.watts) }));
  const ends = [placed[0], placed.at(-1)].filter((point) => point !== undefined);
  return (
    <chakra.div ref={frame} maxW="640px">
      <chakra.svg role="img" aria-label={label} viewBox={`0 0 ${width} ${HEIGHT}`} width="full" height="auto" display="block" fontSize="sm">
        {ticks.map((tick) => (
          <g key={tick}>
            <chakra.line x1={MARGIN.left} x2={width - MARGIN.right} y1={y(tick)} y2={y(tick)} stroke="border" />
            <chakra.text x={MARGIN.left - 8} y={y(tick) + 5} textAnchor="end" fill="fg.muted">
              {formatNumber(tick)}
            </chakra.text>
          </g>
        ))}
        <chakra.text x={MARGIN.left - 8} y="12" textAnchor="end" fill="fg.muted">
          W
        </chakra.text>
        {ends.map((point, index) => (
          <chakra.text key={point.id} x={point.x} y={HEIGHT - 10} textAnchor={index === 0 ? 'start' : 'end'} fill="fg.muted">
            {formatDay(point.measuredOn)}
          </chakra.text>
        ))}
        <chakra.polyline
          points={placed.map((point) => `${point.x},${point.y}`).join(' ')}
          fill="none"
          stroke="brand.solid"
          strokeWidth="2"
        />
        {placed.map((point) => (
          <chakra.circle key={point.id} cx={point.x} cy={point.y} r="4" fill="bg.panel" stroke="brand.solid" strokeWidth="2" />
        ))}
        {ends.slice(-1).map((point) => (
          <chakra.text key={point.id} x={point.x + 8} y={point.y + 5} fill="fg" fontWeight="semibold">
            {formatNumber(point.watts, { decimals: 1 })}
          </chakra.text>
        ))}
      </chakra.svg>
    </chakra.div>
  );
}
