import type { components } from '@proofplate/api-client';
import type { HeadOverheads } from '@proofplate/recipe-model';
import { formatCount, formatDuration, formatQuantity } from './format';

const TENTHS_BELOW_S = 60;

/** A marking time: tenths below a minute, whole seconds above it. */
export function timeText(seconds: number): string {
  return seconds < TENTHS_BELOW_S ? formatQuantity(seconds, 's', { decimals: 1 }) : formatDuration(seconds);
}

/** With its standard error, where the overheads are fitted. */
export function timeWithError({ totalS, errorS }: { totalS: number; errorS: number | null }): string {
  return errorS === null ? timeText(totalS) : `${timeText(totalS)} ± ${timeText(errorS)}`;
}

/** What a time rests on, in a few words. */
export function basisWords(overheads: HeadOverheads): string {
  if (overheads.basis === 'fitted') return `with overheads fitted from ${formatCount(overheads.n, 'logged time')}`;
  if (overheads.basis === 'profile') return `with the delays of the machine’s profile: ${overheads.notFittedBecause}`;
  return `not known because ${overheads.because}`;
}

/** The answer of the api holds exactly one of these shapes, told apart by its basis. */
export const headOverheadsOf = (dto: components['schemas']['HeadOverheadsDto']): HeadOverheads => dto as HeadOverheads;
