import type { CellTexture } from './burn-cell';
import { type Lab, luminanceOf } from './colour';
import { type GroundKind, groundOf } from './grounds';
import { type DoseColour, MARK_PROCESSES, type MarkKind, type MarkProcess } from './mark-kinds';
import type { MarkOutcome } from './mark-outcome';
import type { Random } from './noise';

export type Rating = 0 | 1 | 2 | 3 | 4 | 5;

export type Exposure = {
  /** Energy put on each square millimetre, all passes together, J/mm2. */
  readonly doseJPerMm2: number;
  /** Peak power of a pulse, kW; left out for a beam without pulses. */
  readonly peakPowerKw?: number;
  /** Distance between pulses along a line, um; left out for a beam without pulses. */
  readonly pulsePitchUm?: number;
};

export type ModelledMark = {
  readonly lab: Lab;
  /** |Yground - Ymark| / max(Yground, Ymark), 0 to 1. */
  readonly contrast: number;
  /** Standard deviation of L* inside the cell. */
  readonly evenness: number;
  readonly rating: Rating;
  readonly outcome: MarkOutcome;
  readonly texture: CellTexture;
  /** Distance to the wanted colour, CIE 1976. */
  readonly deltaETarget: number;
};

const VISIBLE_CONTRAST = 0.06;
const BAD = 0.45;

/**
 * What a cell of the demo shop looks like after an exposure. INVENTED: the curves are made up so that they obey the process
 * (more dose, more effect, then damage; high peak power tears; wide pitch shows dots), and describe no real machine or material.
 */
export function modelMark(kind: MarkKind, exposure: Exposure, random: Random): ModelledMark {
  const process = MARK_PROCESSES[kind];
  if (!(exposure.doseJPerMm2 > 0)) {
    throw new RangeError(`doseJPerMm2 must be above 0, got ${exposure.doseJPerMm2}`);
  }
  const decades = effectiveDecades(process, exposure);
  const texture = textureOf(process, exposure, decades, random);
  const [lightness, a, b] = colourAt(process.path, decades);
  // Bare ground doesn't scatter: marks differ from each other only where there is a mark.
  const scatter = unit(0.1 + (decades - (process.path[0]?.[0] ?? 0)) / 0.3);
  const lab: Lab = [lightness + 0.8 * scatter * spread(random), a + 0.4 * scatter * spread(random), b + 0.4 * scatter * spread(random)];
  const contrast = contrastTo(groundOf(process.ground).lab, lab);
  const deltaETarget = Math.hypot(lab[0] - process.target[0], lab[1] - process.target[1], lab[2] - process.target[2]);
  const flaw = 2.4 * texture.overburn + 1.3 * texture.banding + 1.1 * texture.mottle;
  const evenness = 0.45 + 1.6 * texture.banding + 1.9 * texture.mottle + 4.2 * texture.overburn + 0.15 * random();
  return {
    lab,
    contrast,
    evenness,
    rating: ratingOf(contrast, 5.2 - deltaETarget / process.toleranceDeltaE - flaw),
    outcome: outcomeOf(process, { contrast, deltaETarget, texture, lab }),
    texture,
    deltaETarget,
  };
}

/** The kind of plate that an effect is burnt on. */
export function groundOfMark(kind: MarkKind): GroundKind {
  return MARK_PROCESSES[kind].ground;
}

function effectiveDecades({ pulses }: MarkProcess, { doseJPerMm2, peakPowerKw }: Exposure): number {
  const peak = pulses === undefined || peakPowerKw === undefined ? 0 : pulses.peakWorth * Math.log10(peakPowerKw / pulses.usualPeakKw);
  return Math.log10(doseJPerMm2) + peak;
}

function textureOf(process: MarkProcess, { peakPowerKw, pulsePitchUm }: Exposure, decades: number, random: Random): CellTexture {
  const { pulses, overburnFrom } = process;
  const torn = pulses === undefined || peakPowerKw === undefined ? 0 : Math.log10(peakPowerKw / pulses.tearsAboveKw);
  const dots = pulses === undefined || pulsePitchUm === undefined ? 0 : pulsePitchUm / pulses.dotsAboveUm - 1;
  const beyond = decades - overburnFrom;
  const begun = decades - (process.path[0]?.[0] ?? 0);
  return {
    overburn: unit(2.6 * Math.max(0, beyond) + 1.4 * Math.max(0, torn)),
    banding: unit(0.06 * random() + 0.7 * Math.max(0, dots)),
    // Just above the threshold a mark is patchy: it depends on every scratch and grain of the ground.
    mottle: unit(0.1 + 0.1 * random() + 0.5 * Math.exp(-((begun / 0.28) ** 2)) + 0.3 * Math.max(0, beyond)),
    halo: unit(process.halo * (0.3 + 0.7 * unit(begun / (overburnFrom - (process.path[0]?.[0] ?? 0)))) + 0.9 * Math.max(0, beyond)),
  };
}

function colourAt(path: readonly DoseColour[], decades: number): Lab {
  const after = path.findIndex(([at]) => at >= decades);
  const upper = path[after === -1 ? path.length - 1 : after];
  const lower = path[after <= 0 ? (after === -1 ? path.length - 1 : 0) : after - 1];
  if (upper === undefined || lower === undefined) {
    throw new RangeError('path must hold at least one colour');
  }
  const share = upper[0] === lower[0] ? 0 : (decades - lower[0]) / (upper[0] - lower[0]);
  return [lower[1] + share * (upper[1] - lower[1]), lower[2] + share * (upper[2] - lower[2]), lower[3] + share * (upper[3] - lower[3])];
}

function contrastTo(ground: Lab, lab: Lab): number {
  const [bare, marked] = [luminanceOf(ground[0]), luminanceOf(lab[0])];
  return Math.abs(bare - marked) / Math.max(bare, marked);
}

function ratingOf(contrast: number, score: number): Rating {
  if (contrast < VISIBLE_CONTRAST) {
    return 0;
  }
  const steps: readonly Rating[] = [0, 1, 2, 3, 4, 5];
  return steps[Math.min(5, Math.max(0, Math.floor(score)))] ?? 0;
}

function outcomeOf(process: MarkProcess, mark: { contrast: number; deltaETarget: number; texture: CellTexture; lab: Lab }): MarkOutcome {
  const { contrast, deltaETarget, texture, lab } = mark;
  if (contrast < VISIBLE_CONTRAST) {
    return 'no mark';
  }
  if (texture.overburn > BAD) {
    return process.overburnOutcome;
  }
  if (texture.banding > BAD) {
    return 'banded';
  }
  if (deltaETarget < 2 * process.toleranceDeltaE) {
    return texture.halo > 0.8 ? 'halo' : 'good';
  }
  if (texture.mottle > BAD) {
    return 'uneven';
  }
  const chromaOff = Math.hypot(lab[1] - process.target[1], lab[2] - process.target[2]);
  return chromaOff > Math.abs(lab[0] - process.target[0]) || chromaOff > 10 ? 'wrong colour' : 'faint';
}

/** Roughly normal, standard deviation about 0.5, never beyond 1.5. */
function spread(random: Random): number {
  return random() + random() + random() - 1.5;
}

function unit(value: number): number {
  return Math.min(1, Math.max(0, value));
}
