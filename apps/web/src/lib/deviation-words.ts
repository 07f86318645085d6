import { formatCount, formatTime } from './format';

export type DeviationLimits = { grantedBy: string; endsAt: string | null; maximumQuantity: number | null };

/** "Granted by Hanne Voss, until 14 May 2026 07:40 BST or for 50 parts". */
export function grantWords({ grantedBy, endsAt, maximumQuantity }: DeviationLimits, timeZone: string): string {
  const limits = [
    ...(endsAt === null ? [] : [`until ${formatTime(endsAt, timeZone)}`]),
    ...(maximumQuantity === null ? [] : [`for ${formatCount(maximumQuantity, 'part')}`]),
  ];
  return `Granted by ${grantedBy}, ${limits.join(' or ')}`;
}
