import type { ProblemError } from '../lib/api';
import { Button } from './button';
import { EmptyState } from './empty-state';
import { ProblemNotice } from './problem-notice';

export type ReadProblemProps = {
  problem: ProblemError;
  /** The page's own name for what it could not read: "this coupon". */
  thing?: string;
  onRetry: () => void;
};

/** In the place of what could not be read. */
export function ReadProblem({ problem, thing = 'this', onRetry }: ReadProblemProps) {
  if (problem.status === 403) {
    return (
      <EmptyState kind="no-right" title="Your role does not show this">
        Ask an owner of the shop for another role.
      </EmptyState>
    );
  }
  if (problem.status === 404) {
    return (
      <EmptyState kind="no-right" title="There is no such thing here">
        It does not exist in this shop, or no longer.
      </EmptyState>
    );
  }
  return (
    <ProblemNotice
      what={problem.status === 0 ? `The server did not answer, so ${thing} cannot be shown.` : `${problem.title}.`}
      safe="Nothing was changed."
      todo={problem.status === 0 ? 'Check the network, then try again.' : problem.detail}
      actions={<Button onClick={onRetry}>Try again</Button>}
    />
  );
}
