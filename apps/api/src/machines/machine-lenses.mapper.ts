import type { Actor } from '../common/actor';
import type { MachineLensDto } from './dto/machine-lens.dto';
import type { SpotMeasurementDto } from './dto/spot-measurement.dto';
import type { MachineLensRow, MachineLensView } from './machine-lenses.repository';
import { machineLensActions } from './machines.policy';
import type { SpotView } from './spot-measurements.repository';

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

/** Newest first; the one in use is the newest that says what the pair says. */
export function toSpotMeasurementDtos(views: readonly SpotView[], pair: MachineLensRow): SpotMeasurementDto[] {
  const inUse = views.find(
    ({ spot }) => spot.spotUm === pair.measuredSpotUm && spot.method === pair.spotMethod && spot.measuredOn === pair.spotMeasuredOn,
  );
  return views.map((view) => {
    const { id, spotUm, standardErrorUm, method, measuredOn, couponId, fit, createdAt } = view.spot;
    const coupon = couponId === null || view.couponCode === null ? null : { id: couponId, code: view.couponCode };
    const from = { coupon, fit, isInUse: view === inUse, createdByName: view.createdByName };
    return { id, spotUm, standardErrorUm, method, measuredOn, ...from, createdAt: createdAt.toISOString() };
  });
}
