import { absent, type DerivedNumber } from '../../exposure/derived/derived-number';
import { taperDevelopment } from '../taper-development';
import { isTaper, PART_SOURCE, type RoundPart } from './round-part';

const NO_TAPER = { unknownBecause: 'the part has no taper', isRuledOutByMode: true };
const CYLINDER = { unknownBecause: 'both ends have the same diameter: the artwork is a rectangle', isRuledOutByMode: true };

const described = (key: string, unit: string, formula: string) => ({ key, unit, formula, source: PART_SOURCE });
const SLANT = described('slantLength', 'mm', 'l = √((r2 − r1)² + H²)');
const TILT = described('tiltAngle', 'deg', 'α = atan((r2 − r1) / H)');
const SECTOR = described('sectorAngle', 'deg', '360 (r2 − r1) / l');
const SMALL = described('sectorInnerRadius', 'mm', 'r1 l / (r2 − r1)');
const LARGE = described('sectorOuterRadius', 'mm', 'r2 l / (r2 − r1)');
const STRETCH = described('widthErrorAtEnds', '1', 'h sin α / (2 r), half the artwork’s height from its middle');

/** Flat development of a cone and what a rectangle would lose on it. A straight part has none of them. */
export function taperNumbers({ body, lengthMm, artworkHeightMm }: RoundPart): readonly DerivedNumber[] {
  if (!isTaper(body)) return [SLANT, TILT, SECTOR, SMALL, LARGE, STRETCH].map((each) => absent(each, NO_TAPER));
  const [smallEndRadiusMm, largeEndRadiusMm] = [body.smallDiameterMm / 2, body.largeDiameterMm / 2];
  const { slantMm, halfAngleDeg, sectorDeg, smallRadiusMm, largeRadiusMm } = taperDevelopment(smallEndRadiusMm, largeEndRadiusMm, lengthMm);
  const inputs = { smallEndRadiusMm, largeEndRadiusMm, heightMm: lengthMm };
  const radius = (each: typeof SMALL, value: number | null) => (value === null ? absent(each, CYLINDER) : { ...each, value, inputs });
  const middleRadiusMm = (smallEndRadiusMm + largeEndRadiusMm) / 2;
  return [
    { ...SLANT, value: slantMm, inputs },
    { ...TILT, value: halfAngleDeg, inputs },
    { ...SECTOR, value: sectorDeg, inputs },
    radius(SMALL, smallRadiusMm),
    radius(LARGE, largeRadiusMm),
    {
      ...STRETCH,
      value: growthOverHalf(artworkHeightMm, halfAngleDeg) / middleRadiusMm,
      inputs: { artworkHeightMm, tiltAngleDeg: halfAngleDeg, middleRadiusMm },
    },
  ];
}

/** How much the radius grows from the middle of the artwork to its wider end. */
export function growthOverHalf(artworkHeightMm: number, tiltAngleDeg: number): number {
  return (artworkHeightMm / 2) * Math.sin((tiltAngleDeg * Math.PI) / 180);
}
