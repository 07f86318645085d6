import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { UnitOfWork } from '../database/unit-of-work';
import type { FoundListDto } from './dto/finder.dto';
import { findableKinds } from './finder.policy';
import { RecordSearchRepository } from './record-search.repository';

@Injectable()
export class RecordSearchService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly records: RecordSearchRepository,
  ) {}

  /** Recipes, coupons, materials and machines whose code or name holds every word; codes that begin with them first. */
  async search(actor: Actor, typed: string): Promise<FoundListDto> {
    const words = typed.split(/\s+/u).filter((word) => word !== '');
    const kinds = findableKinds(actor);
    const isApprovedOnly = !kinds.includes('coupon');
    const items = await this.unitOfWork.read(actor, (tx) => this.records.search(tx, actor.shopId, { words, kinds, isApprovedOnly }));
    return { items };
  }
}
