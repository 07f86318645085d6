import { UnavailableError } from '../common/errors/domain-error';

/** The object store does not answer, or not in time. Nothing of ours depends on it but photos. */
export class StorageUnavailableError extends UnavailableError {
  override readonly code = 'storage-unavailable';
  override readonly title = 'Photos cannot be stored or read at the moment';

  constructor(options?: { cause: unknown }) {
    super('The store for photos does not answer. Everything else works; try the photo again in a minute.', 30);
    this.cause = options?.cause;
  }
}

/** The object that a row promises is not in the store. */
export class ObjectMissingError extends Error {
  constructor(readonly key: string) {
    super(`no object ${key}`);
    this.name = 'ObjectMissingError';
  }
}

/** What the store keeps differs from what was sent or promised. */
export class ObjectDamagedError extends Error {
  constructor(readonly key: string) {
    super(`object ${key} differs from what was stored`);
    this.name = 'ObjectDamagedError';
  }
}
