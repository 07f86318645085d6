import { Body, Controller, Param, Post, Put } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiPreconditionFailedResponse, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { CouponMeasurementsService } from './coupon-measurements.service';
import { CouponRatingsService } from './coupon-ratings.service';
import { AddMeasurementsDto } from './dto/add-measurements.dto';
import { SavedMeasurementsDto, SavedRatingsDto } from './dto/inspection.dto';
import { SaveRatingsDto } from './dto/save-ratings.dto';

@ApiTags('coupons')
@ApiBearerAuth()
@Controller('coupons/:couponId')
export class CouponRatingsController {
  constructor(
    private readonly ratings: CouponRatingsService,
    private readonly measurements: CouponMeasurementsService,
  ) {}

  @Put('ratings')
  @AtLeast('operator')
  @ApiOperation({
    summary: 'Save your own ratings of cells, all or none',
    description: 'Each names the version that you saw, so a repeat after a lost answer is refused with what is stored, not stored twice.',
  })
  @ApiOkResponse({ type: SavedRatingsDto })
  @ApiPreconditionFailedResponse({ description: 'a rating moved on; current.conflicts holds yours and the stored one of each cell' })
  saveRatings(@CurrentMember() actor: Actor, @Param('couponId', IdPipe) couponId: string, @Body() dto: SaveRatingsDto) {
    return this.ratings.save(actor, couponId, dto);
  }

  @Post('measurements')
  @AtLeast('operator')
  @Idempotent()
  @ApiOperation({ summary: 'Add measurements of cells, all or none' })
  @ApiCreatedResponse({ type: SavedMeasurementsDto })
  addMeasurements(@CurrentMember() actor: Actor, @Param('couponId', IdPipe) couponId: string, @Body() dto: AddMeasurementsDto) {
    return this.measurements.add(actor, couponId, dto);
  }
}
