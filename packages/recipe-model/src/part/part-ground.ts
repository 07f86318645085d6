import type { PartGround } from './entered-part';

/** Beam and lens of a machine as the shop's records have them; null: not recorded. */
export type PartOpticsFacts = {
  readonly wavelengthNm: number;
  readonly m2: number | null;
  /** 1/e² diameter at the lens. */
  readonly beamDiameterMm: number | null;
  readonly focalLengthMm: number;
  readonly fieldSizeMm: number;
  /** 1/e² diameter that somebody measured in focus on this machine with this lens. */
  readonly measuredSpotUm: number | null;
  /** Focus offset of each mark step of the setting; empty without a setting: in focus. */
  readonly focusOffsetsMm: readonly number[];
};

const notKnown = (what: string) => ({ unknownBecause: `${what} is not recorded; add it to the machine` });

/** What partSetUp works with: a measured spot before a computed one, and the reason where neither can be had. */
export function partGround({
  wavelengthNm,
  m2,
  beamDiameterMm,
  focalLengthMm,
  fieldSizeMm,
  measuredSpotUm,
  focusOffsetsMm,
}: PartOpticsFacts): PartGround {
  const beam = { wavelengthNm, m2: m2 ?? notKnown('the beam’s M²') };
  const spot =
    measuredSpotUm === null
      ? { ...beam, focalLengthMm, beamDiameterMm: beamDiameterMm ?? notKnown('the beam diameter at the lens') }
      : { ...beam, spotDiameterUm: measuredSpotUm };
  return { spot, fieldSizeMm, focusOffsetsMm };
}
