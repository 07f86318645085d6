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
import { CreateLensDto } from './dto/create-lens.dto';
import { LensDto, LensPageDto } from './dto/lens.dto';
import { UpdateLensDto } from './dto/update-lens.dto';
import { LensesService } from './lenses.service';

@ApiTags('lenses')
@ApiBearerAuth()
@Controller('lenses')
export class LensesController {
  constructor(private readonly lenses: LensesService) {}

  @Get()
  @AtLeast('operator')
  @ApiOperation({ summary: 'Lenses of the shop, by name' })
  @ApiOkResponse({ type: LensPageDto })
  list(@CurrentMember() actor: Actor, @Query() query: ArchivedQuery) {
    return this.lenses.list(actor, query);
  }

  @Post()
  @AtLeast('lead')
  @Idempotent()
  @ApiOperation({ summary: 'Add a lens' })
  @ApiCreatedResponse({ type: LensDto })
  create(@CurrentMember() actor: Actor, @Body() dto: CreateLensDto) {
    return this.lenses.create(actor, dto);
  }

  @Get(':lensId')
  @AtLeast('operator')
  @ApiOperation({ summary: 'One lens' })
  @ApiOkResponse({ type: LensDto })
  get(@CurrentMember() actor: Actor, @Param('lensId', IdPipe) lensId: string) {
    return this.lenses.get(actor, lensId);
  }

  @Patch(':lensId')
  @AtLeast('lead')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Change a lens; only what is given changes' })
  @ApiOkResponse({ type: LensDto })
  update(@CurrentMember() actor: Actor, @Param('lensId', IdPipe) lensId: string, @IfMatch() version: number, @Body() dto: UpdateLensDto) {
    return this.lenses.update(actor, lensId, version, dto);
  }

  @Post(':lensId/archive')
  @HttpCode(200)
  @AtLeast('lead')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Take a lens out of the choices' })
  @ApiOkResponse({ type: LensDto })
  archive(@CurrentMember() actor: Actor, @Param('lensId', IdPipe) lensId: string, @IfMatch() version: number) {
    return this.lenses.setArchived(actor, lensId, version, true);
  }

  @Post(':lensId/restore')
  @HttpCode(200)
  @AtLeast('lead')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Bring an archived lens back' })
  @ApiOkResponse({ type: LensDto })
  restore(@CurrentMember() actor: Actor, @Param('lensId', IdPipe) lensId: string, @IfMatch() version: number) {
    return this.lenses.setArchived(actor, lensId, version, false);
  }
}
