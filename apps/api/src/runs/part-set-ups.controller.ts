import { Body, Controller, Get, Param, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { PartGroundDto, PartSetUpDto, RunPartSetUpDto } from './dto/part-set-up.dto';
import { SavePartSetUpDto } from './dto/save-part-set-up.dto';
import { PartSetUpsService } from './part-set-ups.service';

@ApiTags('runs')
@ApiBearerAuth()
@Controller('runs')
export class PartSetUpsController {
  constructor(private readonly setUps: PartSetUpsService) {}

  @Get('part-ground/:revisionId')
  @ApiOperation({ summary: 'Beam, lens and focus offsets that a round part for a revision is worked out with' })
  @ApiOkResponse({ type: PartGroundDto })
  ground(@CurrentMember() actor: Actor, @Param('revisionId', IdPipe) revisionId: string) {
    return this.setUps.groundOfRevision(actor, revisionId);
  }

  @Get(':runId/part-set-up')
  @ApiOperation({ summary: 'The round part of a run as it was last saved, and what it is worked out with' })
  @ApiOkResponse({ type: RunPartSetUpDto })
  get(@CurrentMember() actor: Actor, @Param('runId', IdPipe) runId: string) {
    return this.setUps.get(actor, runId);
  }

  @Post(':runId/part-set-up')
  @Idempotent()
  @ApiOperation({ summary: 'Keep a round part with its run; refused with each reason at its field' })
  @ApiCreatedResponse({ type: PartSetUpDto })
  save(@CurrentMember() actor: Actor, @Param('runId', IdPipe) runId: string, @Body() dto: SavePartSetUpDto) {
    return this.setUps.save(actor, runId, dto);
  }
}
