import { chakra } from '@chakra-ui/react';
import { powerAtPercent, powerCalibration } from '@proofplate/physics';
import { useRef } from 'react';
import { axisTicks } from '../../../components/chart/axis-ticks';
import { useDrawnWidth } from '../../../components/chart/use-drawn-width';
import { formatNumber } from '../../../lib/format';
import type { ReadingPoint } from '../machines.api';

const WIDEST = 640;
const HEIGHT = 280;
const MARGIN = { left: 44, right: 14, top: 28, bottom: 44 };
const STEPS = 120;
const PERCENT_TICKS = [0, 20, 40, 60, 80, 100];

export type CurveSeries = { key: string; points: readonly ReadingPoint[] };

export type CalibrationCurveProps = {
  /** What the picture shows, for those who hear it. */
  label: string;
  newest: CurveSeries;
  /** Earlier readings, drawn dashed behind it. */
  earlier?: readonly CurveSeries[];
};

/** Watts over percent: the readings as dots, the monotone curve through them, nothing beyond the first and the last. */
export function CalibrationCurve({ label, newest, earlier = [] }: CalibrationCurveProps) {
  const frame = useRef<HTMLDivElement>(null);
  const width = useDrawnWidth(frame, WIDEST);
  const highest = Math.max(...[newest, ...earlier].flatMap(({ points }) => points.map(({ watts }) => watts)));
  const ticks = axisTicks(highest);
  const top = ticks.at(-1) ?? 1;
  const x = (percent: number) => MARGIN.left + (percent / 100) * (width - MARGIN.left - MARGIN.right);
  const y = (watts: number) => HEIGHT - MARGIN.bottom - (watts / top) * (HEIGHT - MARGIN.top - MARGIN.bottom);
  return (
    <chakra.div ref={frame} maxW="640px">
      <chakra.svg role="img" aria-label={label} viewBox={`0 0 ${width} ${HEIGHT}`} width="full" height="auto" display="block" fontSize="sm">
        {ticks.map((tick) => (
          <g key={tick}>
            <chakra.line x1={x(0)} x2={x(100)} y1={y(tick)} y2={y(tick)} stroke="border" />
            <chakra.text x={x(0) - 8} y={y(tick) + 5} textAnchor="end" fill="fg.muted">
              {formatNumber(tick)}
            </chakra.text>
          </g>
        ))}
        {PERCENT_TICKS.map((tick) => (
          <chakra.text key={tick} x={x(tick)} y={HEIGHT - MARGIN.bottom + 18} textAnchor="middle" fill="fg.muted">
            {tick}
          </chakra.text>
        ))}
        <chakra.text x={x(50)} y={HEIGHT - 4} textAnchor="middle" fill="fg.muted">
          percent set
        </chakra.text>
        <chakra.text x={MARGIN.left - 8} y="14" textAnchor="end" fill="fg.muted">
          W
        </chakra.text>
        {earlier.map(({ key, points }) => (
          <chakra.path key={key} d={curvePath(points, x, y)} fill="none" stroke="fg.subtle" strokeWidth="1.5" strokeDasharray="4 4" />
        ))}
        <chakra.path d={curvePath(newest.points, x, y)} fill="none" stroke="brand.solid" strokeWidth="2.5" />
        {newest.points.map(({ percent, watts }) => (
          <chakra.circle key={percent} cx={x(percent)} cy={y(watts)} r="4" fill="bg.panel" stroke="brand.solid" strokeWidth="2" />
        ))}
      </chakra.svg>
    </chakra.div>
  );
}

/** Sampled through the physics package, so that the picture shows what the numbers are worked out from. */
function curvePath(points: readonly ReadingPoint[], x: (percent: number) => number, y: (watts: number) => number): string {
  const curve = powerCalibration(points.map(({ percent, watts }) => ({ percent, powerW: watts })));
  const first = points[0]?.percent ?? 0;
  const last = points.at(-1)?.percent ?? first;
  return Array.from({ length: STEPS + 1 }, (_, step) => {
    const percent = step === STEPS ? last : first + ((last - first) * step) / STEPS;
    return `${step === 0 ? 'M' : 'L'}${x(percent).toFixed(1)} ${y(powerAtPercent(curve, percent)).toFixed(1)}`;
  }).join('');
}
