import { type RunKind, roleAtLeast } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';

export type RunAction = 'tick' | 'set-up-part' | 'first-piece' | 'finish' | 'bad-result';
type Acting = Pick<Actor, 'role' | 'memberId'>;

/** Trainees see their own runs; from operator up everybody's. */
export const readsAllRuns = ({ role }: Pick<Actor, 'role'>) => roleAtLeast(role, 'operator');

/** Confirmation runs belong to whoever may draft and prove settings. */
export const mayStart = ({ role }: Pick<Actor, 'role'>, kind: RunKind) => kind !== 'confirmation' || roleAtLeast(role, 'operator');

/** What the member may do with a run. `isStopped`: under a hold, or its revision was withdrawn or superseded. */
export function runActions(
  actor: Acting,
  run: { readonly state: string; readonly startedBy: string; readonly isStopped: boolean },
): RunAction[] {
  if (!readsAllRuns(actor) && run.startedBy !== actor.memberId) return [];
  if (run.state !== 'started') return ['bad-result'];
  return run.isStopped ? ['tick', 'set-up-part', 'finish', 'bad-result'] : ['tick', 'set-up-part', 'first-piece', 'finish', 'bad-result'];
}

/** What the member may do with a request for a setting. */
export function requestActions(actor: Acting, request: { readonly state: string }): 'answer'[] {
  return request.state === 'open' && roleAtLeast(actor.role, 'operator') ? ['answer'] : [];
}

/** What the member may do with a hold. */
export function holdActions(actor: Pick<Actor, 'role'>, hold: { readonly releasedAt: Date | null }): 'release'[] {
  return hold.releasedAt === null && roleAtLeast(actor.role, 'lead') ? ['release'] : [];
}
