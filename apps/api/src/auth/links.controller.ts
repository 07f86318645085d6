import { Body, Controller, HttpCode, Post, Res } from '@nestjs/common';
import { ApiAcceptedResponse, ApiCreatedResponse, ApiNoContentResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { FastifyReply } from 'fastify';
import { Public } from '../common/decorators/public.decorator';
import { AcceptanceService } from './acceptance.service';
import { CurrentDevice, type Device } from './device.decorator';
import { AcceptInvitationDto, InvitationPreviewDto, InvitationTokenDto } from './dto/accept-invitation.dto';
import { ForgotPasswordDto, ResetPasswordDto } from './dto/reset-password.dto';
import { SignedInDto } from './dto/session.dto';
import { PasswordResetService } from './password-reset.service';
import { RefreshCookie } from './refresh-cookie';

/** What the links in mail lead to. Tokens come in bodies, never in addresses. */
@ApiTags('auth')
@Public()
@Controller('auth')
export class LinksController {
  constructor(
    private readonly resets: PasswordResetService,
    private readonly acceptance: AcceptanceService,
    private readonly cookie: RefreshCookie,
  ) {}

  @Post('forgot-password')
  @HttpCode(202)
  @ApiOperation({ summary: 'Ask for a reset link; the answer is the same for every address' })
  @ApiAcceptedResponse()
  async forgot(@Body() { email }: ForgotPasswordDto, @CurrentDevice() device: Device): Promise<void> {
    await this.resets.forgot(email, device);
  }

  @Post('reset-password')
  @HttpCode(204)
  @ApiOperation({ summary: 'Set a new password by a reset link; ends every session' })
  @ApiNoContentResponse()
  async reset(@Body() dto: ResetPasswordDto, @CurrentDevice() device: Device): Promise<void> {
    await this.resets.reset(dto, device);
  }

  @Post('invitation-preview')
  @HttpCode(200)
  @ApiOperation({ summary: 'What an invitation is about' })
  @ApiOkResponse({ type: InvitationPreviewDto })
  preview(@Body() { token }: InvitationTokenDto): Promise<InvitationPreviewDto> {
    return this.acceptance.preview(token);
  }

  @Post('accept-invitation')
  @ApiOperation({ summary: 'Join a shop by an invitation; signs in' })
  @ApiCreatedResponse({ type: SignedInDto })
  async accept(
    @Body() dto: AcceptInvitationDto,
    @CurrentDevice() device: Device,
    @Res({ passthrough: true }) reply: FastifyReply,
  ): Promise<SignedInDto> {
    const { body, refreshToken } = await this.acceptance.accept(dto, device);
    this.cookie.set(reply, refreshToken);
    return body;
  }
}
