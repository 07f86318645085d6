import { Injectable } from '@nestjs/common';
import type { MeasuredCalibration, Optics, TimeGround } from '@proofplate/recipe-model';
import { InvalidError, NotFoundError } from '../common/errors/domain-error';
import type { Tx } from '../database/unit-of-work';
import { CalibrationsService } from '../machines/calibrations.service';
import { MachineLensesService } from '../machines/machine-lenses.service';
import { MachinesService } from '../machines/machines.service';
import { MarkingTimesService } from '../machines/marking-times.service';
import { type Catalogue, type CatalogueKeys, CouponPlanCatalogueService, refuseArchived } from './coupon-plan-catalogue.service';
import type { SettingMachine } from './coupon-plan-setting';

export type CouponKeys = CatalogueKeys & { readonly machineId: string; readonly lensId: string };

/** Everything a plan stands on, read in the transaction that uses it. */
export type PlanGround = Catalogue & {
  readonly machine: SettingMachine;
  readonly optics: Optics;
  readonly time: TimeGround;
  readonly profileId: string;
  readonly calibrationId: string | null;
  readonly lens: { readonly name: string; readonly fieldSizeMm: number };
};

@Injectable()
export class CouponPlanGroundService {
  constructor(
    private readonly machines: MachinesService,
    private readonly machineLenses: MachineLensesService,
    private readonly calibrations: CalibrationsService,
    private readonly catalogue: CouponPlanCatalogueService,
    private readonly times: MarkingTimesService,
  ) {}

  /**
   * Reads the ground of a plan and refuses what must not be planned.
   *
   * @throws ForbiddenByCautionError when a `never` caution applies
   * @throws InvalidError when the lens is not one of the machine's, or something is archived
   */
  async read(tx: Tx, shopId: string, keys: CouponKeys): Promise<PlanGround> {
    const { machine, profile } = await this.machines.getMachineWithProfile(tx, shopId, keys.machineId);
    const catalogue = await this.catalogue.read(tx, shopId, keys, profile.sourceKind);
    refuseArchived({ machineId: machine });
    const { lens, pair } = await this.lensOf(tx, shopId, keys);
    const calibration = await this.calibrations.findNewest(tx, shopId, machine.id);
    const { panel, physical } = profile;
    return {
      ...catalogue,
      machine: { panel, physical, ...(calibration === undefined ? {} : { calibration: measuredCalibration(calibration) }) },
      optics: { physical, focalLengthMm: lens.focalLengthMm, measuredSpotUm: pair.measuredSpotUm },
      time: await this.times.ground(tx, shopId, machine.id),
      profileId: profile.id,
      calibrationId: calibration?.id ?? null,
      lens,
    };
  }

  private async lensOf(tx: Tx, shopId: string, { machineId, lensId }: CouponKeys) {
    try {
      return await this.machineLenses.getMachineLens(tx, shopId, machineId, lensId);
    } catch (error) {
      if (!(error instanceof NotFoundError)) throw error;
      const detail = 'This lens is not one of the machine’s. Choose one of its lenses, or add it on the machine’s page.';
      throw new InvalidError('The lens does not fit the machine.', [{ pointer: '#/lensId', detail }]);
    }
  }
}

type StoredCalibration = {
  readonly points: readonly { percent: number; watts: number }[];
  readonly frequencyKhz: number | null;
  readonly pulseWidthNs: number | null;
};

/** A stored calibration as the power model reads it. */
export const measuredCalibration = ({ points, frequencyKhz, pulseWidthNs }: StoredCalibration): MeasuredCalibration => ({
  points: points.map(({ percent, watts }) => ({ percent, powerW: watts })),
  frequencyKhz,
  pulseWidthNs,
});
