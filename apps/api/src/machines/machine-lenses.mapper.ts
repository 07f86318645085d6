import type { Actor } from '../common/actor';
import type { MachineLensDto } from './dto/machine-lens.dto';
import type { MachineLensView } from './machine-lenses.repository';
import { machineLensActions } from './machines.policy';

export function toMachineLensDto({ pair, lens, isMounted }: MachineLensView, actor: Pick<Actor, 'role'>): MachineLensDto {
  return {
    id: pair.id,
    machineId: pair.machineId,
    lensId: lens.id,
    lensName: lens.name,
    focalLengthMm: lens.focalLengthMm,
    fieldSizeMm: lens.fieldSizeMm,
    workingDistanceMm: pair.workingDistanceMm,
    focusMethod: pair.focusMethod,
    measuredSpotUm: pair.measuredSpotUm,
    spotMethod: pair.spotMethod,
    spotMeasuredOn: pair.spotMeasuredOn,
    isMounted,
    version: pair.version,
    allowedActions: machineLensActions(actor),
  };
}
