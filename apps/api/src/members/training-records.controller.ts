import { Body, Controller, Get, Param, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { CreateTrainingRecordDto, TrainingRecordListDto } from './dto/training-record.dto';
import { TrainingRecordsService } from './training-records.service';

@ApiTags('members')
@ApiBearerAuth()
@Controller('members/:id/training-records')
export class TrainingRecordsController {
  constructor(private readonly trainings: TrainingRecordsService) {}

  @Get()
  @AtLeast('lead')
  @ApiOperation({ summary: 'What a member was taught' })
  @ApiOkResponse({ type: TrainingRecordListDto })
  async list(@CurrentMember() actor: Actor, @Param('id', IdPipe) id: string): Promise<TrainingRecordListDto> {
    return { items: await this.trainings.list(actor, id) };
  }

  @Post()
  @AtLeast('owner')
  @Idempotent()
  @ApiOperation({ summary: 'Write a training down; answers with the whole list' })
  @ApiCreatedResponse({ type: TrainingRecordListDto })
  async create(
    @CurrentMember() actor: Actor,
    @Param('id', IdPipe) id: string,
    @Body() dto: CreateTrainingRecordDto,
  ): Promise<TrainingRecordListDto> {
    return { items: await this.trainings.create(actor, id, dto) };
  }
}
