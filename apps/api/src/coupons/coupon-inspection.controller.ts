import { Body, Controller, Get, HttpCode, Param, Post, Put } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { ApiIfMatch } from '../common/decorators/api-headers.decorator';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IfMatch } from '../common/decorators/if-match.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { CouponCorrectionsService } from './coupon-corrections.service';
import { CouponInspectionService } from './coupon-inspection.service';
import { CouponSealingService } from './coupon-sealing.service';
import { CouponDto } from './dto/coupon.dto';
import { CorrectCouponDto, InspectCouponDto } from './dto/inspect-coupon.dto';
import { CorrectionDto, InspectionDto } from './dto/inspection.dto';
import { RecordCriteriaDto } from './dto/record-criteria.dto';

@ApiTags('coupons')
@ApiBearerAuth()
@Controller('coupons')
export class CouponInspectionController {
  constructor(
    private readonly inspection: CouponInspectionService,
    private readonly sealing: CouponSealingService,
    private readonly corrections: CouponCorrectionsService,
  ) {}

  @Get(':couponId/inspection')
  @AtLeast('operator')
  @ApiOperation({ summary: 'What was found on the cells: criteria, ratings, measurements, verdicts, corrections, and what is missing' })
  @ApiOkResponse({ type: InspectionDto })
  get(@CurrentMember() actor: Actor, @Param('couponId', IdPipe) couponId: string) {
    return this.inspection.get(actor, couponId);
  }

  @Put(':couponId/criteria')
  @AtLeast('operator')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Record what a mark must meet, before anything is rated or measured' })
  @ApiOkResponse({ type: InspectionDto })
  recordCriteria(
    @CurrentMember() actor: Actor,
    @Param('couponId', IdPipe) couponId: string,
    @IfMatch() version: number,
    @Body() dto: RecordCriteriaDto,
  ) {
    return this.inspection.recordCriteria(actor, couponId, version, dto);
  }

  @Post(':couponId/inspect')
  @HttpCode(200)
  @AtLeast('operator')
  @ApiIfMatch()
  @Idempotent()
  @ApiOperation({ summary: 'Finish the inspection: every cell is rated, skipped, or named with the reason' })
  @ApiOkResponse({ type: CouponDto })
  inspect(
    @CurrentMember() actor: Actor,
    @Param('couponId', IdPipe) couponId: string,
    @IfMatch() version: number,
    @Body() dto: InspectCouponDto,
  ) {
    return this.sealing.inspect(actor, couponId, version, dto);
  }

  @Post(':couponId/seal')
  @HttpCode(200)
  @AtLeast('operator')
  @ApiIfMatch()
  @Idempotent()
  @ApiOperation({ summary: 'Seal the coupon: it can be cited, and nothing of it changes any more' })
  @ApiOkResponse({ type: CouponDto })
  seal(@CurrentMember() actor: Actor, @Param('couponId', IdPipe) couponId: string, @IfMatch() version: number) {
    return this.sealing.seal(actor, couponId, version);
  }

  @Post(':couponId/corrections')
  @AtLeast('operator')
  @Idempotent()
  @ApiOperation({ summary: 'Say beside a sealed coupon what is right instead, and why' })
  @ApiCreatedResponse({ type: CorrectionDto })
  correct(@CurrentMember() actor: Actor, @Param('couponId', IdPipe) couponId: string, @Body() dto: CorrectCouponDto) {
    return this.corrections.add(actor, couponId, dto);
  }
}
