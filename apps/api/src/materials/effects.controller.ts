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
import { CreateEffectDto, EffectDto, EffectPageDto, UpdateEffectDto } from './dto/effect.dto';
import { EffectsService } from './effects.service';

@ApiTags('materials')
@ApiBearerAuth()
@Controller('effects')
export class EffectsController {
  constructor(private readonly effects: EffectsService) {}

  @Get()
  @AtLeast('operator')
  @ApiOperation({ summary: 'Effects of the shop, by name' })
  @ApiOkResponse({ type: EffectPageDto })
  list(@CurrentMember() actor: Actor, @Query() query: ArchivedQuery) {
    return this.effects.list(actor, query);
  }

  @Post()
  @AtLeast('lead')
  @Idempotent()
  @ApiOperation({ summary: 'Add an effect' })
  @ApiCreatedResponse({ type: EffectDto })
  create(@CurrentMember() actor: Actor, @Body() dto: CreateEffectDto) {
    return this.effects.create(actor, dto);
  }

  @Get(':effectId')
  @AtLeast('operator')
  @ApiOperation({ summary: 'One effect' })
  @ApiOkResponse({ type: EffectDto })
  get(@CurrentMember() actor: Actor, @Param('effectId', IdPipe) effectId: string) {
    return this.effects.get(actor, effectId);
  }

  @Patch(':effectId')
  @AtLeast('lead')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Change an effect; only what is given changes' })
  @ApiOkResponse({ type: EffectDto })
  update(
    @CurrentMember() actor: Actor,
    @Param('effectId', IdPipe) effectId: string,
    @IfMatch() version: number,
    @Body() dto: UpdateEffectDto,
  ) {
    return this.effects.update(actor, effectId, version, dto);
  }

  @Post(':effectId/archive')
  @HttpCode(200)
  @AtLeast('lead')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Take an effect out of the choices' })
  @ApiOkResponse({ type: EffectDto })
  archive(@CurrentMember() actor: Actor, @Param('effectId', IdPipe) effectId: string, @IfMatch() version: number) {
    return this.effects.setArchived(actor, effectId, version, true);
  }

  @Post(':effectId/restore')
  @HttpCode(200)
  @AtLeast('lead')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Bring an archived effect back' })
  @ApiOkResponse({ type: EffectDto })
  restore(@CurrentMember() actor: Actor, @Param('effectId', IdPipe) effectId: string, @IfMatch() version: number) {
    return this.effects.setArchived(actor, effectId, version, false);
  }
}
