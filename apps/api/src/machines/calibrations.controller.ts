import { Body, Controller, Get, Param, Post, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { CalibrationsService } from './calibrations.service';
import {
  CalibrationDto,
  CalibrationPageDto,
  CalibrationWattsDto,
  CalibrationWattsQuery,
  CreateCalibrationDto,
  ListCalibrationsQuery,
} from './dto/calibration.dto';

@ApiTags('machines')
@ApiBearerAuth()
@Controller('machines/:machineId/calibrations')
export class CalibrationsController {
  constructor(private readonly calibrations: CalibrationsService) {}

  @Get()
  @AtLeast('operator')
  @ApiOperation({ summary: 'Power calibrations of the machine, newest first' })
  @ApiOkResponse({ type: CalibrationPageDto })
  list(@CurrentMember() actor: Actor, @Param('machineId', IdPipe) machineId: string, @Query() query: ListCalibrationsQuery) {
    return this.calibrations.list(actor, machineId, query);
  }

  @Post()
  @AtLeast('lead')
  @Idempotent()
  @ApiOperation({ summary: 'Add a power calibration; it is never changed afterwards' })
  @ApiCreatedResponse({ type: CalibrationDto })
  create(@CurrentMember() actor: Actor, @Param('machineId', IdPipe) machineId: string, @Body() dto: CreateCalibrationDto) {
    return this.calibrations.create(actor, machineId, dto);
  }

  @Get(':calibrationId/watts')
  @AtLeast('operator')
  @ApiOperation({ summary: 'Watts at a percentage, from one calibration' })
  @ApiOkResponse({ type: CalibrationWattsDto })
  watts(
    @CurrentMember() actor: Actor,
    @Param('machineId', IdPipe) machineId: string,
    @Param('calibrationId', IdPipe) calibrationId: string,
    @Query() { percent }: CalibrationWattsQuery,
  ) {
    return this.calibrations.watts(actor, machineId, calibrationId, percent);
  }
}
