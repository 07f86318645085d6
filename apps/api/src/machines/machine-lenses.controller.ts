import { Body, Controller, Get, Param, Patch, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { ApiIfMatch } from '../common/decorators/api-headers.decorator';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IfMatch } from '../common/decorators/if-match.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { CreateMachineLensDto, MachineLensDto, MachineLensListDto, UpdateMachineLensDto } from './dto/machine-lens.dto';
import { SpotMeasurementListDto } from './dto/spot-measurement.dto';
import { MachineLensesService } from './machine-lenses.service';

@ApiTags('machines')
@ApiBearerAuth()
@Controller('machines/:machineId/lenses')
export class MachineLensesController {
  constructor(private readonly pairs: MachineLensesService) {}

  @Get()
  @AtLeast('operator')
  @ApiOperation({ summary: 'Lenses of the machine with working distance and measured spot' })
  @ApiOkResponse({ type: MachineLensListDto })
  list(@CurrentMember() actor: Actor, @Param('machineId', IdPipe) machineId: string) {
    return this.pairs.list(actor, machineId);
  }

  @Post()
  @AtLeast('lead')
  @Idempotent()
  @ApiOperation({ summary: 'Put a lens on the machine’s list' })
  @ApiCreatedResponse({ type: MachineLensDto })
  add(@CurrentMember() actor: Actor, @Param('machineId', IdPipe) machineId: string, @Body() dto: CreateMachineLensDto) {
    return this.pairs.add(actor, machineId, dto);
  }

  @Patch(':lensId')
  @AtLeast('lead')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Change working distance, focus method or measured spot' })
  @ApiOkResponse({ type: MachineLensDto })
  update(
    @CurrentMember() actor: Actor,
    @Param('machineId', IdPipe) machineId: string,
    @Param('lensId', IdPipe) lensId: string,
    @IfMatch() version: number,
    @Body() dto: UpdateMachineLensDto,
  ) {
    return this.pairs.update(actor, { machineId, lensId }, version, dto);
  }

  @Get(':lensId/spots')
  @AtLeast('operator')
  @ApiOperation({ summary: 'Every spot that was measured of the lens on the machine, newest first' })
  @ApiOkResponse({ type: SpotMeasurementListDto })
  listSpots(@CurrentMember() actor: Actor, @Param('machineId', IdPipe) machineId: string, @Param('lensId', IdPipe) lensId: string) {
    return this.pairs.listSpots(actor, { machineId, lensId });
  }
}
