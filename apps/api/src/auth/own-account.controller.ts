import { Body, Controller, Delete, Get, HttpCode, Param, Post } from '@nestjs/common';
import { ApiBearerAuth, ApiNoContentResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { CurrentDevice, type Device } from './device.decorator';
import { ChangePasswordDto, OpenSessionListDto } from './dto/own-account.dto';
import { OwnAccountService } from './own-account.service';

@ApiTags('auth')
@ApiBearerAuth()
@Controller('auth')
export class OwnAccountController {
  constructor(private readonly account: OwnAccountService) {}

  @Post('change-password')
  @HttpCode(204)
  @ApiOperation({ summary: 'Set a new password with the present one; ends every other session of the person' })
  @ApiNoContentResponse()
  changePassword(@CurrentMember() actor: Actor, @Body() dto: ChangePasswordDto, @CurrentDevice() device: Device): Promise<void> {
    return this.account.changePassword(actor, dto, device);
  }

  @Get('sessions')
  @ApiOperation({ summary: 'Where the person is signed in' })
  @ApiOkResponse({ type: OpenSessionListDto })
  async listSessions(@CurrentMember() actor: Actor): Promise<OpenSessionListDto> {
    return { items: await this.account.listSessions(actor) };
  }

  @Delete('sessions/:id')
  @HttpCode(204)
  @ApiOperation({ summary: 'Sign one device of the person out, at once' })
  @ApiNoContentResponse()
  endSession(@CurrentMember() actor: Actor, @Param('id', IdPipe) id: string, @CurrentDevice() device: Device): Promise<void> {
    return this.account.endSession(actor, id, device);
  }
}
