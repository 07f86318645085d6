import { Body, Controller, Delete, Get, HttpCode, Param, Patch, Put, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiNoContentResponse, ApiOkResponse, ApiOperation, ApiQuery, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { ApiIfMatch } from '../common/decorators/api-headers.decorator';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { IfMatch } from '../common/decorators/if-match.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { CompareQuery, ComparisonDto } from './dto/comparison.dto';
import { EvidenceCandidatesDto, SetEvidenceDto } from './dto/evidence.dto';
import { RecipeRevisionDto } from './dto/recipe-revision.dto';
import { UpdateRevisionDto } from './dto/update-revision.dto';
import { RevisionDraftsService } from './revision-drafts.service';
import { RevisionViewsService } from './revision-views.service';

@ApiTags('revisions')
@ApiBearerAuth()
@Controller('revisions')
@AtLeast('operator')
export class RecipeRevisionsController {
  constructor(
    private readonly views: RevisionViewsService,
    private readonly drafts: RevisionDraftsService,
  ) {}

  @Get('compare')
  @ApiOperation({ summary: 'Two to four revisions side by side, of one recipe or of several' })
  @ApiQuery({ name: 'ids', type: String, description: 'Two to four revisions, separated by commas, in the order of the columns' })
  @ApiOkResponse({ type: ComparisonDto })
  compare(@CurrentMember() actor: Actor, @Query() query: CompareQuery) {
    return this.views.compare(actor, query);
  }

  @Get(':revisionId')
  @ApiOperation({ summary: 'One revision, whole' })
  @ApiOkResponse({ type: RecipeRevisionDto })
  get(@CurrentMember() actor: Actor, @Param('revisionId', IdPipe) revisionId: string) {
    return this.views.get(actor, revisionId);
  }

  @Patch(':revisionId')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Change a draft; every value is read by the rules of the machine’s panel' })
  @ApiOkResponse({ type: RecipeRevisionDto })
  update(
    @CurrentMember() actor: Actor,
    @Param('revisionId', IdPipe) revisionId: string,
    @IfMatch() version: number,
    @Body() dto: UpdateRevisionDto,
  ) {
    return this.drafts.update(actor, revisionId, version, dto);
  }

  @Delete(':revisionId')
  @HttpCode(204)
  @ApiIfMatch()
  @ApiOperation({ summary: 'Discard a draft' })
  @ApiNoContentResponse({ description: 'It is gone; the ledger keeps that it was' })
  remove(@CurrentMember() actor: Actor, @Param('revisionId', IdPipe) revisionId: string, @IfMatch() version: number) {
    return this.drafts.remove(actor, revisionId, version);
  }

  @Put(':revisionId/evidence')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Say which cells a draft rests on and which proved it' })
  @ApiOkResponse({ type: RecipeRevisionDto })
  setEvidence(
    @CurrentMember() actor: Actor,
    @Param('revisionId', IdPipe) revisionId: string,
    @IfMatch() version: number,
    @Body() dto: SetEvidenceDto,
  ) {
    return this.drafts.setEvidence(actor, revisionId, version, dto);
  }

  @Get(':revisionId/evidence/candidates')
  @ApiOperation({ summary: 'Cells that a draft could cite' })
  @ApiOkResponse({ type: EvidenceCandidatesDto })
  candidates(@CurrentMember() actor: Actor, @Param('revisionId', IdPipe) revisionId: string) {
    return this.views.candidates(actor, revisionId);
  }
}
