import { createHash } from 'node:crypto';
import { firstFault, GENESIS_HASH, type LedgerBody, linkEvent } from './ledger-chain';

const sha256 = (text: string) => createHash('sha256').update(text, 'utf8').digest('hex');
const start = { seq: 0, hash: GENESIS_HASH };
const body = (action: string, after: unknown = null): LedgerBody => ({
  shopId: '0190a000-0000-7000-8000-000000000001',
  at: '2026-01-05T08:00:00.000Z',
  actorMemberId: null,
  actorName: 'Somebody',
  sessionId: null,
  action,
  subjectType: 'shop',
  subjectId: '0190a000-0000-7000-8000-000000000001',
  subjectCode: null,
  before: null,
  after,
});

function chain() {
  const first = linkEvent(body('shop.created', { name: 'Proofs' }), start, sha256);
  const second = linkEvent(body('shop.changed'), first, sha256);
  return [first, second, linkEvent(body('shop.changed', { name: 'More proofs' }), second, sha256)];
}

describe('the ledger chain', () => {
  it('hashes the hash before, the number and the canonical body', () => {
    const [first, second] = chain();
    expect(second?.seq).toBe(2);
    expect(second?.previousHash).toBe(first?.hash);
    const canonical = `{"action":"shop.changed","actorMemberId":null,"actorName":"Somebody","after":null,"at":"2026-01-05T08:00:00.000Z","before":null,"sessionId":null,"shopId":"0190a000-0000-7000-8000-000000000001","subjectCode":null,"subjectId":"0190a000-0000-7000-8000-000000000001","subjectType":"shop"}`;
    expect(second?.hash).toBe(sha256(`${first?.hash}2${canonical}`));
  });

  it('finds no fault in what it linked', () => {
    expect(firstFault(chain(), start, sha256)).toBeUndefined();
  });

  it('names a changed body, a missing number and a broken link', () => {
    const [first, second, third] = chain();
    if (first === undefined || second === undefined || third === undefined) throw new Error('the chain is too short');
    expect(firstFault([first, { ...second, actorName: 'Else' }, third], start, sha256)).toEqual({ seq: 2, reason: 'content changed' });
    expect(firstFault([first, third], start, sha256)).toEqual({ seq: 2, reason: 'number missing' });
    expect(firstFault([first, { ...second, previousHash: GENESIS_HASH }], start, sha256)).toEqual({ seq: 2, reason: 'link broken' });
  });
});
