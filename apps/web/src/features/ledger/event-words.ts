import { wordsOf } from './action-words';
import type { LedgerEvent } from './ledger.api';

type Told = Pick<LedgerEvent, 'actorName' | 'action' | 'subjectType' | 'subjectCode'> & { before: unknown; after: unknown };

/** "Hanne Voss approved R-0031 revision 3". */
export function eventSentence(event: Told): string {
  return [event.actorName, wordsOf(event.action).verb, thingOf(event)].filter((part) => part !== '').join(' ');
}

/** Actions whose own words name the thing already. */
const SAY_ALL = ['shop.created', 'shop.changed', 'shop.policy-signed', 'shop.starter-content-added'];

/** The thing as people call it; empty where the event gives it no name. */
export function thingOf({ action, subjectType, subjectCode, before, after }: Omit<Told, 'actorName'>): string {
  if (SAY_ALL.includes(action)) return '';
  if (subjectCode !== null) return subjectType === 'revision' ? withNumber(subjectCode, { before, after }) : subjectCode;
  if (action === 'member.joined') return textAt(after, 'role');
  if (action.startsWith('hold.')) return `a ${subjectType}`;
  return NAMING_FIELDS.map((field) => textAt(after, field) || textAt(before, field)).find((name) => name !== '') ?? '';
}

/** The first of these that an event carries is its name. */
const NAMING_FIELDS = ['printedName', 'email', 'name', 'title', 'subject'];

function withNumber(code: string, { before, after }: { before: unknown; after: unknown }): string {
  const number = at(after, 'number') ?? at(before, 'number');
  return typeof number === 'number' ? `${code} revision ${number}` : code;
}

function textAt(values: unknown, field: string): string {
  const value = at(values, field);
  return typeof value === 'string' ? value : '';
}

function at(values: unknown, field: string): unknown {
  return typeof values === 'object' && values !== null ? Object.entries(values).find(([key]) => key === field)?.[1] : undefined;
}
