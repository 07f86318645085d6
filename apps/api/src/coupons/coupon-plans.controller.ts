import { Body, Controller, HttpCode, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { CouponPlansService } from './coupon-plans.service';
import { CouponConfirmationService } from './coupon-plans-confirmation.service';
import { ConfirmRevisionDto } from './dto/confirm-revision.dto';
import { CouponDto } from './dto/coupon.dto';
import { CouponPreviewDto } from './dto/coupon-preview.dto';
import { PlanCouponDto } from './dto/plan-coupon.dto';

@ApiTags('coupons')
@ApiBearerAuth()
@Controller('coupons')
export class CouponPlansController {
  constructor(
    private readonly plans: CouponPlansService,
    private readonly confirmations: CouponConfirmationService,
  ) {}

  @Post('preview')
  @HttpCode(200)
  @AtLeast('operator')
  @ApiOperation({ summary: 'What a plan would give: cells with dose, warnings, marking time, plate size; nothing is stored' })
  @ApiOkResponse({ type: CouponPreviewDto })
  preview(@CurrentMember() actor: Actor, @Body() dto: PlanCouponDto) {
    return this.plans.preview(actor, dto);
  }

  @Post()
  @AtLeast('operator')
  @Idempotent()
  @ApiOperation({ summary: 'Plan a coupon with a crossed grid' })
  @ApiCreatedResponse({ type: CouponDto })
  create(@CurrentMember() actor: Actor, @Body() dto: PlanCouponDto) {
    return this.plans.create(actor, dto);
  }

  @Post('confirmation')
  @AtLeast('operator')
  @Idempotent()
  @ApiOperation({ summary: 'Plan a coupon of equal cells that is to prove a draft' })
  @ApiCreatedResponse({ type: CouponDto })
  confirm(@CurrentMember() actor: Actor, @Body() dto: ConfirmRevisionDto) {
    return this.confirmations.create(actor, dto);
  }
}
