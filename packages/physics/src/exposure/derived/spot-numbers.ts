import { apodisationFactor, LEAST_PRINTED_RATIO } from '../../beam/apodisation-factor';
import { focusedSpotDiameter } from '../../beam/focused-spot-diameter';
import { rayleighLength } from '../../beam/rayleigh-length';
import { spotDiameterAtOffset } from '../../beam/spot-diameter-at-offset';
import { absent, type DerivedNumber, derive, quantityOf } from './derived-number';
import type { MarkSpot, Quantity } from './mark-parameters';

const SOURCE = 'ISO 11146-1; docs/science/beam.md';
const PARAXIAL_FROM_F_OVER_D = 4;
const UNCUT_FROM_RATIO = 1.5;
const NOT_PARAXIAL = `the focal length is less than ${PARAXIAL_FROM_F_OVER_D} times the beam diameter: the paraxial formula no longer holds`;

export type SpotNumbers = {
  readonly focalSpot: DerivedNumber;
  readonly rayleigh: DerivedNumber;
  readonly spotAtWork: DerivedNumber;
};

/** The spot in focus, its Rayleigh length, and the spot on the surface that lies `focusOffsetMm` from the focal plane. */
export function spotNumbers(spot: MarkSpot, focusOffsetMm: Quantity): SpotNumbers {
  const focalSpot = focalSpotOf(spot);
  const rayleigh = derive(
    { key: 'rayleighLength', unit: 'mm', formula: 'zR = π d0² / (4 M² λ)', source: SOURCE },
    { spotDiameterUm: quantityOf(focalSpot), ...propagation(spot) },
    { compute: rayleighLength },
  );
  return { focalSpot, rayleigh, spotAtWork: spotAtWorkOf(focalSpot, rayleigh, focusOffsetMm) };
}

function focalSpotOf(spot: MarkSpot): DerivedNumber {
  const described = { key: 'focalSpot', unit: 'µm', source: SOURCE };
  if ('unknownBecause' in spot) return absent({ ...described, formula: 'd0 = 4 M² λ f / (π D)' }, spot);
  if ('spotDiameterUm' in spot) {
    const { spotDiameterUm } = spot;
    return { ...described, formula: 'd0 as measured', source: 'measured spot', value: spotDiameterUm, inputs: { spotDiameterUm } };
  }
  const { wavelengthNm, focalLengthMm, beamDiameterMm, m2, apertureMm } = spot;
  return derive(
    { ...described, formula: 'd0 = 4 M² λ f / (π D)' },
    { wavelengthNm, focalLengthMm, beamDiameterMm, m2 },
    {
      compute: focusedSpotDiameter,
      outOfRange: (known) => {
        if (known.focalLengthMm < PARAXIAL_FROM_F_OVER_D * known.beamDiameterMm) return NOT_PARAXIAL;
        return apertureMm === undefined ? undefined : cutBy(apertureMm, known.beamDiameterMm);
      },
    },
  );
}

/** The value stays that of the formula; how far off it is stands beside it. */
function cutBy(apertureMm: number, beamDiameterMm: number): string | undefined {
  const ratio = apertureMm / beamDiameterMm;
  if (ratio >= UNCUT_FROM_RATIO) return undefined;
  const cut = `the aperture is less than ${UNCUT_FROM_RATIO} times the beam diameter and cuts the beam`;
  if (ratio < LEAST_PRINTED_RATIO) return `${cut}: the spot is far wider than the formula says`;
  const growth = apodisationFactor(apertureMm, beamDiameterMm) / (4 / Math.PI);
  return `${cut}: the spot is about ${growth.toFixed(2)} times as wide as the formula says`;
}

function propagation(spot: MarkSpot): { readonly wavelengthNm: Quantity; readonly m2: Quantity } {
  if ('unknownBecause' in spot) return { wavelengthNm: spot, m2: spot };
  return {
    wavelengthNm: spot.wavelengthNm ?? { unknownBecause: 'the wavelength is not given' },
    m2: spot.m2 ?? { unknownBecause: 'the M² of the beam is not given' },
  };
}

function spotAtWorkOf(focalSpot: DerivedNumber, rayleigh: DerivedNumber, focusOffsetMm: Quantity): DerivedNumber {
  const described = { key: 'spotAtWork', unit: 'µm', formula: 'd = d0 √(1 + (z/zR)²)', source: SOURCE };
  const inFocus = { spotDiameterUm: quantityOf(focalSpot), focusOffsetMm };
  // In focus the spot needs no Rayleigh length: a measured diameter is enough.
  if (focusOffsetMm === 0) return derive(described, inFocus, { compute: ({ spotDiameterUm }) => spotDiameterUm });
  return derive(
    described,
    { ...inFocus, rayleighLengthMm: quantityOf(rayleigh) },
    { compute: (known) => spotDiameterAtOffset(known.spotDiameterUm, known.rayleighLengthMm, known.focusOffsetMm) },
  );
}
