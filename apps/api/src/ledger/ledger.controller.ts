import { Controller, Get, HttpCode, Post, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { LedgerPageDto, LedgerVerificationDto } from './dto/ledger-event.dto';
import { ListLedgerQuery } from './dto/list-ledger.query.dto';
import { LedgerService } from './ledger.service';

@ApiTags('ledger')
@ApiBearerAuth()
@Controller('ledger')
export class LedgerController {
  constructor(private readonly ledger: LedgerService) {}

  @Get()
  @AtLeast('operator')
  @ApiOperation({ summary: 'Events of the shop, newest first; people and policy for leads and owners only' })
  @ApiOkResponse({ type: LedgerPageDto })
  list(@CurrentMember() actor: Actor, @Query() query: ListLedgerQuery): Promise<LedgerPageDto> {
    return this.ledger.list(actor, query);
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
