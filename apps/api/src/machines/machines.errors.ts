import { ConflictError, NotFoundError } from '../common/errors/domain-error';

export class MachineNotFoundError extends NotFoundError {
  constructor() {
    super('This machine is not in the shop, or no longer. Go back to Equipment.');
  }
}

export class MachineArchivedError extends ConflictError {
  constructor() {
    super('The machine is archived. Restore it first.');
  }
}
