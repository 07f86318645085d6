import { ProblemNotice } from '../../../components/problem-notice';
import type { ProblemError } from '../../../lib/api';

/** Why an act was refused, where it was tried. */
export function ActProblem({ problem }: { problem: ProblemError | undefined }) {
  if (problem === undefined) return null;
  if (problem.status === 0)
    return (
      <ProblemNotice
        what="No answer came from the server."
        safe="Whether it was carried out is not known."
        todo="Tap again when the connection is back: it is carried out once."
      />
    );
  return <ProblemNotice what={`${problem.title}.`} safe="Nothing was changed." todo={problem.detail} />;
}
