import { Body, Controller, Get, HttpCode, Param, Post, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { AnswerRequestDto, AskForSettingDto, ListRequestsQuery, SettingRequestDto, SettingRequestPageDto } from './dto/setting-request.dto';
import { SettingRequestsService } from './setting-requests.service';

@ApiTags('setting-requests')
@ApiBearerAuth()
@Controller('setting-requests')
export class SettingRequestsController {
  constructor(private readonly requests: SettingRequestsService) {}

  @Get()
  @ApiOperation({ summary: 'Requests for settings, newest first; a trainee sees the own ones' })
  @ApiOkResponse({ type: SettingRequestPageDto })
  list(@CurrentMember() actor: Actor, @Query() query: ListRequestsQuery) {
    return this.requests.list(actor, query);
  }

  @Post()
  @Idempotent()
  @ApiOperation({ summary: 'Ask for a setting that no approved recipe answers' })
  @ApiCreatedResponse({ type: SettingRequestDto })
  ask(@CurrentMember() actor: Actor, @Body() dto: AskForSettingDto) {
    return this.requests.ask(actor, dto);
  }

  @Post(':requestId/answer')
  @HttpCode(200)
  @AtLeast('operator')
  @Idempotent()
  @ApiOperation({ summary: 'Say what became of a request' })
  @ApiOkResponse({ type: SettingRequestDto })
  answer(@CurrentMember() actor: Actor, @Param('requestId', IdPipe) requestId: string, @Body() dto: AnswerRequestDto) {
    return this.requests.answer(actor, requestId, dto);
  }
}
