import { Body, Controller, Delete, Get, HttpCode, Param, Post, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiNoContentResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { PageQuery } from '../common/pagination/page';
import { IdPipe } from '../common/pipes/id.pipe';
import { CreateInvitationDto } from './dto/create-invitation.dto';
import { InvitationDto, InvitationPageDto } from './dto/invitation.dto';
import { InvitationsService } from './invitations.service';

@ApiTags('invitations')
@ApiBearerAuth()
@Controller('invitations')
export class InvitationsController {
  constructor(private readonly invitations: InvitationsService) {}

  @Get()
  @AtLeast('lead')
  @ApiOperation({ summary: 'Invitations, newest first' })
  @ApiOkResponse({ type: InvitationPageDto })
  list(@CurrentMember() actor: Actor, @Query() query: PageQuery): Promise<InvitationPageDto> {
    return this.invitations.list(actor, query);
  }

  @Post()
  @AtLeast('owner')
  @Idempotent()
  @ApiOperation({ summary: 'Invite somebody by mail' })
  @ApiCreatedResponse({ type: InvitationDto })
  create(@CurrentMember() actor: Actor, @Body() dto: CreateInvitationDto): Promise<InvitationDto> {
    return this.invitations.create(actor, dto);
  }

  @Delete(':id')
  @HttpCode(204)
  @AtLeast('owner')
  @ApiOperation({ summary: 'Take an open invitation back' })
  @ApiNoContentResponse()
  revoke(@CurrentMember() actor: Actor, @Param('id', IdPipe) id: string): Promise<void> {
    return this.invitations.revoke(actor, id);
  }
}
