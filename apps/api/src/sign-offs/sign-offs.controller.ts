import { Body, Controller, Get, HttpCode, Param, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { ApiIfMatch } from '../common/decorators/api-headers.decorator';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IfMatch } from '../common/decorators/if-match.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { RecipeRevisionDto } from '../recipes/dto/recipe-revision.dto';
import { ApprovalChecksService } from './approval-checks.service';
import { ApprovalsService } from './approvals.service';
import { ApprovalChecksDto } from './dto/checks.dto';
import { ApproveRevisionDto, RecallRevisionDto, ReturnRevisionDto, SubmitRevisionDto, WithdrawRevisionDto } from './dto/sign-off-acts.dto';
import { SignOffsService } from './sign-offs.service';

@ApiTags('sign-offs')
@ApiBearerAuth()
@Controller('revisions/:revisionId')
@AtLeast('operator')
export class SignOffsController {
  constructor(
    private readonly signOffs: SignOffsService,
    private readonly approvals: ApprovalsService,
    private readonly approvalChecks: ApprovalChecksService,
  ) {}

  @Get('checks')
  @ApiOperation({ summary: 'Everything that an approval needs, with what was found; failing checks first' })
  @ApiOkResponse({ type: ApprovalChecksDto })
  checks(@CurrentMember() actor: Actor, @Param('revisionId', IdPipe) revisionId: string) {
    return this.approvalChecks.get(actor, revisionId);
  }

  @Post('submit')
  @HttpCode(200)
  @Idempotent()
  @ApiIfMatch()
  @ApiOperation({ summary: 'Submit a draft for review: it gets its number and never changes again' })
  @ApiOkResponse({ type: RecipeRevisionDto })
  submit(
    @CurrentMember() actor: Actor,
    @Param('revisionId', IdPipe) revisionId: string,
    @IfMatch() version: number,
    @Body() dto: SubmitRevisionDto,
  ) {
    return this.signOffs.submit(actor, revisionId, version, dto);
  }

  @Post('recall')
  @HttpCode(200)
  @Idempotent()
  @ApiOperation({ summary: 'Take an own revision back out of review' })
  @ApiOkResponse({ type: RecipeRevisionDto })
  recall(@CurrentMember() actor: Actor, @Param('revisionId', IdPipe) revisionId: string, @Body() dto: RecallRevisionDto) {
    return this.signOffs.recall(actor, revisionId, dto);
  }

  @Post('return')
  @HttpCode(200)
  @AtLeast('lead')
  @Idempotent()
  @ApiOperation({ summary: 'Send a revision back to its author with a reason' })
  @ApiOkResponse({ type: RecipeRevisionDto })
  returnToAuthor(@CurrentMember() actor: Actor, @Param('revisionId', IdPipe) revisionId: string, @Body() dto: ReturnRevisionDto) {
    return this.signOffs.returnToAuthor(actor, revisionId, dto);
  }

  @Post('approve')
  @HttpCode(200)
  @AtLeast('lead')
  @Idempotent()
  @ApiOperation({ summary: 'Approve with the password: it becomes the setting, now or on its day' })
  @ApiOkResponse({ type: RecipeRevisionDto })
  approve(@CurrentMember() actor: Actor, @Param('revisionId', IdPipe) revisionId: string, @Body() dto: ApproveRevisionDto) {
    return this.approvals.approve(actor, revisionId, dto);
  }

  @Post('withdraw')
  @HttpCode(200)
  @AtLeast('lead')
  @Idempotent()
  @ApiOperation({ summary: 'Withdraw an approved revision with the password, also one that is yet to take effect' })
  @ApiOkResponse({ type: RecipeRevisionDto })
  withdraw(@CurrentMember() actor: Actor, @Param('revisionId', IdPipe) revisionId: string, @Body() dto: WithdrawRevisionDto) {
    return this.approvals.withdraw(actor, revisionId, dto);
  }
}
