import { Body, Controller, Get, HttpCode, Param, Patch, Post, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { ApiIfMatch } from '../common/decorators/api-headers.decorator';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IfMatch } from '../common/decorators/if-match.decorator';
import { ArchivedQuery } from '../common/pagination/archived.query';
import { IdPipe } from '../common/pipes/id.pipe';
import { CreateFinishDto, FinishDto, FinishPageDto, UpdateFinishDto } from './dto/finish.dto';
import { FinishesService } from './finishes.service';

@ApiTags('materials')
@ApiBearerAuth()
@Controller('finishes')
export class FinishesController {
  constructor(private readonly finishes: FinishesService) {}

  @Get()
  @AtLeast('operator')
  @ApiOperation({ summary: 'Finishes of the shop, by name' })
  @ApiOkResponse({ type: FinishPageDto })
  list(@CurrentMember() actor: Actor, @Query() query: ArchivedQuery) {
    return this.finishes.list(actor, query);
  }

  @Post()
  @AtLeast('lead')
  @Idempotent()
  @ApiOperation({ summary: 'Add a finish' })
  @ApiCreatedResponse({ type: FinishDto })
  create(@CurrentMember() actor: Actor, @Body() dto: CreateFinishDto) {
    return this.finishes.create(actor, dto);
  }

  @Get(':finishId')
  @AtLeast('operator')
  @ApiOperation({ summary: 'One finish' })
  @ApiOkResponse({ type: FinishDto })
  get(@CurrentMember() actor: Actor, @Param('finishId', IdPipe) finishId: string) {
    return this.finishes.get(actor, finishId);
  }

  @Patch(':finishId')
  @AtLeast('lead')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Change a finish; only what is given changes' })
  @ApiOkResponse({ type: FinishDto })
  update(
    @CurrentMember() actor: Actor,
    @Param('finishId', IdPipe) finishId: string,
    @IfMatch() version: number,
    @Body() dto: UpdateFinishDto,
  ) {
    return this.finishes.update(actor, finishId, version, dto);
  }

  @Post(':finishId/archive')
  @HttpCode(200)
  @AtLeast('lead')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Take a finish out of the choices' })
  @ApiOkResponse({ type: FinishDto })
  archive(@CurrentMember() actor: Actor, @Param('finishId', IdPipe) finishId: string, @IfMatch() version: number) {
    return this.finishes.setArchived(actor, finishId, version, true);
  }

  @Post(':finishId/restore')
  @HttpCode(200)
  @AtLeast('lead')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Bring an archived finish back' })
  @ApiOkResponse({ type: FinishDto })
  restore(@CurrentMember() actor: Actor, @Param('finishId', IdPipe) finishId: string, @IfMatch() version: number) {
    return this.finishes.setArchived(actor, finishId, version, false);
  }
}
