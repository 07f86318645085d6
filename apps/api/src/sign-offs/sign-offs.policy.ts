import type { SourceKind } from '@proofplate/recipe-model';
import { type ApprovalCheck, check } from '../recipes/approval-check';

export type Process = { readonly effectId: string; readonly sourceKind: string };
export type Signer = {
  readonly memberId: string;
  /** Processes that this lead may sign for; null: all of them. */
  readonly signsFor: readonly Process[] | null;
};
export type ToSign = { readonly createdBy: string; readonly effectId: string; readonly sourceKind: SourceKind };

/** Nobody approves what they wrote, unless the shop's policy allows it; then the signature says so. */
export const maySignOwn = ({ memberId }: Pick<Signer, 'memberId'>, { createdBy }: Pick<ToSign, 'createdBy'>, authorMaySign: boolean) =>
  createdBy !== memberId || authorMaySign;

/** A lead without named processes signs for all of them. */
export const signsForProcess = ({ signsFor }: Pick<Signer, 'signsFor'>, { effectId, sourceKind }: Process) =>
  signsFor === null || signsFor.some((process) => process.effectId === effectId && process.sourceKind === sourceKind);

/** What an approval needs of whoever signs. */
export function signerChecks(signer: Signer, revision: ToSign, authorMaySign: boolean): ApprovalCheck[] {
  const isOwn = revision.createdBy === signer.memberId;
  return [
    check('signer-not-author', 'Not your own', {
      passes: maySignOwn(signer, revision, authorMaySign),
      found: isOwn
        ? authorMaySign
          ? 'You wrote it. The policy allows you to sign; the signature will say so.'
          : 'You wrote it.'
        : 'Somebody else wrote it.',
      wayOut: 'Ask another lead.',
      blocks: 'approve',
    }),
    check('signer-process', 'Your process', {
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
