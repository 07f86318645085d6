import { Body, Controller, Get, HttpCode, Param, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { RecipeRevisionDto } from './dto/recipe-revision.dto';
import { CreateTransferDto, PreviewTransferDto, TransferGroundDto, TransferPreviewDto } from './dto/transfer.dto';
import { TransfersService } from './transfers.service';

@ApiTags('revisions')
@ApiBearerAuth()
@Controller('revisions/:revisionId/transfers')
@AtLeast('operator')
export class TransfersController {
  constructor(private readonly transfers: TransfersService) {}

  @Get('targets')
  @ApiOperation({ summary: 'Machines and lenses that a submitted revision could be transferred to, with what that is worked out from' })
  @ApiOkResponse({ type: TransferGroundDto })
  targets(@CurrentMember() actor: Actor, @Param('revisionId', IdPipe) revisionId: string) {
    return this.transfers.targets(actor, revisionId);
  }

  @Post('preview')
  @HttpCode(200)
  @ApiOperation({ summary: 'What a transfer keeps and what the target’s panel would show, or why there is none; stores nothing' })
  @ApiOkResponse({ type: TransferPreviewDto })
  preview(@CurrentMember() actor: Actor, @Param('revisionId', IdPipe) revisionId: string, @Body() dto: PreviewTransferDto) {
    return this.transfers.preview(actor, revisionId, dto);
  }

  @Post()
  @Idempotent()
  @ApiOperation({ summary: 'Draft the transfer on the target; it cites its source and needs a coupon' })
  @ApiCreatedResponse({ type: RecipeRevisionDto })
  create(@CurrentMember() actor: Actor, @Param('revisionId', IdPipe) revisionId: string, @Body() dto: CreateTransferDto) {
    return this.transfers.create(actor, revisionId, dto);
  }
}
