import { Injectable } from '@nestjs/common';
import type { FastifyReply, FastifyRequest } from 'fastify';
import { Env } from '../config/env.validation';
import { SESSION_LIVES_HOURS } from './sessions.service';

/**
 * The refresh token's cookie: out of reach of scripts, sent to this site only. Over https its name carries the __Host- prefix, which
 * binds it to the host; browsers refuse that prefix on plain http, where development runs.
 */
@Injectable()
export class RefreshCookie {
  private readonly name: string;
  private readonly attributes: { readonly httpOnly: true; readonly sameSite: 'strict'; readonly path: '/'; readonly secure: boolean };

  constructor(env: Env) {
    this.name = env.isServedOverHttps ? '__Host-proofplate-refresh' : 'proofplate-refresh';
    this.attributes = { httpOnly: true, sameSite: 'strict', path: '/', secure: env.isServedOverHttps };
  }

  read(request: FastifyRequest): string | undefined {
    return request.cookies[this.name];
  }

  set(reply: FastifyReply, refreshToken: string): void {
    void reply.setCookie(this.name, refreshToken, { ...this.attributes, maxAge: SESSION_LIVES_HOURS * 3_600 });
  }

  clear(reply: FastifyReply): void {
    void reply.clearCookie(this.name, this.attributes);
  }
}
