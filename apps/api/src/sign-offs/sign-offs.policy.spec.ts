import { maySignOwn, signerCautionsCheck, signerChecks, signsForProcess } from './sign-offs.policy';

const REVISION = { createdBy: 'author', editorIds: ['helper'], effectId: 'anneal', sourceKind: 'fibre-mopa' } as const;
const signer = (memberId: string, signsFor: { effectId: string; sourceKind: string }[] | null = null) => ({ memberId, signsFor });

describe('maySignOwn()', () => {
  it('refuses the author and whoever edited the draft, unless the policy allows it', () => {
    expect(maySignOwn({ memberId: 'other' }, REVISION, false)).toBe(true);
    expect(maySignOwn({ memberId: 'author' }, REVISION, false)).toBe(false);
    expect(maySignOwn({ memberId: 'helper' }, REVISION, false)).toBe(false);
    expect(maySignOwn({ memberId: 'author' }, REVISION, true)).toBe(true);
  });
});

describe('signsForProcess()', () => {
  it('holds for all processes unless some are named; effect and source must both fit', () => {
    expect(signsForProcess(signer('lead'), REVISION)).toBe(true);
    expect(signsForProcess(signer('lead', []), REVISION)).toBe(false);
    expect(signsForProcess(signer('lead', [{ effectId: 'anneal', sourceKind: 'co2' }]), REVISION)).toBe(false);
    expect(signsForProcess(signer('lead', [{ effectId: 'anneal', sourceKind: 'fibre-mopa' }]), REVISION)).toBe(true);
  });
});

describe('signerChecks()', () => {
  it('block the approval, not the submission', () => {
    const checks = signerChecks(signer('author', []), REVISION, false);
    expect(checks.map(({ key, passes, blocks }) => [key, passes, blocks])).toEqual([
      ['signer-not-author', false, 'approve'],
      ['signer-process', false, 'approve'],
    ]);
    expect(signerChecks(signer('author'), REVISION, true)[0]).toMatchObject({
      passes: true,
      detail: expect.stringContaining('will say so'),
    });
  });
});

describe('signerCautionsCheck()', () => {
  const cautions = [
    { id: 'a', level: 'care', subject: 'Keep the extraction on.' },
    { id: 'b', level: 'never', subject: 'Do not mark PVC.' },
  ];

  it('wants every care caution; a never caution is nothing to acknowledge', () => {
    expect(signerCautionsCheck(cautions, [])).toMatchObject({ passes: false, detail: expect.stringContaining('Keep the extraction on.') });
    expect(signerCautionsCheck(cautions, ['a'])).toMatchObject({ passes: true });
  });
});
