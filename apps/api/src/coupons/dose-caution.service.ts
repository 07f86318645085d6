import { Injectable } from '@nestjs/common';
import type { Tx } from '../database/unit-of-work';
import { CouponPlansRepository } from './coupon-plans.repository';
import { doseCaution } from './dose-caution';
import type { DoseCautionDto } from './dto/coupon.dto';

/** What is known about the dose that a material and finish do not stand. */
@Injectable()
export class DoseCautionService {
  constructor(private readonly plans: CouponPlansRepository) {}

  /** @param typed dose that somebody set as the limit, J/mm²; null: the lowest that spoilt a cell on this ground before */
  async find(
    tx: Tx,
    shopId: string,
    ground: { readonly materialId: string; readonly finishId: string },
    typed: number | null = null,
  ): Promise<DoseCautionDto | null> {
    const { materialId, finishId } = ground;
    return doseCaution(typed, typed === null ? await this.plans.spoiltCells(tx, shopId, { materialId, finishId }) : []);
  }
}
