import type { Actor } from '../common/actor';
import type { ExportLedgerQuery } from './dto/list-ledger.query.dto';
import { hiddenSubjectTypes } from './ledger.policy';
import type { LedgerFilter } from './ledger.repository';

/** What was asked for, within what the role may read. */
export function filterFor({ role }: Pick<Actor, 'role'>, query: ExportLedgerQuery): LedgerFilter {
  const { subjectType, subjectId, subjectCode, action, actorMemberId, fromDay, toDay } = query;
  return { subjectType, subjectId, subjectCode, action, actorMemberId, fromDay, toDay, hiddenSubjectTypes: hiddenSubjectTypes(role) };
}
