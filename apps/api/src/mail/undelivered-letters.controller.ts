import { Controller, Get } from '@nestjs/common';
import { ApiBearerAuth, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { UnitOfWork } from '../database/unit-of-work';
import { UndeliveredLetterListDto } from './dto/undelivered-letter.dto';
import { OutboxService } from './outbox.service';

@ApiTags('mail')
@ApiBearerAuth()
@Controller('undelivered-letters')
export class UndeliveredLettersController {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly outbox: OutboxService,
  ) {}

  @Get()
  @AtLeast('owner')
  @ApiOperation({ summary: 'Letters that were refused for good or given up' })
  @ApiOkResponse({ type: UndeliveredLetterListDto })
  async list(@CurrentMember() actor: Actor): Promise<UndeliveredLetterListDto> {
    const letters = await this.unitOfWork.read(actor, (tx) => this.outbox.listDeadLetters(tx, actor.shopId));
    return { items: letters.map(({ writtenAt, ...letter }) => ({ ...letter, writtenAt: writtenAt.toISOString() })) };
  }
}
