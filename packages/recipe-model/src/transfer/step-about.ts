import type { MarkStep } from '../vocabulary/setting';
import type { TransferChoice, TransferNumbers, TransferPlace } from './transfer-ground';

/** Everything that the way from one step to its proposal looks at. */
export type StepAbout = {
  readonly step: MarkStep;
  readonly numbers: TransferNumbers;
  readonly source: TransferPlace;
  readonly target: TransferPlace;
  readonly choice: TransferChoice;
};
