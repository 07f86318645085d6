import { Body, Controller, Get, HttpCode, Param, Patch, Post, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { ApiIfMatch } from '../common/decorators/api-headers.decorator';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IfMatch } from '../common/decorators/if-match.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import {
  CreateMaterialDto,
  ListMaterialsQuery,
  MaterialDto,
  MaterialFacetsDto,
  MaterialPageDto,
  UpdateMaterialDto,
} from './dto/material.dto';
import { MaterialsService } from './materials.service';

@ApiTags('materials')
@ApiBearerAuth()
@Controller('materials')
export class MaterialsController {
  constructor(private readonly materials: MaterialsService) {}

  @Get()
  @AtLeast('operator')
  @ApiOperation({ summary: 'Materials of the shop with the cautions that name them, by name' })
  @ApiOkResponse({ type: MaterialPageDto })
  list(@CurrentMember() actor: Actor, @Query() query: ListMaterialsQuery) {
    return this.materials.list(actor, query);
  }

  @Get('facets')
  @AtLeast('operator')
  @ApiOperation({ summary: 'Families of the materials in use, with counts' })
  @ApiOkResponse({ type: MaterialFacetsDto })
  facets(@CurrentMember() actor: Actor) {
    return this.materials.facets(actor);
  }

  @Post()
  @AtLeast('lead')
  @Idempotent()
  @ApiOperation({ summary: 'Add a material; its family is resolved from the closed list' })
  @ApiCreatedResponse({ type: MaterialDto })
  create(@CurrentMember() actor: Actor, @Body() dto: CreateMaterialDto) {
    return this.materials.create(actor, dto);
  }

  @Get(':materialId')
  @AtLeast('operator')
  @ApiOperation({ summary: 'One material' })
  @ApiOkResponse({ type: MaterialDto })
  get(@CurrentMember() actor: Actor, @Param('materialId', IdPipe) materialId: string) {
    return this.materials.get(actor, materialId);
  }

  @Patch(':materialId')
  @AtLeast('lead')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Change a material; only what is given changes' })
  @ApiOkResponse({ type: MaterialDto })
  update(
    @CurrentMember() actor: Actor,
    @Param('materialId', IdPipe) materialId: string,
    @IfMatch() version: number,
    @Body() dto: UpdateMaterialDto,
  ) {
    return this.materials.update(actor, materialId, version, dto);
  }

  @Post(':materialId/archive')
  @HttpCode(200)
  @AtLeast('lead')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Take a material out of the choices' })
  @ApiOkResponse({ type: MaterialDto })
  archive(@CurrentMember() actor: Actor, @Param('materialId', IdPipe) materialId: string, @IfMatch() version: number) {
    return this.materials.setArchived(actor, materialId, version, true);
  }

  @Post(':materialId/restore')
  @HttpCode(200)
  @AtLeast('lead')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Bring an archived material back' })
  @ApiOkResponse({ type: MaterialDto })
  restore(@CurrentMember() actor: Actor, @Param('materialId', IdPipe) materialId: string, @IfMatch() version: number) {
    return this.materials.setArchived(actor, materialId, version, false);
  }
}
