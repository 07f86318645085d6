import { showNumber } from '@proofplate/recipe-model';
import { formatCount, formatPercentChange, formatQuantity } from '../../lib/format';
import type { LoggedTime } from './marking-time.api';

/** Where it was clocked: J-0007, C-0012 B4, C-0012 whole. */
export function whereWords({ runCode, couponCode, address }: LoggedTime): string {
  return runCode ?? (address === null ? `${couponCode ?? ''}, all cells` : `${couponCode ?? ''} ${address}`);
}

/** What was marked, in one line. */
export function markedWords({ areas }: LoggedTime): string {
  const [first] = areas;
  if (first === undefined) return '';
  const count = areas.reduce((sum, area) => sum + area.count, 0);
  const size = sizeWords(first);
  if (count > 1) return `${count} × ${size}`;
  const passes = first.passes === 1 ? '' : `, ${formatCount(first.passes, 'pass', 'passes')}`;
  return `${size}, ${short(first.lineSpacingUm)} µm at ${short(first.speedMmPerS)} mm/s${passes}`;
}

/** Width × height without trailing zeros. */
export const sizeWords = ({ widthMm, heightMm }: { widthMm: number; heightMm: number }) => `${short(widthMm)} × ${short(heightMm)} mm`;

const SHOWN_DIGITS = 4;
const short = (value: number) => showNumber(Number(value.toPrecision(SHOWN_DIGITS)));

/** Logged against predicted, as a share. */
export function differenceWords({ seconds, predicted }: LoggedTime): string {
  return predicted.totalS === null ? 'not known' : formatPercentChange(seconds / predicted.totalS - 1, { decimals: 1 });
}

/** What a reader should know before the number is trusted. */
export function remarkWords({ counts, isOfPresentMachine, isOutlier, replaced, reason }: LoggedTime): string[] {
  return [
    ...(counts ? [] : [`Taken out of the count: ${reason}`]),
    ...(counts && replaced !== null ? [`Corrected, was ${formatQuantity(replaced.seconds, 's')} by ${replaced.loggedBy}: ${reason}`] : []),
    ...(isOfPresentMachine ? [] : ['Of an earlier profile of the machine: it counts no longer']),
    ...(isOutlier ? ['Far from what the other times say; it counts all the same'] : []),
  ];
}
