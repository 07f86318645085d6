import { Body, Controller, Get, HttpCode, Param, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { ApiIfMatch } from '../common/decorators/api-headers.decorator';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IfMatch } from '../common/decorators/if-match.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { CouponCraterFitService } from './coupon-crater-fit.service';
import { CraterFitDto, SaveCraterSpotDto } from './dto/crater-fit.dto';

@ApiTags('coupons')
@ApiBearerAuth()
@Controller('coupons/:couponId/crater-fit')
export class CouponCraterFitController {
  constructor(private readonly craters: CouponCraterFitService) {}

  @Get()
  @AtLeast('operator')
  @ApiOperation({ summary: 'Threshold and effective spot from the crater diameters that are stored at present' })
  @ApiOkResponse({ type: CraterFitDto })
  get(@CurrentMember() actor: Actor, @Param('couponId', IdPipe) couponId: string) {
    return this.craters.get(actor, couponId);
  }

  @Post('measured-spot')
  @HttpCode(200)
  @AtLeast('lead')
  @ApiIfMatch()
  @Idempotent()
  @ApiOperation({
    summary: 'Make that spot the measured one of the coupon’s machine and lens; the ETag is that of the lens on the machine',
  })
  @ApiOkResponse({ type: CraterFitDto })
  saveSpot(
    @CurrentMember() actor: Actor,
    @Param('couponId', IdPipe) couponId: string,
    @IfMatch() lensVersion: number,
    @Body() { shownSpotUm }: SaveCraterSpotDto,
  ) {
    return this.craters.saveSpot(actor, couponId, { lensVersion, shownSpotUm });
  }
}
