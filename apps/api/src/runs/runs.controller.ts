import { Body, Controller, Get, Header, HttpCode, Param, Patch, Post, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiProduces, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { ListRunsQuery } from './dto/list-runs.query.dto';
import { RunDto, RunPageDto } from './dto/run.dto';
import { FinishRunDto, FirstPieceActDto, TellBadResultDto } from './dto/run-acts.dto';
import { StartRunDto, TickRunDto } from './dto/start-run.dto';
import { StartSheetDto } from './dto/start-sheet.dto';
import { RunKeyPipe } from './run-key.pipe';
import { RunListService } from './run-list.service';
import { RunProgressService } from './run-progress.service';
import { RunsService } from './runs.service';

@ApiTags('runs')
@ApiBearerAuth()
@Controller('runs')
export class RunsController {
  constructor(
    private readonly runs: RunsService,
    private readonly runList: RunListService,
    private readonly progress: RunProgressService,
  ) {}

  @Get()
  @ApiOperation({ summary: 'Runs, newest first; a trainee sees the own ones' })
  @ApiOkResponse({ type: RunPageDto })
  list(@CurrentMember() actor: Actor, @Query() query: ListRunsQuery) {
    return this.runList.list(actor, query);
  }

  @Get('export.csv')
  @Header('content-type', 'text/csv; charset=utf-8')
  @Header('content-disposition', 'attachment; filename="runs.csv"')
  @ApiOperation({ summary: 'The same list as CSV, all pages' })
  @ApiProduces('text/csv')
  @ApiOkResponse({ schema: { type: 'string' } })
  exportCsv(@CurrentMember() actor: Actor, @Query() query: ListRunsQuery) {
    return this.runList.exportCsv(actor, query);
  }

  @Get('start-sheet/:revisionId')
  @ApiOperation({ summary: 'What has to be known and done before a run of a revision starts' })
  @ApiOkResponse({ type: StartSheetDto })
  startSheet(@CurrentMember() actor: Actor, @Param('revisionId', IdPipe) revisionId: string) {
    return this.runs.startSheet(actor, revisionId);
  }

  @Post()
  @Idempotent()
  @ApiOperation({ summary: 'Start a run; refused with every reason at its place' })
  @ApiCreatedResponse({ type: RunDto })
  start(@CurrentMember() actor: Actor, @Body() dto: StartRunDto) {
    return this.runs.start(actor, dto);
  }

  @Get(':run')
  @ApiOperation({ summary: 'One run, by its id or its code' })
  @ApiOkResponse({ type: RunDto })
  get(@CurrentMember() actor: Actor, @Param('run', RunKeyPipe) key: string) {
    return this.runList.get(actor, key);
  }

  @Patch(':runId/ticks')
  @ApiOperation({ summary: 'Tick or untick settings and set-up steps' })
  @ApiOkResponse({ type: RunDto })
  tick(@CurrentMember() actor: Actor, @Param('runId', IdPipe) runId: string, @Body() dto: TickRunDto) {
    return this.progress.tick(actor, runId, dto);
  }

  @Post(':runId/first-piece')
  @HttpCode(200)
  @Idempotent()
  @ApiOperation({ summary: 'Release the first piece, or say that it does not match' })
  @ApiOkResponse({ type: RunDto })
  firstPiece(@CurrentMember() actor: Actor, @Param('runId', IdPipe) runId: string, @Body() dto: FirstPieceActDto) {
    return this.progress.firstPiece(actor, runId, dto);
  }

  @Post(':runId/finish')
  @HttpCode(200)
  @Idempotent()
  @ApiOperation({ summary: 'Finish the run with its counts and measurements' })
  @ApiOkResponse({ type: RunDto })
  finish(@CurrentMember() actor: Actor, @Param('runId', IdPipe) runId: string, @Body() dto: FinishRunDto) {
    return this.progress.finish(actor, runId, dto);
  }

  @Post(':runId/bad-result')
  @HttpCode(200)
  @Idempotent()
  @ApiOperation({ summary: 'Tell a bad result, during the run or after it' })
  @ApiOkResponse({ type: RunDto })
  tellBadResult(@CurrentMember() actor: Actor, @Param('runId', IdPipe) runId: string, @Body() dto: TellBadResultDto) {
    return this.progress.tellBadResult(actor, runId, dto);
  }
}
