import type { components } from '@proofplate/api-client';
import { formatDay, formatQuantity } from './format';

type PowerShift = components['schemas']['PowerShiftDto'];

/** "The source gives 10.5 % less than when this was proved". */
export function shiftWords({ shiftPercent }: PowerShift): string {
  const share = formatQuantity(Math.abs(shiftPercent), '%', { decimals: 1 });
  return `The source gives ${share} ${shiftPercent < 0 ? 'less' : 'more'} than when this was proved`;
}

/** "9.50 W read on 10 Jan 2026, 8.50 W read on 1 Jul 2026; the policy allows 5 %". */
export function shiftFacts({ beforeW, afterW, citedOn, measuredOn, limitPercent }: PowerShift): string {
  const watts = (value: number) => formatQuantity(value, 'W', { decimals: 2 });
  const read = (value: number, day: string) => `${watts(value)} by the reading of ${formatDay(day)}`;
  return `${read(beforeW, citedOn)}, ${read(afterW, measuredOn)}; the policy allows ${formatQuantity(limitPercent, '%')}`;
}
