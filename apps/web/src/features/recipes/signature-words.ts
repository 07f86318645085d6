import { formatTime } from '../../lib/format';
import { roleWord } from '../../lib/roles';
import type { SignOff } from './recipes.api';

const MEANING_WORDS: Record<SignOff['meaning'], string> = {
  'submitted for review': 'Submitted for review',
  recalled: 'Recalled',
  approved: 'Approved for use',
  returned: 'Sent back',
  withdrawn: 'Withdrawn',
};

/** "Approved for use as lead operator, 3 Mar 2026 09:12 CET". */
export function signatureCaption({ meaning, role, signedAt, isByAuthor }: SignOff, timeZone: string): string {
  const byAuthor = isByAuthor && meaning === 'approved' ? ', signed by its author' : '';
  return `${MEANING_WORDS[meaning]} as ${roleWord(role)}${byAuthor}, ${formatTime(signedAt, timeZone)}`;
}
