import { Controller, Get } from '@nestjs/common';
import { ApiBearerAuth, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { SessionDto } from './dto/session.dto';
import { SessionsService } from './sessions.service';

@ApiTags('auth')
@ApiBearerAuth()
@Controller('session')
export class SessionController {
  constructor(private readonly sessions: SessionsService) {}

  @Get()
  @ApiOperation({ summary: 'Who is signed in, and where' })
  @ApiOkResponse({ type: SessionDto })
  get(@CurrentMember() actor: Actor): Promise<SessionDto> {
    return this.sessions.describeActor(actor);
  }
}
