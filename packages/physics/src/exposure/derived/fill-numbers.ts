import { areaRate } from '../area-rate';
import { arealDose } from '../areal-dose';
import { coverageRipple } from '../coverage-ripple';
import { lineOverlap } from '../line-overlap';
import { pulsesPerSpotArea } from '../pulses-per-spot-area';
import { scansPerSpot } from '../scans-per-spot';
import { type DerivedNumber, derive } from './derived-number';
import type { EffectiveParameters } from './effective-parameters';
import type { Quantity } from './mark-parameters';

const PAGE = 'docs/science/scanning.md';
const DEFINITION = `definition; ${PAGE}`;
const WEBER = `Weber et al., Appl. Phys. A (2018); ${PAGE}`;
const GAPS = 'the lines lie farther apart than the spot is wide: a mean over marked lines and bare gaps';
const REFERENCE_AREA_MM2 = 100;

/** Numbers over a filled area. An outline has none of them. */
export function fillNumbers(parameters: EffectiveParameters, spotDiameterUm: Quantity): readonly DerivedNumber[] {
  return [...acrossLines(parameters, spotDiameterUm), ...overArea(parameters, spotDiameterUm), ...rates(parameters)];
}

function acrossLines(parameters: EffectiveParameters, spotDiameterUm: Quantity): readonly DerivedNumber[] {
  const inputs = { lineSpacingUm: parameters.straightSpacingUm, spotDiameterUm };
  return [
    derive({ key: 'lineOverlap', unit: '1', formula: 'LO = 1 − h / d', source: DEFINITION }, inputs, {
      compute: (known) => lineOverlap(known.lineSpacingUm, known.spotDiameterUm),
    }),
    derive({ key: 'scansPerSpot', unit: '1', formula: 'd / h', source: WEBER }, inputs, {
      compute: (known) => scansPerSpot(known.lineSpacingUm, known.spotDiameterUm),
    }),
    derive(
      {
        key: 'coverageRipple',
        unit: '1',
        formula: '(max − min) / (max + min) across Gaussian lines',
        source: `Poisson summation; ${PAGE}`,
      },
      inputs,
      { compute: (known) => coverageRipple(known.spotDiameterUm, known.lineSpacingUm).contrast },
    ),
  ];
}

function overArea(parameters: EffectiveParameters, spotDiameterUm: Quantity): readonly DerivedNumber[] {
  const { powerW, frequencyKhz, scans, spotSpeedMmPerS: speedMmPerS, straightSpacingUm: lineSpacingUm } = parameters;
  const gaps = (spacingUm: number, spotUm: Quantity) => (typeof spotUm === 'number' && spacingUm > spotUm ? GAPS : undefined);
  return [
    derive(
      { key: 'pulsesPerSpotArea', unit: '1', formula: 'N = n π d² f / (4 v h), n scans', source: WEBER },
      { spotDiameterUm, frequencyKhz, speedMmPerS, lineSpacingUm, scans },
      { compute: pulsesPerSpotArea, outOfRange: (known) => gaps(known.lineSpacingUm, spotDiameterUm) },
    ),
    derive(
      { key: 'arealDose', unit: 'J/mm²', formula: 'n P / (v h), n scans (a crossed pass counts 2)', source: `energy balance; ${PAGE}` },
      { powerW, speedMmPerS, lineSpacingUm, scans },
      { compute: arealDose, outOfRange: (known) => gaps(known.lineSpacingUm, spotDiameterUm) },
    ),
  ];
}

/** Wobble leaves these alone: the lines still advance with the scan speed and the spacing. */
function rates({ scanSpeedMmPerS: speedMmPerS, fillSpacingUm: lineSpacingUm, scans }: EffectiveParameters): readonly DerivedNumber[] {
  return [
    derive(
      { key: 'areaRate', unit: 'mm²/s', formula: 'v h, one scan with the beam on', source: DEFINITION },
      { speedMmPerS, lineSpacingUm },
      { compute: (known) => areaRate(known.speedMmPerS, known.lineSpacingUm) },
    ),
    derive(
      {
        key: 'timePer100Mm2',
        unit: 's',
        formula: 'n · 100 mm² / (v h), n scans, beam-on time without jumps and delays',
        source: DEFINITION,
      },
      { speedMmPerS, lineSpacingUm, scans },
      { compute: (known) => (known.scans * REFERENCE_AREA_MM2) / areaRate(known.speedMmPerS, known.lineSpacingUm) },
    ),
  ];
}
