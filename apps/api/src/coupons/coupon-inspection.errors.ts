import { ConflictError } from '../common/errors/domain-error';
import type { MissingItemDto } from './dto/inspection.dto';

export class CriteriaFirstError extends ConflictError {
  override readonly code = 'criteria-first';
  override readonly title = 'Record the acceptance criteria first';

  constructor() {
    super(
      'Criteria are recorded before anything is rated or measured, so that results cannot bend them. Record them on the coupon’s page.',
    );
  }
}

export class CriteriaFixedError extends ConflictError {
  override readonly code = 'criteria-fixed';
  override readonly title = 'The criteria stay as they were recorded';

  constructor() {
    super('Cells of this coupon are rated or measured already. Plan another coupon to judge by other criteria.');
  }
}

export class InspectionIncompleteError extends ConflictError {
  override readonly code = 'inspection-incomplete';
  override readonly title = 'The inspection is not complete';

  constructor(missing: readonly MissingItemDto[]) {
    super(missing.map(({ text }) => text).join(' '), { missing });
  }
}

export class NotReadyToSealError extends ConflictError {
  override readonly code = 'not-ready-to-seal';
  override readonly title = 'The coupon cannot be sealed yet';

  constructor(missing: readonly MissingItemDto[]) {
    super(missing.map(({ text }) => text).join(' '), { missing });
  }
}
