import { Body, Controller, Get, Param, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { LoggedTimeDto } from '../machines/dto/marking-time.dto';
import { LogRunTimeDto, RunTimesDto, SettingTimingDto } from './dto/run-times.dto';
import { RunTimesService } from './run-times.service';

@ApiTags('runs')
@ApiBearerAuth()
@Controller('runs')
export class RunTimesController {
  constructor(private readonly times: RunTimesService) {}

  @Get('timing/:revisionId')
  @ApiOperation({ summary: 'What the marking time of a part with this setting is worked out with' })
  @ApiOkResponse({ type: SettingTimingDto })
  timing(@CurrentMember() actor: Actor, @Param('revisionId', IdPipe) revisionId: string) {
    return this.times.timingOfRevision(actor, revisionId);
  }

  @Get(':runId/logged-times')
  @ApiOperation({ summary: 'Logged marking times of a run, each beside what is predicted' })
  @ApiOkResponse({ type: RunTimesDto })
  list(@CurrentMember() actor: Actor, @Param('runId', IdPipe) runId: string) {
    return this.times.list(actor, runId);
  }

  @Post(':runId/logged-times')
  @Idempotent()
  @ApiOperation({ summary: 'Log the clocked time of one piece' })
  @ApiCreatedResponse({ type: LoggedTimeDto })
  log(@CurrentMember() actor: Actor, @Param('runId', IdPipe) runId: string, @Body() dto: LogRunTimeDto) {
    return this.times.log(actor, runId, dto);
  }
}
