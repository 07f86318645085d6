import { Body, Controller, Get, HttpCode, Param, Patch, Post, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { ApiIfMatch } from '../common/decorators/api-headers.decorator';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IfMatch } from '../common/decorators/if-match.decorator';
import { ArchivedQuery } from '../common/pagination/archived.query';
import { IdPipe } from '../common/pipes/id.pipe';
import { CreateMachineDto } from './dto/create-machine.dto';
import { MachineDto, MachinePageDto } from './dto/machine.dto';
import { MachineProfileListDto } from './dto/machine-profile.dto';
import { UpdateMachineDto } from './dto/update-machine.dto';
import { MachinesService } from './machines.service';

@ApiTags('machines')
@ApiBearerAuth()
@Controller('machines')
export class MachinesController {
  constructor(private readonly machines: MachinesService) {}

  @Get()
  @AtLeast('operator')
  @ApiOperation({ summary: 'Machines of the shop with the profile in force, by name' })
  @ApiOkResponse({ type: MachinePageDto })
  list(@CurrentMember() actor: Actor, @Query() query: ArchivedQuery) {
    return this.machines.list(actor, query);
  }

  @Post()
  @AtLeast('lead')
  @Idempotent()
  @ApiOperation({ summary: 'Add a machine with its first profile' })
  @ApiCreatedResponse({ type: MachineDto })
  create(@CurrentMember() actor: Actor, @Body() dto: CreateMachineDto) {
    return this.machines.create(actor, dto);
  }

  @Get(':machineId')
  @AtLeast('operator')
  @ApiOperation({ summary: 'One machine with the profile in force' })
  @ApiOkResponse({ type: MachineDto })
  get(@CurrentMember() actor: Actor, @Param('machineId', IdPipe) machineId: string) {
    return this.machines.get(actor, machineId);
  }

  @Patch(':machineId')
  @AtLeast('lead')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Change a machine; a changed source or panel becomes the next profile' })
  @ApiOkResponse({ type: MachineDto })
  update(
    @CurrentMember() actor: Actor,
    @Param('machineId', IdPipe) machineId: string,
    @IfMatch() version: number,
    @Body() dto: UpdateMachineDto,
  ) {
    return this.machines.update(actor, machineId, version, dto);
  }

  @Get(':machineId/profiles')
  @AtLeast('operator')
  @ApiOperation({ summary: 'Every version of the machine’s profile, newest first' })
  @ApiOkResponse({ type: MachineProfileListDto })
  listProfiles(@CurrentMember() actor: Actor, @Param('machineId', IdPipe) machineId: string) {
    return this.machines.listProfiles(actor, machineId);
  }

  @Post(':machineId/archive')
  @HttpCode(200)
  @AtLeast('lead')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Take a machine out of the choices' })
  @ApiOkResponse({ type: MachineDto })
  archive(@CurrentMember() actor: Actor, @Param('machineId', IdPipe) machineId: string, @IfMatch() version: number) {
    return this.machines.setArchived(actor, machineId, version, true);
  }

  @Post(':machineId/restore')
  @HttpCode(200)
  @AtLeast('lead')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Bring an archived machine back' })
  @ApiOkResponse({ type: MachineDto })
  restore(@CurrentMember() actor: Actor, @Param('machineId', IdPipe) machineId: string, @IfMatch() version: number) {
    return this.machines.setArchived(actor, machineId, version, false);
  }
}
