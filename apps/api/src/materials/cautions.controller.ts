import { Body, Controller, Get, Param, Patch, Post, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { ApiIfMatch } from '../common/decorators/api-headers.decorator';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IfMatch } from '../common/decorators/if-match.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { CautionsService } from './cautions.service';
import { CautionDto, CautionPageDto, CautionsForDto, CautionsForQuery, CreateCautionDto, UpdateCautionDto } from './dto/caution.dto';

@ApiTags('cautions')
@ApiBearerAuth()
@Controller('cautions')
export class CautionsController {
  constructor(private readonly cautions: CautionsService) {}

  @Get()
  @AtLeast('trainee')
  @ApiOperation({ summary: 'Every caution of the shop, never first' })
  @ApiOkResponse({ type: CautionPageDto })
  list(@CurrentMember() actor: Actor) {
    return this.cautions.list(actor);
  }

  @Get('for')
  @AtLeast('trainee')
  @ApiOperation({ summary: 'The cautions for a piece of work, never first, with their sources' })
  @ApiOkResponse({ type: CautionsForDto })
  listFor(@CurrentMember() actor: Actor, @Query() query: CautionsForQuery) {
    return this.cautions.listFor(actor, query);
  }

  @Post()
  @AtLeast('lead')
  @Idempotent()
  @ApiOperation({ summary: 'Add a caution of the shop’s own' })
  @ApiCreatedResponse({ type: CautionDto })
  create(@CurrentMember() actor: Actor, @Body() dto: CreateCautionDto) {
    return this.cautions.create(actor, dto);
  }

  @Patch(':cautionId')
  @AtLeast('lead')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Tighten a caution; nobody loosens or removes one' })
  @ApiOkResponse({ type: CautionDto })
  tighten(
    @CurrentMember() actor: Actor,
    @Param('cautionId', IdPipe) cautionId: string,
    @IfMatch() version: number,
    @Body() dto: UpdateCautionDto,
  ) {
    return this.cautions.tighten(actor, cautionId, version, dto);
  }
}
