import { Body, Controller, HttpCode, Param, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { CouponMarkingService } from './coupon-marking.service';
import { CouponDto } from './dto/coupon.dto';
import { FinishMarkingDto, MarkCellDto, MarkedCellDto, UndoMarkDto } from './dto/mark-cell.dto';

@ApiTags('coupons')
@ApiBearerAuth()
@Controller('coupons/:couponId/marking')
export class CouponMarkingController {
  constructor(private readonly marking: CouponMarkingService) {}

  @Post('start')
  @HttpCode(200)
  @AtLeast('operator')
  @ApiOperation({ summary: 'The labels are marked; the cells come next' })
  @ApiOkResponse({ type: CouponDto })
  start(@CurrentMember() actor: Actor, @Param('couponId', IdPipe) couponId: string) {
    return this.marking.start(actor, couponId);
  }

  @Post('cells')
  @HttpCode(200)
  @AtLeast('operator')
  @Idempotent()
  @ApiOperation({ summary: 'Say what became of a cell: marked, differs or skipped' })
  @ApiOkResponse({ type: MarkedCellDto })
  markCell(@CurrentMember() actor: Actor, @Param('couponId', IdPipe) couponId: string, @Body() dto: MarkCellDto) {
    return this.marking.markCell(actor, couponId, dto);
  }

  @Post('undo')
  @HttpCode(200)
  @AtLeast('operator')
  @Idempotent()
  @ApiOperation({ summary: 'Take back what was said of a cell' })
  @ApiOkResponse({ type: MarkedCellDto })
  undo(@CurrentMember() actor: Actor, @Param('couponId', IdPipe) couponId: string, @Body() dto: UndoMarkDto) {
    return this.marking.undo(actor, couponId, dto);
  }

  @Post('finish')
  @HttpCode(200)
  @AtLeast('operator')
  @Idempotent()
  @ApiOperation({ summary: 'The plate is marked: planned → marked' })
  @ApiOkResponse({ type: CouponDto })
  finish(@CurrentMember() actor: Actor, @Param('couponId', IdPipe) couponId: string, @Body() dto: FinishMarkingDto) {
    return this.marking.finish(actor, couponId, dto);
  }
}
