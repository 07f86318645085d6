import type { TransferReason, TransferResult } from '@proofplate/recipe-model';
import { ConflictError, type FieldProblem, InvalidError } from '../common/errors/domain-error';

/** Something is missing on either side, so that there is no number to draft. */
export class TransferNotPossibleError extends InvalidError {
  override readonly code = 'transfer-not-possible';
  override readonly title = 'There is no setting to draft';

  constructor(result: TransferResult) {
    super('Nothing was drafted. Each entry of errors says what is missing and where to enter it.', fieldProblems(result));
  }
}

/** The target cannot keep the numbers, and nobody said that this is accepted. */
export class NotEquivalentError extends ConflictError {
  override readonly code = 'transfer-not-equivalent';
  override readonly title = 'What comes nearest is not equivalent';

  constructor(result: TransferResult) {
    super('Nothing was drafted. Say that it is not equivalent and draft it all the same, or choose another machine or lens.', {
      reasons: [...result.reasons, ...result.steps.flatMap(({ reasons }) => reasons)].map(({ text }) => text),
    });
  }
}

function fieldProblems({ reasons, steps }: TransferResult): FieldProblem[] {
  return [
    ...reasons.map((reason) => ({ pointer: pointerOf(reason, undefined), detail: reason.text })),
    ...steps.flatMap(({ step, reasons: own }) => own.map((reason) => ({ pointer: pointerOf(reason, step - 1), detail: reason.text }))),
  ];
}

function pointerOf({ code }: TransferReason, index: number | undefined): string {
  if (index === undefined || code !== 'frequency outside interval') return '#/machineId';
  return `#/choices/${index}/frequencyKhz`;
}
