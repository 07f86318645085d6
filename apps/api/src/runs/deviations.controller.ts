import { Body, Controller, Get, Post, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { DeviationsService } from './deviations.service';
import { DeviationDto, DeviationPageDto, GrantDeviationDto, ListDeviationsQuery } from './dto/deviation.dto';

@ApiTags('deviations')
@ApiBearerAuth()
@Controller('deviations')
export class DeviationsController {
  constructor(private readonly deviations: DeviationsService) {}

  @Get()
  @AtLeast('operator')
  @ApiOperation({ summary: 'Deviations, newest first, also those that have ended' })
  @ApiOkResponse({ type: DeviationPageDto })
  list(@CurrentMember() actor: Actor, @Query() query: ListDeviationsQuery) {
    return this.deviations.list(actor, query);
  }

  @Post()
  @AtLeast('lead')
  @Idempotent()
  @ApiOperation({ summary: 'Permit a departure from an approved revision, limited by time or quantity' })
  @ApiCreatedResponse({ type: DeviationDto })
  grant(@CurrentMember() actor: Actor, @Body() dto: GrantDeviationDto) {
    return this.deviations.grant(actor, dto);
  }
}
