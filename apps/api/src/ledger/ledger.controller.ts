import { Readable } from 'node:stream';
import { Controller, Get, HttpCode, Post, Query, StreamableFile } from '@nestjs/common';
import { ApiBearerAuth, ApiOkResponse, ApiOperation, ApiProduces, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { LedgerActorsDto, LedgerPageDto, LedgerVerificationDto } from './dto/ledger-event.dto';
import { ExportLedgerQuery, ListLedgerQuery } from './dto/list-ledger.query.dto';
import { LedgerService } from './ledger.service';
import { LedgerExportService } from './ledger-export.service';

@ApiTags('ledger')
@ApiBearerAuth()
@Controller('ledger')
export class LedgerController {
  constructor(
    private readonly ledger: LedgerService,
    private readonly exports: LedgerExportService,
  ) {}

  @Get()
  @AtLeast('operator')
  @ApiOperation({ summary: 'Events of the shop, newest first; people and policy for leads and owners only' })
  @ApiOkResponse({ type: LedgerPageDto })
  list(@CurrentMember() actor: Actor, @Query() query: ListLedgerQuery): Promise<LedgerPageDto> {
    return this.ledger.list(actor, query);
  }

  @Get('actors')
  @AtLeast('operator')
  @ApiOperation({ summary: 'Names to search the ledger by' })
  @ApiOkResponse({ type: LedgerActorsDto })
  async actors(@CurrentMember() actor: Actor): Promise<LedgerActorsDto> {
    return { items: await this.ledger.actors(actor) };
  }

  @Get('export.csv')
  @AtLeast('lead')
  @ApiOperation({ summary: 'Every event that matches, oldest first, as CSV' })
  @ApiProduces('text/csv')
  @ApiOkResponse({ schema: { type: 'string' } })
  async exportCsv(@CurrentMember() actor: Actor, @Query() query: ExportLedgerQuery): Promise<StreamableFile> {
    return asFile(await this.exports.csv(actor, query), { type: 'text/csv; charset=utf-8', name: 'ledger.csv' });
  }

  @Get('export.json')
  @AtLeast('lead')
  @ApiOperation({ summary: 'Every event that matches, oldest first, with all that its hash covers' })
  @ApiProduces('application/json')
  @ApiOkResponse({ schema: { type: 'string' } })
  async exportJson(@CurrentMember() actor: Actor, @Query() query: ExportLedgerQuery): Promise<StreamableFile> {
    return asFile(await this.exports.json(actor, query), { type: 'application/json; charset=utf-8', name: 'ledger.json' });
  }

  @Post('verify')
  @HttpCode(200)
  @AtLeast('lead')
  @ApiOperation({ summary: 'Recompute the chain and name the first event that does not fit' })
  @ApiOkResponse({ type: LedgerVerificationDto })
  verify(@CurrentMember() actor: Actor): Promise<LedgerVerificationDto> {
    return this.ledger.verify(actor);
  }
}

const asFile = (pieces: AsyncIterable<string>, { type, name }: { type: string; name: string }) =>
  new StreamableFile(Readable.from(pieces, { objectMode: false }), { type, disposition: `attachment; filename="${name}"` });
