import type { SourceKind } from '@proofplate/recipe-model';
import { type ApprovalCheck, check } from '../recipes/approval-check';
import { hasWritten, type Writers } from '../recipes/recipe-revisions.policy';

export type Process = { readonly effectId: string; readonly sourceKind: string };
export type Signer = {
  readonly memberId: string;
  /** Processes that this lead may sign for; null: all of them. */
  readonly signsFor: readonly Process[] | null;
};
export type ToSign = Writers & { readonly effectId: string; readonly sourceKind: SourceKind };

/** Nobody approves what they wrote, unless the shop's policy allows it; then the signature says so. */
export const maySignOwn = (signer: Pick<Signer, 'memberId'>, revision: Writers, authorMaySign: boolean) =>
  authorMaySign || !hasWritten(signer, revision);

/** A lead without named processes signs for all of them. */
export const signsForProcess = ({ signsFor }: Pick<Signer, 'signsFor'>, { effectId, sourceKind }: Process) =>
  signsFor === null || signsFor.some((process) => process.effectId === effectId && process.sourceKind === sourceKind);

/** What an approval needs of whoever signs. */
export function signerChecks(signer: Signer, revision: ToSign, authorMaySign: boolean): ApprovalCheck[] {
  const isOwn = hasWritten(signer, revision);
  return [
    check('signer-not-author', 'Written by somebody else', {
      passes: maySignOwn(signer, revision, authorMaySign),
      found: isOwn
        ? authorMaySign
          ? 'You wrote it, or edited its draft. The policy allows you to sign; the signature will say so.'
          : 'You wrote it, or edited its draft.'
        : 'Somebody else wrote it.',
      wayOut: 'Ask another lead.',
      blocks: 'approve',
    }),
    check('signer-process', 'A process that you sign for', {
      passes: signsForProcess(signer, revision),
      found: signsForProcess(signer, revision) ? 'You sign for this process.' : 'You are not named for this process.',
      wayOut: 'Ask a lead who is, or the owner.',
      blocks: 'approve',
    }),
  ];
}

/** The signer acknowledges each caution anew, with the signature. */
export function signerCautionsCheck(
  cautions: readonly { readonly id: string; readonly level: string; readonly subject: string }[],
  acknowledgedIds: readonly string[],
): ApprovalCheck {
  const open = cautions.filter(({ id, level }) => level === 'care' && !acknowledgedIds.includes(id));
  return check('cautions-signer', 'Cautions acknowledged by the signer', {
    passes: open.length === 0,
    found: open.length === 0 ? 'All acknowledged.' : `Not acknowledged: ${open.map(({ subject }) => subject).join(' ')}`,
    wayOut: 'Read and acknowledge each before you sign.',
    blocks: 'approve',
  });
}
