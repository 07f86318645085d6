import { Body, Controller, HttpCode, Post, Req, Res, UseGuards } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiHeader, ApiNoContentResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { FastifyReply, FastifyRequest } from 'fastify';
import type { Actor } from '../common/actor';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Public } from '../common/decorators/public.decorator';
import { SessionOverError } from './auth.errors';
import { CurrentDevice, type Device } from './device.decorator';
import { SignedInDto } from './dto/session.dto';
import { SignInDto } from './dto/sign-in.dto';
import { SignUpDto } from './dto/sign-up.dto';
import { RefreshCookie } from './refresh-cookie';
import { SameOriginGuard } from './same-origin.guard';
import { SessionsService } from './sessions.service';
import { SignInService } from './sign-in.service';
import { SignUpService } from './sign-up.service';

const ApiRequestedBy = () =>
  ApiHeader({ name: 'X-Requested-By', required: true, description: 'Any text; a form of another site cannot send it' });

@ApiTags('auth')
@Controller('auth')
export class AuthController {
  constructor(
    private readonly signUps: SignUpService,
    private readonly signIns: SignInService,
    private readonly sessions: SessionsService,
    private readonly cookie: RefreshCookie,
  ) {}

  @Post('sign-up')
  @Public()
  @ApiOperation({ summary: 'Found a shop and become its owner' })
  @ApiCreatedResponse({ type: SignedInDto })
  async signUp(
    @Body() dto: SignUpDto,
    @CurrentDevice() device: Device,
    @Res({ passthrough: true }) reply: FastifyReply,
  ): Promise<SignedInDto> {
    const { body, refreshToken } = await this.signUps.signUp(dto, device);
    this.cookie.set(reply, refreshToken);
    return body;
  }

  @Post('sign-in')
  @Public()
  @HttpCode(200)
  @ApiOperation({ summary: 'Sign in; sets the refresh cookie' })
  @ApiOkResponse({ type: SignedInDto })
  async signIn(
    @Body() dto: SignInDto,
    @CurrentDevice() device: Device,
    @Res({ passthrough: true }) reply: FastifyReply,
  ): Promise<SignedInDto> {
    const { body, refreshToken } = await this.signIns.signIn(dto, device);
    this.cookie.set(reply, refreshToken);
    return body;
  }

  @Post('refresh')
  @Public()
  @UseGuards(SameOriginGuard)
  @HttpCode(200)
  @ApiRequestedBy()
  @ApiOperation({ summary: 'New access token by the refresh cookie, which is replaced' })
  @ApiOkResponse({ type: SignedInDto })
  async refresh(
    @Req() request: FastifyRequest,
    @CurrentDevice() device: Device,
    @Res({ passthrough: true }) reply: FastifyReply,
  ): Promise<SignedInDto> {
    const token = this.cookie.read(request);
    if (token === undefined) throw new SessionOverError();
    try {
      const { body, refreshToken } = await this.sessions.refresh(token, device);
      this.cookie.set(reply, refreshToken);
      return body;
    } catch (error) {
      if (error instanceof SessionOverError) this.cookie.clear(reply);
      throw error;
    }
  }

  @Post('sign-out')
  @Public()
  @UseGuards(SameOriginGuard)
  @HttpCode(204)
  @ApiRequestedBy()
  @ApiOperation({ summary: 'End this session' })
  @ApiNoContentResponse()
  async signOut(
    @Req() request: FastifyRequest,
    @CurrentDevice() device: Device,
    @Res({ passthrough: true }) reply: FastifyReply,
  ): Promise<void> {
    const token = this.cookie.read(request);
    if (token !== undefined) await this.sessions.signOut(token, device);
    this.cookie.clear(reply);
    // not "storage": entries that were typed but not yet sent are kept for the next sign-in
    void reply.header('Clear-Site-Data', '"cache"');
  }

  @Post('sign-out-everywhere')
  @ApiBearerAuth()
  @HttpCode(204)
  @ApiOperation({ summary: 'End every session of the person, on all devices, at once' })
  @ApiNoContentResponse()
  async signOutEverywhere(
    @CurrentMember() actor: Actor,
    @CurrentDevice() device: Device,
    @Res({ passthrough: true }) reply: FastifyReply,
  ): Promise<void> {
    await this.sessions.signOutEverywhere(actor, device);
    this.cookie.clear(reply);
    void reply.header('Clear-Site-Data', '"cache"');
  }
}
