import { Controller, Get, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { PageQuery } from '../common/pagination/page';
import { SignOffQueueDto } from './dto/sign-off-queue.dto';
import { SignOffQueueService } from './sign-off-queue.service';

@ApiTags('sign-offs')
@ApiBearerAuth()
@Controller('sign-offs')
@AtLeast('operator')
export class SignOffQueueController {
  constructor(private readonly queue: SignOffQueueService) {}

  @Get('queue')
  @ApiOperation({ summary: 'Revisions that wait for a signature, oldest first' })
  @ApiOkResponse({ type: SignOffQueueDto })
  list(@CurrentMember() actor: Actor, @Query() query: PageQuery) {
    return this.queue.list(actor, query);
  }
}
