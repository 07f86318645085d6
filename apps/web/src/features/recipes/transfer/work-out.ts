import {
  type MarkStep,
  type TransferChoice,
  type TransferOutcome,
  type TransferPlace,
  type TransferResult,
  transferSetting,
  type WorkPower,
} from '@proofplate/recipe-model';
import type { TransferGround, TransferPlaceRecord, TransferTarget } from './transfer.api';

export const keyOf = ({ machine, lens }: Pick<TransferPlaceRecord, 'machine' | 'lens'>) => `${machine.id}/${lens.id}`;
export const nameOf = ({ machine, lens }: Pick<TransferPlaceRecord, 'machine' | 'lens'>) => `${machine.name}, ${lens.name}`;

/** A record of the api as the recipe model takes it. */
export function asPlace({ machine, lens, physical, panel, calibrations, ...optics }: TransferPlaceRecord): TransferPlace {
  return {
    ...{ machineName: machine.name, lensName: lens.name, profile: physical, panel },
    ...{ focalLengthMm: optics.focalLengthMm, measuredSpotUm: optics.measuredSpotUm },
    calibrations: calibrations.map(({ id, measuredOn, frequencyKhz, pulseWidthNs, points }) => ({
      ...{ id, measuredOn, frequencyKhz, pulseWidthNs },
      points: points.map(({ percent, watts }) => ({ percent, powerW: watts })),
    })),
  };
}

/** The steps of the api as the recipe model takes them. */
export function asSteps(steps: TransferGround['steps']): MarkStep[] {
  return steps.map(({ parameters, ...step }) => ({ ...step, parameters: { ...parameters, power: asPower(parameters.power) } }));
}

function asPower({ watts, basis = 'not calibrated', reason = '' }: TransferGround['steps'][number]['parameters']['power']): WorkPower {
  return watts === null ? { watts, reason } : { watts, basis };
}

export function workOut(
  { steps, source }: TransferGround,
  target: TransferTarget,
  choices: readonly TransferChoice[] = [],
): TransferResult {
  return transferSetting({ steps: asSteps(steps), source: asPlace(source), target: asPlace(target), choices });
}

const ORDER: Readonly<Record<TransferOutcome, number>> = { equivalent: 0, 'not equivalent': 1, 'not known': 2 };

/** Every target with its verdict, those that keep the numbers first. */
export function judgedTargets(ground: TransferGround): { target: TransferTarget; outcome: TransferOutcome }[] {
  const judged = ground.targets.map((target) => ({ target, outcome: workOut(ground, target).outcome }));
  return judged.sort((one, other) => ORDER[one.outcome] - ORDER[other.outcome]);
}
