import { ConflictError, DomainError, InvalidError } from '../common/errors/domain-error';

export class UnsupportedPhotoError extends DomainError {
  readonly code: string = 'unsupported-photo';
  readonly status = 415;
  readonly title: string = 'This is not a photo that can be kept';

  constructor(detail = 'The file is not a JPEG, PNG or WebP picture, whatever its name says. Save the photo as JPEG and send it again.') {
    super(detail);
  }
}

/** Phones can save HEIC, which has no free decoder; the way out is on the phone. */
export class HeicPhotoError extends UnsupportedPhotoError {
  override readonly code = 'heic-photo';
  override readonly title = 'HEIC photos cannot be opened here';

  constructor() {
    super(
      'Set the phone’s camera to save JPEG (often called “most compatible”) and take the photo again, or open this one on the phone and share or export it as JPEG.',
    );
  }
}

export class PhotoTooLargeError extends DomainError {
  readonly code = 'too-large';
  readonly status = 413;
  readonly title = 'This is too large';

  constructor() {
    super('A photo may have 25 MB at most. Set the camera to a smaller size, or save the photo as JPEG, and send it again.');
  }
}

export class PhotoFileMissingError extends InvalidError {
  constructor(detail: string) {
    super(detail, [{ pointer: '#/file', detail }]);
  }
}

export class CouponSealedError extends ConflictError {
  override readonly code = 'coupon-sealed';
  override readonly title = 'The coupon is sealed';

  constructor() {
    super('A sealed coupon and its photos never change. Add a correction to it, or mark a new coupon.');
  }
}

export class PhotoNotReadyError extends ConflictError {
  override readonly code = 'photo-not-ready';
  override readonly title = 'The photo is not ready';

  constructor() {
    super('Corners can be set once the photo is processed. Wait a moment; a refused photo says what to do instead.');
  }
}
