import { type CanActivate, type ExecutionContext, Injectable } from '@nestjs/common';
import type { FastifyRequest } from 'fastify';
import { Env } from '../config/env.validation';
import { WrongOriginError } from './auth.errors';

/** For the calls that act by cookie alone: they must come from our own pages, and no form of another site can set the header. */
@Injectable()
export class SameOriginGuard implements CanActivate {
  constructor(private readonly env: Env) {}

  canActivate(context: ExecutionContext): boolean {
    const { headers } = context.switchToHttp().getRequest<FastifyRequest>();
    const isOurs = headers.origin !== undefined && (headers.origin === this.env.PUBLIC_ORIGIN || hostOf(headers.origin) === headers.host);
    if (isOurs && headers['x-requested-by'] !== undefined) return true;
    throw new WrongOriginError();
  }
}

const hostOf = (origin: string) => (URL.canParse(origin) ? new URL(origin).host : undefined);
