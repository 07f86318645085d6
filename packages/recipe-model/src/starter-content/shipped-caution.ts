import type { CautionLevel, CautionScope } from '../cautions/caution';

/**
 * A caution that every shop starts with. The subject says what to do, the text says why, the source says who says so. Nothing here
 * clears anything: the machine's manual and the laser safety officer decide. Keys are permanent; a shop may tighten, never loosen.
 */
export type ShippedCaution = {
  readonly shippedKey: string;
  readonly level: CautionLevel;
  readonly subject: string;
  readonly text: string;
  readonly source: string;
  readonly appliesTo: CautionScope;
};

/** Named where no page was found that could be cited; said openly instead of borrowing an authority. */
export const GENERAL_KNOWLEDGE = 'General knowledge of the trade; no source on file. Ask the laser safety officer.';
