import { Controller, Get, Param } from '@nestjs/common';
import { ApiBearerAuth, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { CouponsService } from './coupons.service';
import { CouponDto } from './dto/coupon.dto';

@ApiTags('coupons')
@ApiBearerAuth()
@Controller('coupons')
export class CouponsController {
  constructor(private readonly coupons: CouponsService) {}

  @Get(':couponId')
  @AtLeast('operator')
  @ApiOperation({ summary: 'One coupon with its grids and cells' })
  @ApiOkResponse({ type: CouponDto })
  get(@CurrentMember() actor: Actor, @Param('couponId', IdPipe) couponId: string) {
    return this.coupons.get(actor, couponId);
  }
}
