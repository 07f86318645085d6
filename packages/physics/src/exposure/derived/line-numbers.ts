import { interactionTime } from '../interaction-time';
import { lineEnergy } from '../line-energy';
import { pulseOverlap } from '../pulse-overlap';
import { pulsePitch } from '../pulse-pitch';
import { pulsesPerSpot } from '../pulses-per-spot';
import { type DerivedNumber, derive } from './derived-number';
import type { EffectiveParameters } from './effective-parameters';
import type { Quantity } from './mark-parameters';

const PAGE = 'docs/science/scanning.md';
const DEFINITION = `definition; ${PAGE}`;

/** Numbers along a line. With wobble they would need the true path and are absent. */
export function lineNumbers(parameters: EffectiveParameters, spotDiameterUm: Quantity): readonly DerivedNumber[] {
  const { powerW, frequencyKhz, spotSpeedMmPerS: speedMmPerS } = parameters;
  return [
    derive(
      { key: 'pulsePitch', unit: 'µm', formula: 'pitch = v / f', source: DEFINITION },
      { speedMmPerS, frequencyKhz },
      { compute: (known) => pulsePitch(known.speedMmPerS, known.frequencyKhz) },
    ),
    derive(
      { key: 'pulseOverlap', unit: '1', formula: 'PO = 1 − v / (f d)', source: DEFINITION },
      { speedMmPerS, frequencyKhz, spotDiameterUm },
      { compute: (known) => pulseOverlap(known.speedMmPerS, known.frequencyKhz, known.spotDiameterUm) },
    ),
    derive(
      { key: 'pulsesPerSpot', unit: '1', formula: 'N = d f / v', source: `Weber et al., Appl. Phys. A (2018); ${PAGE}` },
      { speedMmPerS, frequencyKhz, spotDiameterUm },
      { compute: (known) => pulsesPerSpot(known.speedMmPerS, known.frequencyKhz, known.spotDiameterUm) },
    ),
    derive(
      { key: 'lineEnergy', unit: 'J/mm', formula: 'P / v', source: DEFINITION },
      { powerW, speedMmPerS },
      { compute: (known) => lineEnergy(known.powerW, known.speedMmPerS) },
    ),
    derive(
      { key: 'interactionTime', unit: 'µs', formula: 't = d / v', source: DEFINITION },
      { spotDiameterUm, speedMmPerS },
      { compute: (known) => interactionTime(known.spotDiameterUm, known.speedMmPerS) },
    ),
  ];
}
