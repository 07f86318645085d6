import { Body, Controller, HttpCode, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { CouponImportService } from './coupon-import.service';
import { CouponDto } from './dto/coupon.dto';
import { ImportCouponDto, ImportPreviewDto } from './dto/import-coupon.dto';

@ApiTags('coupons')
@ApiBearerAuth()
@Controller('coupons/import')
export class CouponImportController {
  constructor(private readonly imports: CouponImportService) {}

  @Post('preview')
  @HttpCode(200)
  @AtLeast('operator')
  @ApiOperation({ summary: 'What an import would store: cells, unknown fields, and every refused row with its reason' })
  @ApiOkResponse({ type: ImportPreviewDto })
  preview(@CurrentMember() actor: Actor, @Body() dto: ImportCouponDto) {
    return this.imports.preview(actor, dto);
  }

  @Post()
  @AtLeast('operator')
  @Idempotent()
  @ApiOperation({ summary: 'Enter a plate that was burnt before it was logged here' })
  @ApiCreatedResponse({ type: CouponDto })
  create(@CurrentMember() actor: Actor, @Body() dto: ImportCouponDto) {
    return this.imports.create(actor, dto);
  }
}
