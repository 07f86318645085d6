import { Body, Controller, Get, Param, Patch, Post, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { ApiIfMatch } from '../common/decorators/api-headers.decorator';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IfMatch } from '../common/decorators/if-match.decorator';
import { PageQuery } from '../common/pagination/page';
import { IdPipe } from '../common/pipes/id.pipe';
import { CreateMaterialGroupDto, MaterialGroupDto, MaterialGroupPageDto, UpdateMaterialGroupDto } from './dto/material-group.dto';
import { MaterialGroupsService } from './material-groups.service';

@ApiTags('materials')
@ApiBearerAuth()
@Controller('material-groups')
export class MaterialGroupsController {
  constructor(private readonly groups: MaterialGroupsService) {}

  @Get()
  @AtLeast('operator')
  @ApiOperation({ summary: 'Groups of materials of the shop, by name' })
  @ApiOkResponse({ type: MaterialGroupPageDto })
  list(@CurrentMember() actor: Actor, @Query() query: PageQuery) {
    return this.groups.list(actor, query);
  }

  @Post()
  @AtLeast('lead')
  @Idempotent()
  @ApiOperation({ summary: 'Add a group of materials' })
  @ApiCreatedResponse({ type: MaterialGroupDto })
  create(@CurrentMember() actor: Actor, @Body() dto: CreateMaterialGroupDto) {
    return this.groups.create(actor, dto);
  }

  @Get(':groupId')
  @AtLeast('operator')
  @ApiOperation({ summary: 'One group of materials' })
  @ApiOkResponse({ type: MaterialGroupDto })
  get(@CurrentMember() actor: Actor, @Param('groupId', IdPipe) groupId: string) {
    return this.groups.get(actor, groupId);
  }

  @Patch(':groupId')
  @AtLeast('lead')
  @ApiIfMatch()
  @ApiOperation({
    summary: 'Change a group of materials; only what is given changes, and nothing is added that would widen a submitted revision',
  })
  @ApiOkResponse({ type: MaterialGroupDto })
  update(
    @CurrentMember() actor: Actor,
    @Param('groupId', IdPipe) groupId: string,
    @IfMatch() version: number,
    @Body() dto: UpdateMaterialGroupDto,
  ) {
    return this.groups.update(actor, groupId, version, dto);
  }
}
