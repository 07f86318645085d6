import { type CanActivate, type ExecutionContext, Injectable } from '@nestjs/common';
import { Reflector } from '@nestjs/core';
import type { FastifyRequest } from 'fastify';
import { IS_PUBLIC } from '../common/decorators/public.decorator';
import { UnauthenticatedError } from '../common/errors/domain-error';
import { SessionsService } from './sessions.service';

const BEARER = /^Bearer ([\w-]+\.[\w-]+\.[\w-]+)$/;

/** Every route needs a live session unless it says @Public(). Role and membership are read from the database at each request. */
@Injectable()
export class AuthGuard implements CanActivate {
  constructor(
    private readonly reflector: Reflector,
    private readonly sessions: SessionsService,
  ) {}

  async canActivate(context: ExecutionContext): Promise<boolean> {
    if (this.reflector.getAllAndOverride<boolean | undefined>(IS_PUBLIC, [context.getHandler(), context.getClass()]) === true) return true;
    const request = context.switchToHttp().getRequest<FastifyRequest>();
    const token = BEARER.exec(request.headers.authorization ?? '')?.[1];
    if (token === undefined) throw new UnauthenticatedError('Sign in, then try again.');
    request.actor = await this.sessions.actorOf(token);
    return true;
  }
}
