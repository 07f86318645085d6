import { chakra } from '@chakra-ui/react';
import { useRef } from 'react';
import { axisTicks } from '../../../components/chart/axis-ticks';
import { useDrawnWidth } from '../../../components/chart/use-drawn-width';
import { formatNumber } from '../../../lib/format';
import { timeText } from '../../../lib/time-words';
import { whereWords } from '../logged-words';
import type { LoggedTime } from '../marking-time.api';

const WIDEST = 560;
const HEIGHT = 300;
const LONGEST_IN_SECONDS = 600;
const S_PER_MIN = 60;
const MARGIN = { left: 48, right: 24, top: 26, bottom: 46 };

type Placed = { time: LoggedTime; predictedS: number };

/** Logged over predicted; on the line both are the same. */
export function TimePlot({ items }: { items: readonly LoggedTime[] }) {
  const frame = useRef<HTMLDivElement>(null);
  const width = useDrawnWidth(frame, WIDEST);
  const points = items.flatMap((time): Placed[] => (time.predicted.totalS === null ? [] : [{ time, predictedS: time.predicted.totalS }]));
  if (points.length === 0) return null;
  const ticks = axisTicks(Math.max(...points.flatMap(({ time, predictedS }) => [time.seconds, predictedS])));
  const top = ticks.at(-1) ?? 1;
  const axis = axisOf(top);
  const x = (seconds: number) => MARGIN.left + (seconds / top) * (width - MARGIN.left - MARGIN.right);
  const y = (seconds: number) => HEIGHT - MARGIN.bottom - (seconds / top) * (HEIGHT - MARGIN.top - MARGIN.bottom);
  return (
    <chakra.div ref={frame} maxW="560px">
      <chakra.svg
        role="img"
        aria-label={spoken(points)}
        viewBox={`0 0 ${width} ${HEIGHT}`}
        width="full"
        height="auto"
        display="block"
        fontSize="sm"
      >
        {ticks.map((tick) => (
          <g key={tick}>
            <chakra.line x1={MARGIN.left} x2={width - MARGIN.right} y1={y(tick)} y2={y(tick)} stroke="border" />
            <chakra.text x={MARGIN.left - 8} y={y(tick) + 5} textAnchor="end" fill="fg.muted">
              {axis.text(tick)}
            </chakra.text>
            <chakra.text x={x(tick)} y={HEIGHT - MARGIN.bottom + 18} textAnchor="middle" fill="fg.muted">
              {axis.text(tick)}
            </chakra.text>
          </g>
        ))}
        <chakra.text x="0" y="14" fill="fg.muted">
          Logged, {axis.unit}
        </chakra.text>
        <chakra.text x={width - MARGIN.right} y={HEIGHT - 6} textAnchor="end" fill="fg.muted">
          Predicted, {axis.unit}
        </chakra.text>
        <chakra.line x1={x(0)} y1={y(0)} x2={x(top)} y2={y(top)} stroke="fg.muted" strokeDasharray="5 4" />
        {points.map(({ time, predictedS }) => (
          <Mark key={time.id} time={time} x={x(predictedS)} y={y(time.seconds)} />
        ))}
      </chakra.svg>
    </chakra.div>
  );
}

/** A cross does not count, a filled square stands apart: shape, not colour alone. */
function Mark({ time: { counts, isOfPresentMachine, isOutlier }, x, y }: { time: LoggedTime; x: number; y: number }) {
  if (!counts || !isOfPresentMachine)
    return <chakra.path d={`M${x - 4} ${y - 4}l8 8m0 -8l-8 8`} stroke="fg.muted" strokeWidth="2" fill="none" />;
  if (isOutlier) return <chakra.rect x={x - 5} y={y - 5} width="10" height="10" fill="straw.solid" stroke="fg" />;
  return <chakra.circle cx={x} cy={y} r="5" fill="bg.panel" stroke="brand.solid" strokeWidth="2" />;
}

/** Seconds up to ten minutes, minutes beyond them. */
function axisOf(topS: number): { unit: string; text: (seconds: number) => string } {
  if (topS <= LONGEST_IN_SECONDS) return { unit: 's', text: (seconds) => formatNumber(seconds) };
  return { unit: 'min', text: (seconds) => formatNumber(seconds / S_PER_MIN, { significantDigits: 3 }) };
}

function spoken(points: readonly Placed[]): string {
  const each = points.map(
    ({ time, predictedS }) => `${whereWords(time)}: predicted ${timeText(predictedS)}, logged ${timeText(time.seconds)}`,
  );
  return `Logged over predicted marking time. ${each.join('; ')}`;
}
