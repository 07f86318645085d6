import { Controller, Get, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { FinderDto, FoundListDto, SheetCodeDto } from './dto/finder.dto';
import { FinderQuery, FindQuery, SheetCodeQuery } from './dto/finder.query.dto';
import { FinderService } from './finder.service';
import { RecordSearchService } from './record-search.service';

@ApiTags('finder')
@ApiBearerAuth()
@Controller()
export class FinderController {
  constructor(
    private readonly finder: FinderService,
    private readonly records: RecordSearchService,
  ) {}

  @Get('finder')
  @ApiOperation({ summary: 'The approved setting for a machine, lens, material, finish and effect, or what comes nearest' })
  @ApiOkResponse({ type: FinderDto })
  find(@CurrentMember() actor: Actor, @Query() query: FinderQuery) {
    return this.finder.find(actor, query);
  }

  @Get('finder/sheet-code')
  @ApiOperation({ summary: 'Code on a set-up sheet that opens what holds when it is scanned' })
  @ApiOkResponse({ type: SheetCodeDto })
  sheetCode(@Query() query: SheetCodeQuery) {
    return this.finder.sheetCode(query.recipeId);
  }

  @Get('find')
  @ApiOperation({ summary: 'Records by code or name, as far as the caller may read them' })
  @ApiOkResponse({ type: FoundListDto })
  search(@CurrentMember() actor: Actor, @Query() query: FindQuery) {
    return this.records.search(actor, query.q);
  }
}
