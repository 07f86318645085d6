import { Body, Controller, Get, HttpCode, Param, Post, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { HoldDto, HoldPageDto, ListHoldsQuery, PlaceHoldDto, ReleaseHoldDto } from './dto/hold.dto';
import { HoldsService } from './holds.service';

@ApiTags('holds')
@ApiBearerAuth()
@Controller('holds')
export class HoldsController {
  constructor(private readonly holds: HoldsService) {}

  @Get()
  @ApiOperation({ summary: 'Holds on recipes and machines, newest first' })
  @ApiOkResponse({ type: HoldPageDto })
  list(@CurrentMember() actor: Actor, @Query() query: ListHoldsQuery) {
    return this.holds.list(actor, query);
  }

  @Post()
  @AtLeast('lead')
  @Idempotent()
  @ApiOperation({ summary: 'Stop the use of a recipe or a machine at once' })
  @ApiCreatedResponse({ type: HoldDto })
  place(@CurrentMember() actor: Actor, @Body() dto: PlaceHoldDto) {
    return this.holds.place(actor, dto);
  }

  @Post(':holdId/release')
  @HttpCode(200)
  @AtLeast('lead')
  @Idempotent()
  @ApiOperation({ summary: 'Release a hold, with the reason' })
  @ApiOkResponse({ type: HoldDto })
  release(@CurrentMember() actor: Actor, @Param('holdId', IdPipe) holdId: string, @Body() dto: ReleaseHoldDto) {
    return this.holds.release(actor, holdId, dto);
  }
}
