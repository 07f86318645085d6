import type { PhysicalProfile } from '../vocabulary/profile';

/** What makes the spot: the machine's source and scan head, the lens, and the spot where somebody measured it. */
export type Optics = {
  readonly physical: PhysicalProfile;
  readonly focalLengthMm: number;
  readonly measuredSpotUm: number | null;
};
