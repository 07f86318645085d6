import type { LedgerEventDto } from './dto/ledger-event.dto';
import type { LinkedEvent } from './ledger-chain';

export const toLedgerEventDto = (event: LinkedEvent): LedgerEventDto => ({
  seq: event.seq,
  at: event.at,
  actorMemberId: event.actorMemberId,
  actorName: event.actorName,
  action: event.action,
  subjectType: event.subjectType,
  subjectId: event.subjectId,
  subjectCode: event.subjectCode,
  before: event.before,
  after: event.after,
  previousHash: event.previousHash,
  hash: event.hash,
});
