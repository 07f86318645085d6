import { formatNumber, formatQuantity } from '../../../lib/format';
import type { CraterFit } from './craters.api';

const DIGITS_OF_ERROR = 2;
const DIGITS_WITHOUT_ERROR = 4;
const MOST_DECIMALS = 6;

/** "38.4 ± 0.6 µm": as many decimals as two digits of the error have. */
export function withError(value: number, standardError: number, unit: string): string {
  const decimals = decimalsOf(value, standardError);
  return `${formatNumber(value, { decimals })} ± ${formatQuantity(standardError, unit, { decimals })}`;
}

function decimalsOf(value: number, standardError: number): number {
  const [of, digits] = standardError > 0 ? [standardError, DIGITS_OF_ERROR] : [value, DIGITS_WITHOUT_ERROR];
  if (!(of > 0)) return 0;
  return Math.min(MOST_DECIMALS, Math.max(0, digits - 1 - Math.floor(Math.log10(of))));
}

/** "single pulses of 8 ns in focus". */
export function seriesWords({ pulses, pulseWidthNs, focusOffsetMm }: NonNullable<CraterFit['series']>): string {
  const width = pulseWidthNs === null ? '' : ` of ${formatQuantity(pulseWidthNs, 'ns')}`;
  const focus = focusOffsetMm === 0 ? 'in focus' : `${formatQuantity(focusOffsetMm, 'mm', { isSigned: true })} out of focus`;
  return `${pulses === 1 ? 'single pulses' : `${pulses} pulses on each place`}${width}, ${focus}`;
}
