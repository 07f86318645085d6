import { isDraftable, type MarkStep, type TransferReason, type TransferResult } from '@proofplate/recipe-model';
import type { TransferGroundDto, TransferPlaceDto, TransferPreviewDto, TransferReasonDto } from './dto/transfer.dto';
import type { GroundPlace, TransferGround } from './transfer-ground.service';

export function toTransferGroundDto({ record, source, targets }: TransferGround): TransferGroundDto {
  return {
    source: toPlaceDto(source),
    steps: record.revision.content.steps,
    targets: targets.map((target) => ({
      ...toPlaceDto(target),
      recipes: target.recipes.map(({ id, code, title }) => ({ id, code, title })),
    })),
  };
}

function toPlaceDto({ machineId, machineName, lensId, lensName, focalLengthMm, measuredSpotUm, physical, panel, ...place }: GroundPlace) {
  const dto: TransferPlaceDto = {
    machine: { id: machineId, name: machineName },
    lens: { id: lensId, name: lensName },
    ...{ focalLengthMm, measuredSpotUm, physical, panel },
    calibrations: place.calibrations.map(({ id, measuredOn, frequencyKhz, pulseWidthNs, points }) => ({
      ...{ id, measuredOn, frequencyKhz, pulseWidthNs },
      points: [...points],
    })),
  };
  return dto;
}

export function toTransferPreviewDto(result: TransferResult, sourceSteps: readonly MarkStep[]): TransferPreviewDto {
  return {
    outcome: result.outcome,
    isDraftable: isDraftable(result),
    reasons: result.reasons.map(toReasonDto),
    steps: result.steps.map(({ step, outcome, reasons, interval, proposal }) => ({
      ...{ step, outcome },
      reasons: reasons.map(toReasonDto),
      interval:
        interval === null
          ? null
          : { lowestKhz: interval.lowestKhz, highestKhz: interval.highestKhz, isEmpty: interval.isEmpty, endsBy: interval.endsBy },
      proposal: proposedSteps(result, sourceSteps)[step - 1] ?? null,
      kept: proposal === null ? [] : [...proposal.kept],
      timeRatio: proposal?.timeRatio ?? null,
    })),
  };
}

/** The steps of the draft: purpose and pause stay, the parameters are the target's; null where a step has no number. */
export function proposedSteps({ steps }: TransferResult, sourceSteps: readonly MarkStep[]): (MarkStep | null)[] {
  return steps.map(({ proposal }, index) => {
    const before = sourceSteps[index];
    return proposal === null || before === undefined ? null : { ...before, parameters: proposal.parameters };
  });
}

const toReasonDto = ({ code, text, side }: TransferReason): TransferReasonDto => ({ code, text, side: side ?? null });
