import { Body, Controller, Get, Param, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { CorrectLoggedTimeDto, LoggedTimeDto, MachineMarkingTimeDto } from './dto/marking-time.dto';
import { MarkingTimesService } from './marking-times.service';

@ApiTags('machines')
@ApiBearerAuth()
@Controller('machines/:machineId/logged-times')
export class MarkingTimesController {
  constructor(private readonly times: MarkingTimesService) {}

  @Get()
  @AtLeast('operator')
  @ApiOperation({ summary: 'Logged marking times of the machine, and the overheads of the scan head that hold' })
  @ApiOkResponse({ type: MachineMarkingTimeDto })
  get(@CurrentMember() actor: Actor, @Param('machineId', IdPipe) machineId: string) {
    return this.times.get(actor, machineId);
  }

  @Post(':loggedTimeId/corrections')
  @AtLeast('operator')
  @Idempotent()
  @ApiOperation({ summary: 'Put a logged time right, or take it out of the count, with the reason; the first one stays on record' })
  @ApiCreatedResponse({ type: LoggedTimeDto })
  correct(
    @CurrentMember() actor: Actor,
    @Param('machineId', IdPipe) machineId: string,
    @Param('loggedTimeId', IdPipe) loggedTimeId: string,
    @Body() dto: CorrectLoggedTimeDto,
  ) {
    return this.times.correct(actor, machineId, loggedTimeId, dto);
  }
}
