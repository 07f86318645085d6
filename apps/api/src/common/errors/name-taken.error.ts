import { ConflictError } from './domain-error';

/** A second thing of the same kind and name; names its field, so that a form can show it there. */
export class NameTakenError extends ConflictError {
  override readonly code = 'already-exists';
  override readonly title = 'This exists already';

  constructor(kind: string, name: string) {
    const detail = `There is already a ${kind} called “${name}”. Choose another name, or use the one that is there.`;
    super(detail, { errors: [{ pointer: '#/name', detail }] });
  }
}
