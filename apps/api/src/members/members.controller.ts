import { Body, Controller, Delete, Get, HttpCode, Param, Patch, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiNoContentResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { ApiIfMatch } from '../common/decorators/api-headers.decorator';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { IfMatch } from '../common/decorators/if-match.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { ListMembersQuery } from './dto/list-members.query.dto';
import { MemberDto, MemberPageDto } from './dto/member.dto';
import { UpdateMemberDto } from './dto/update-member.dto';
import { MembersService } from './members.service';

@ApiTags('members')
@ApiBearerAuth()
@Controller('members')
export class MembersController {
  constructor(private readonly members: MembersService) {}

  @Get()
  @AtLeast('lead')
  @ApiOperation({ summary: 'People of the shop, by name' })
  @ApiOkResponse({ type: MemberPageDto })
  list(@CurrentMember() actor: Actor, @Query() query: ListMembersQuery): Promise<MemberPageDto> {
    return this.members.list(actor, query);
  }

  @Get(':id')
  @AtLeast('lead')
  @ApiOperation({ summary: 'One person of the shop' })
  @ApiOkResponse({ type: MemberDto })
  get(@CurrentMember() actor: Actor, @Param('id', IdPipe) id: string): Promise<MemberDto> {
    return this.members.get(actor, id);
  }

  @Patch(':id')
  @AtLeast('owner')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Change role or printed name; works from the next request of the member' })
  @ApiOkResponse({ type: MemberDto })
  update(
    @CurrentMember() actor: Actor,
    @Param('id', IdPipe) id: string,
    @IfMatch() version: number,
    @Body() dto: UpdateMemberDto,
  ): Promise<MemberDto> {
    return this.members.update(actor, id, version, dto);
  }

  @Delete(':id')
  @HttpCode(204)
  @AtLeast('owner')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Remove a member and end their sessions here at once' })
  @ApiNoContentResponse()
  remove(@CurrentMember() actor: Actor, @Param('id', IdPipe) id: string, @IfMatch() version: number): Promise<void> {
    return this.members.remove(actor, id, version);
  }
}
