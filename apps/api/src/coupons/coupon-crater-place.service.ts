import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { NotFoundError } from '../common/errors/domain-error';
import type { Tx } from '../database/unit-of-work';
import { MachineLensesService } from '../machines/machine-lenses.service';
import { MachinesService } from '../machines/machines.service';
import { ShopsService } from '../shops/shops.service';
import type { PlaceNow } from './coupon-crater-fit.mapper';
import type { CouponView } from './coupons.repository';
import type { CraterFitDto, CraterSpotDto } from './dto/crater-fit.dto';

type SpotOfCoupon = {
  readonly spot: CraterSpotDto;
  readonly line: Pick<CraterFitDto, 'points' | 'series' | 'fit' | 'pointCount'>;
  readonly coupon: { readonly id: string; readonly code: string };
};

/** The machine and lens of a coupon as they are now, where a spot from its craters belongs. */
@Injectable()
export class CouponCraterPlaceService {
  constructor(
    private readonly machines: MachinesService,
    private readonly machineLenses: MachineLensesService,
    private readonly shops: ShopsService,
  ) {}

  /** Undefined: the lens of an old plate is not on the machine. */
  async find(tx: Tx, shopId: string, { coupon }: Pick<CouponView, 'coupon'>): Promise<PlaceNow | undefined> {
    const { machine, profile } = await this.machines.getMachineWithProfile(tx, shopId, coupon.machineId);
    const mounted = await this.findLens(tx, shopId, coupon);
    if (mounted === undefined) return undefined;
    const { measuredSpotUm, spotMethod, spotMeasuredOn, version } = mounted.pair;
    return {
      ...{ machineId: machine.id, machineName: machine.name, lensId: mounted.lens.id, lensName: mounted.lens.name },
      ...{ measuredSpotUm, spotMethod, spotMeasuredOn, version },
      ...{ physicalNumber: profile.physicalNumber, isArchived: machine.archivedAt !== null },
    };
  }

  /** The day on the shop's calendar on which something was measured. */
  async dayOf(tx: Tx, shopId: string, at: Date): Promise<string> {
    return this.shops.dayOf(tx, shopId, at);
  }

  /** @throws StaleError when the lens on the machine is no longer at that version */
  async record(
    tx: Tx,
    actor: Actor,
    pair: { readonly machineId: string; readonly lensId: string; readonly version: number },
    { spot, line, coupon }: SpotOfCoupon,
  ): Promise<void> {
    const { points, series, fit, pointCount } = line;
    if (series === null || fit === null) throw new Error('a spot without a line was to be kept');
    const { thresholdEnergyUj, thresholdEnergyStandardErrorUj, thresholdPeakFluenceJPerCm2, thresholdPeakFluenceStandardErrorJPerCm2 } =
      fit;
    const kept = {
      ...{ pointCount, pulses: series.pulses, pulseWidthNs: series.pulseWidthNs, thresholdEnergyUj, thresholdEnergyStandardErrorUj },
      ...{ thresholdPeakFluenceJPerCm2, thresholdPeakFluenceStandardErrorJPerCm2 },
      cells: points.filter(({ excludedBecause }) => excludedBecause === null).map(({ address }) => address),
    };
    await this.machineLenses.recordSpot(tx, actor, pair, {
      ...{ spotUm: spot.diameterUm, method: spot.method, measuredOn: spot.measuredOn, standardErrorUm: spot.standardErrorUm },
      fromCraters: { couponId: coupon.id, couponCode: coupon.code, fit: kept },
    });
  }

  private async findLens(tx: Tx, shopId: string, { machineId, lensId }: CouponView['coupon']) {
    try {
      return await this.machineLenses.getMachineLens(tx, shopId, machineId, lensId);
    } catch (error) {
      if (!(error instanceof NotFoundError)) throw error;
      return undefined;
    }
  }
}
