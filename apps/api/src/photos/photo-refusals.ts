/** Why a photo is refused: shown to the person as it stands, always with the way out. */
export type RefusalCode =
  | 'unreadable'
  | 'too-many-pixels'
  | 'too-long-side'
  | 'animated'
  | 'four-colour'
  | 'not-a-photo'
  | 'too-slow'
  | 'lost'
  | 'gave-up';

export const MOST_PIXELS = 50_000_000;
/** A panorama strip stays under the pixel limit and is still of no use for measuring. */
export const LONGEST_SIDE_PX = 16_384;

export const REFUSAL_TEXT: Readonly<Record<RefusalCode, string>> = {
  unreadable: 'The file is damaged or cut off and cannot be opened whole. Send it again from the phone or camera, or take the photo again.',
  'too-many-pixels': `The picture has more than ${MOST_PIXELS / 1e6} million pixels. Set the camera to a smaller size, or scale the picture down, and send it again.`,
  'too-long-side': `One side is longer than ${LONGEST_SIDE_PX} pixels. Crop the picture to the plate and send it again.`,
  animated: 'The file holds several pictures (an animation). Save a single still picture as JPEG, PNG or WebP and send that.',
  'four-colour':
    'The file is prepared for four-colour printing (CMYK), whose colours cannot be measured. Save it as RGB (sRGB) and send it again.',
  'not-a-photo': 'The file is not a JPEG, PNG or WebP picture inside. Save the photo as JPEG and send it again.',
  'too-slow': 'Opening the picture took too long. Save it again as a plain JPEG, not larger than needed, and send that.',
  lost: 'The bytes that were sent did not reach the store whole. Send the photo again.',
  'gave-up': 'The picture could not be processed after several tries. Save it again as a plain JPEG, or take the photo again.',
};

/** Thrown by the pipeline for a file that no retry will make better. */
export class PhotoRefusedError extends Error {
  constructor(readonly code: RefusalCode) {
    super(REFUSAL_TEXT[code]);
    this.name = 'PhotoRefusedError';
  }
}
