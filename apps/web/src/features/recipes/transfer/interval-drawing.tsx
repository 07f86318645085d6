import { chakra } from '@chakra-ui/react';
import type { FrequencyInterval } from '@proofplate/recipe-model';
import { formatNumber } from '../../../lib/format';
import { intervalScale, intervalWords } from './interval-scale';

export type IntervalDrawingProps = { interval: FrequencyInterval; machineName: string; chosenKhz: number | undefined };

const WIDTH = 600;
const HEIGHT = 74;
const LEFT = 14;
const RIGHT = WIDTH - 14;
const AXIS_Y = 44;

/** The target's frequencies as a line: where the numbers are kept, where a power table holds, the source's frequency and the chosen one. */
export function IntervalDrawing({ interval, machineName, chosenKhz }: IntervalDrawingProps) {
  const { at, isByRatio } = intervalScale(interval);
  const x = (khz: number) => LEFT + at(khz) * (RIGHT - LEFT);
  const { lowestKhz, highestKhz, isEmpty, rangeFromKhz, rangeToKhz, sourceKhz, calibrated } = interval;
  const words = intervalWords(interval, machineName, chosenKhz);
  return (
    <chakra.figure m="0">
      <chakra.svg viewBox={`0 0 ${WIDTH} ${HEIGHT}`} width="full" height="auto" role="img" aria-label={words}>
        <chakra.rect x={LEFT} y={AXIS_Y - 2} width={RIGHT - LEFT} height="4" fill="border.emphasized" />
        {isEmpty ? (
          <chakra.path
            d={`M${x(highestKhz)} ${AXIS_Y - 12}v24M${x(lowestKhz)} ${AXIS_Y - 12}v24`}
            stroke="oxide.solid"
            strokeWidth="2"
            strokeDasharray="4 3"
          />
        ) : (
          <chakra.rect
            x={x(lowestKhz)}
            y={AXIS_Y - 8}
            width={Math.max(3, x(highestKhz) - x(lowestKhz))}
            height="16"
            fill="brand.muted"
            stroke="brand.solid"
            strokeWidth="1.5"
          />
        )}
        {calibrated.map(({ fromKhz, toKhz, calibrationId }) => (
          <chakra.rect
            key={calibrationId}
            x={x(fromKhz)}
            y={AXIS_Y - 8}
            width={Math.max(3, x(toKhz) - x(fromKhz))}
            height="16"
            fill="brand.solid"
          />
        ))}
        <chakra.path d={`M${x(sourceKhz)} ${AXIS_Y - 10}l-6 -10h12z`} fill="fg" />
        {chosenKhz !== undefined && (
          <chakra.circle cx={x(chosenKhz)} cy={AXIS_Y} r="7" fill="straw.solid" stroke="bg.panel" strokeWidth="2" />
        )}
        <Tick x={LEFT} khz={rangeFromKhz} anchor="start" />
        <Tick x={RIGHT} khz={rangeToKhz} anchor="end" />
      </chakra.svg>
      <chakra.figcaption fontSize="sm" lineHeight="sm" color="fg.muted">
        {words} {isByRatio ? 'Drawn by ratio. ' : ''}
        Outlined: the numbers are kept. Filled: a power table holds too. Triangle: the source.{' '}
        {chosenKhz === undefined ? '' : 'Dot: chosen.'}
      </chakra.figcaption>
    </chakra.figure>
  );
}

function Tick({ x, khz, anchor }: { x: number; khz: number; anchor: 'start' | 'end' }) {
  return (
    <chakra.text x={x} y={HEIGHT - 4} textAnchor={anchor} fontSize="14px" fill="fg.muted">
      {formatNumber(khz)} kHz
    </chakra.text>
  );
}
