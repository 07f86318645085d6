import { chakra } from '@chakra-ui/react';
import { useRef } from 'react';
import { axisTicks } from '../../../components/chart/axis-ticks';
import { logTicks } from '../../../components/chart/log-ticks';
import { useDrawnWidth } from '../../../components/chart/use-drawn-width';
import { formatNumber } from '../../../lib/format';
import type { CraterLine, CraterPoint } from './craters.api';

const WIDEST = 640;
const HEIGHT = 300;
const MARGIN = { left: 60, right: 18, top: 28, bottom: 46 };
/** Room at both ends of the axis, as a ratio. */
const ROOM = 1.15;
const LEAST_LETTERS_APART = 34;

type Drawn = CraterPoint & { readonly energyUj: number; readonly squareUm2: number };
export type CraterPlotProps = { label: string; points: readonly CraterPoint[]; line: CraterLine | null };

/** D² over the logarithm of the pulse energy, the line, and where it meets zero: the threshold. Points outside of the line are hollow. */
export function CraterPlot({ label, points, line }: CraterPlotProps) {
  const frame = useRef<HTMLDivElement>(null);
  const width = useDrawnWidth(frame, WIDEST);
  const drawn = points.flatMap((point): Drawn[] =>
    point.pulseEnergyUj === null ? [] : [{ ...point, energyUj: point.pulseEnergyUj, squareUm2: point.diameterUm ** 2 }],
  );
  if (drawn.length === 0) return null;
  const energies = [...drawn.map(({ energyUj }) => energyUj), ...(line === null ? [] : [line.thresholdEnergyUj])];
  const [lowest, highest] = [Math.min(...energies) / ROOM, Math.max(...energies) * ROOM];
  const ticks = axisTicks(Math.max(...drawn.map(({ squareUm2 }) => squareUm2)));
  const top = ticks.at(-1) ?? 1;
  const x = (energyUj: number) =>
    MARGIN.left + (Math.log(energyUj / lowest) / Math.log(highest / lowest)) * (width - MARGIN.left - MARGIN.right);
  const y = (squareUm2: number) => HEIGHT - MARGIN.bottom - (squareUm2 / top) * (HEIGHT - MARGIN.top - MARGIN.bottom);
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
        {readable(logTicks(lowest, highest), x).map((tick) => (
          <g key={tick}>
            <chakra.line x1={x(tick)} x2={x(tick)} y1={y(0)} y2={y(0) + 5} stroke="fg.muted" />
            <chakra.text x={x(tick)} y={y(0) + 20} textAnchor="middle" fill="fg.muted">
              {formatNumber(tick)}
            </chakra.text>
          </g>
        ))}
        <chakra.text x={(MARGIN.left + width - MARGIN.right) / 2} y={HEIGHT - 6} textAnchor="middle" fill="fg.muted">
          pulse energy, µJ, equal ratios
        </chakra.text>
        <chakra.text x="4" y="14" fill="fg.muted">
          D², µm²
        </chakra.text>
        {line !== null && <FitLine line={line} highest={Math.max(...energies)} x={x} y={y} />}
        {drawn.map((point) => (
          <Dot key={point.address} point={point} x={x(point.energyUj)} y={y(point.squareUm2)} />
        ))}
      </chakra.svg>
    </chakra.div>
  );
}

type Place = (value: number) => number;

function FitLine({ line, highest, x, y }: { line: CraterLine; highest: number; x: Place; y: Place }) {
  const { thresholdEnergyUj, slopeUm2 } = line;
  return (
    <>
      <chakra.line
        x1={x(thresholdEnergyUj)}
        y1={y(0)}
        x2={x(highest)}
        y2={y(slopeUm2 * Math.log(highest / thresholdEnergyUj))}
        stroke="brand.solid"
        strokeWidth="2"
      />
      <chakra.path d={`M${x(thresholdEnergyUj)} ${y(0) - 9}v18`} stroke="brand.solid" strokeWidth="2" />
    </>
  );
}

/** In the line: filled. Far above the threshold: filled and ringed. Left out: hollow and dashed. */
function Dot({ point, x, y }: { point: Drawn; x: number; y: number }) {
  if (point.excludedBecause !== null)
    return <chakra.circle cx={x} cy={y} r="5" fill="bg.panel" stroke="fg.muted" strokeWidth="1.5" strokeDasharray="3 2" />;
  return (
    <>
      {point.isFarAbove && <chakra.circle cx={x} cy={y} r="8" fill="none" stroke="straw.fg" strokeWidth="1.5" />}
      <chakra.circle cx={x} cy={y} r="4.5" fill="brand.solid" />
    </>
  );
}

/** Leaves out letters that would touch the one before. */
function readable(ticks: readonly number[], x: Place): number[] {
  let last = Number.NEGATIVE_INFINITY;
  return ticks.filter((tick) => {
    if (x(tick) - last < LEAST_LETTERS_APART) return false;
    last = x(tick);
    return true;
  });
}
