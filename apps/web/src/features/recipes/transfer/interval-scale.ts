import type { FrequencyInterval } from '@proofplate/recipe-model';
import { formatNumber } from '../../../lib/format';

/** Wider ranges than this are drawn by ratio, or their lower end would be a dot. */
const LINEAR_UP_TO = 12;

export type IntervalScale = { at: (khz: number) => number; isByRatio: boolean };

/** Place of a frequency on the drawn range, 0 at its lower end and 1 at its upper; what lies outside is drawn at the end. */
export function intervalScale({ rangeFromKhz, rangeToKhz }: Pick<FrequencyInterval, 'rangeFromKhz' | 'rangeToKhz'>): IntervalScale {
  const isByRatio = rangeFromKhz > 0 && rangeToKhz / rangeFromKhz > LINEAR_UP_TO;
  const share = (khz: number) =>
    isByRatio
      ? Math.log(Math.max(khz, Number.MIN_VALUE) / rangeFromKhz) / Math.log(rangeToKhz / rangeFromKhz)
      : (khz - rangeFromKhz) / (rangeToKhz - rangeFromKhz || 1);
  return { isByRatio, at: (khz) => Math.min(1, Math.max(0, share(khz))) };
}

const ENDS: Readonly<Record<FrequencyInterval['endsBy'], string>> = {
  'frequency range': 'its own range',
  'rated power': 'the rated power',
  'scan speed': 'the top speed',
};

/** True where the pulse energy stands in the way, which no frequency changes. */
export const isByEnergy = ({ isEmpty, lowestKhz, highestKhz }: FrequencyInterval) => isEmpty && highestKhz >= lowestKhz;

/** The drawing in words: what a person reads who does not see it. */
export function intervalWords(interval: FrequencyInterval, machineName: string, chosenKhz: number | undefined): string {
  const khz = (value: number) => formatNumber(Number(value.toPrecision(4)));
  const { lowestKhz, highestKhz, isEmpty, endsBy, rangeFromKhz, rangeToKhz, sourceKhz, calibrated } = interval;
  const none = isByEnergy(interval)
    ? 'No frequency keeps the numbers: the pulses would have to be stronger than the machine gives.'
    : `No frequency keeps the numbers: ${ENDS[endsBy]} ends at ${khz(highestKhz)} kHz.`;
  const found = isEmpty ? none : `The numbers are kept from ${khz(lowestKhz)} to ${khz(highestKhz)} kHz, where ${ENDS[endsBy]} ends it.`;
  const tables = calibrated.map(({ fromKhz, toKhz }) => `${khz(fromKhz)} to ${khz(toKhz)} kHz`);
  return [
    `Frequencies of ${machineName}, ${khz(rangeFromKhz)} to ${khz(rangeToKhz)} kHz.`,
    found,
    isEmpty ? '' : tables.length === 0 ? 'No power table holds in it.' : `A power table holds from ${tables.join(', and from ')}.`,
    `The source runs at ${khz(sourceKhz)} kHz.`,
    chosenKhz === undefined ? '' : `Chosen: ${khz(chosenKhz)} kHz.`,
  ]
    .filter((words) => words !== '')
    .join(' ');
}
