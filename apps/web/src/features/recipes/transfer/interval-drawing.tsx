import { chakra, Flex } from '@chakra-ui/react';
import type { FrequencyInterval } from '@proofplate/recipe-model';
import { formatNumber } from '../../../lib/format';
import { intervalScale, intervalWords, isByEnergy } from './interval-scale';

export type IntervalDrawingProps = { interval: FrequencyInterval; machineName: string; chosenKhz: number | undefined };

const AXIS_Y = 34;
const BAR = { y: AXIS_Y - 8, height: '16' } as const;

/** The target's frequencies as a line: where the numbers are kept, where a power table holds, the source's frequency and the chosen one. */
export function IntervalDrawing({ interval, machineName, chosenKhz }: IntervalDrawingProps) {
  const { at, isByRatio } = intervalScale(interval);
  const x = (khz: number) => `${at(khz) * 100}%`;
  const span = (fromKhz: number, toKhz: number) => ({ x: x(fromKhz), width: `${Math.max(0.4, (at(toKhz) - at(fromKhz)) * 100)}%` });
  const { lowestKhz, highestKhz, isEmpty, rangeFromKhz, rangeToKhz, sourceKhz, calibrated } = interval;
  const words = intervalWords(interval, machineName, chosenKhz);
  return (
    <chakra.figure m="0">
      <chakra.div px="2">
        <chakra.svg width="full" height="48px" overflow="visible" role="img" aria-label={words}>
          <chakra.rect x="0" y={AXIS_Y - 2} width="100%" height="4" fill="border.emphasized" />
          {isEmpty && !isByEnergy(interval) && [lowestKhz, highestKhz].map((khz) => <End key={khz} x={x(khz)} />)}
          {!isEmpty && <chakra.rect {...span(lowestKhz, highestKhz)} {...BAR} fill="brand.muted" stroke="brand.solid" strokeWidth="1.5" />}
          {calibrated.map(({ fromKhz, toKhz, calibrationId }) => (
            <chakra.rect key={calibrationId} {...span(fromKhz, toKhz)} {...BAR} fill="brand.solid" />
          ))}
          <svg x={x(sourceKhz)} y={AXIS_Y - 10} overflow="visible" aria-hidden="true">
            <chakra.path d="M0 0l-7 -12h14z" fill="fg" />
          </svg>
          {chosenKhz !== undefined && (
            <chakra.circle cx={x(chosenKhz)} cy={AXIS_Y} r="7" fill="straw.solid" stroke="bg.panel" strokeWidth="2" />
          )}
        </chakra.svg>
        <Flex justify="space-between" fontSize="sm" lineHeight="sm" color="fg.muted" aria-hidden="true">
          <span>{formatNumber(rangeFromKhz)} kHz</span>
          <span>{formatNumber(rangeToKhz)} kHz</span>
        </Flex>
      </chakra.div>
      <chakra.figcaption mt="1" fontSize="sm" lineHeight="sm" color="fg.muted">
        {words} {isByRatio ? 'Drawn by ratio. ' : ''}
        {isEmpty ? '' : 'Outlined: the numbers are kept. Filled: a power table holds too. '}
        Triangle: the source.{chosenKhz === undefined ? '' : ' Dot: chosen.'}
      </chakra.figcaption>
    </chakra.figure>
  );
}

/** An end of the interval that comes before its beginning. */
function End({ x }: { x: string }) {
  return <chakra.line x1={x} x2={x} y1={AXIS_Y - 12} y2={AXIS_Y + 12} stroke="oxide.solid" strokeWidth="2" strokeDasharray="4 3" />;
}
