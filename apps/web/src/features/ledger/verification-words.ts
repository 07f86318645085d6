import { formatCount } from '../../lib/format';
import type { Verification } from './ledger.api';

export function intactWords({ eventCount }: Verification): string {
  return `${formatCount(eventCount, 'event')}, each fits the one before it and its own content.`;
}

const REASONS: Readonly<Record<string, string>> = {
  'number missing': 'it is missing',
  'link broken': 'it does not continue the event before it',
  'content changed': 'its content is not what was written',
};

/** Which event is the first that does not fit, what still holds, and what to do now. */
export function breakWords({ firstBrokenSeq, reason }: Verification) {
  const seq = firstBrokenSeq ?? 1;
  return {
    what: `The chain breaks at event ${seq}: ${REASONS[reason ?? ''] ?? 'it does not fit'}.`,
    safe: seq > 1 ? `Events 1 to ${seq - 1} are as they were written.` : 'No event can be relied on.',
    todo: 'Export the ledger as JSON now and keep the file. Then ask whoever runs this server to compare it with the last backup.',
  };
}
