import { Body, Controller, Get, Param, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { LoggedTimeDto } from '../machines/dto/marking-time.dto';
import { CouponTimesService } from './coupon-times.service';
import { CouponTimesDto, LogCouponTimeDto } from './dto/coupon-times.dto';

@ApiTags('coupons')
@ApiBearerAuth()
@Controller('coupons/:couponId/logged-times')
export class CouponTimesController {
  constructor(private readonly times: CouponTimesService) {}

  @Get()
  @AtLeast('operator')
  @ApiOperation({ summary: 'Predicted times of the cells, and the logged ones beside what is predicted' })
  @ApiOkResponse({ type: CouponTimesDto })
  list(@CurrentMember() actor: Actor, @Param('couponId', IdPipe) couponId: string) {
    return this.times.list(actor, couponId);
  }

  @Post()
  @AtLeast('operator')
  @Idempotent()
  @ApiOperation({ summary: 'Log the clocked time of one cell or of all cells' })
  @ApiCreatedResponse({ type: LoggedTimeDto })
  log(@CurrentMember() actor: Actor, @Param('couponId', IdPipe) couponId: string, @Body() dto: LogCouponTimeDto) {
    return this.times.log(actor, couponId, dto);
  }
}
