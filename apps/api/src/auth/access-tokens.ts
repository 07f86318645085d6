import { Injectable } from '@nestjs/common';
import { JwtService } from '@nestjs/jwt';
import { Env } from '../config/env.validation';
import { SessionOverError } from './auth.errors';

export const ACCESS_TOKEN_LIVES_S = 600;
const ALGORITHM = 'HS256';
const ISSUER = 'proofplate';
const AUDIENCE = 'proofplate-api';
const TYPE = 'access';
const CLOCK_TOLERANCE_S = 30;

export type AccessClaims = { readonly personId: string; readonly sessionId: string; readonly version: number };
export type AccessToken = { readonly accessToken: string; readonly expiresAt: string };

/** Short-lived signed tokens: one algorithm, one issuer, one audience, one type; anything else is refused. */
@Injectable()
export class AccessTokens {
  constructor(
    private readonly jwt: JwtService,
    private readonly env: Env,
  ) {}

  async mint({ personId, sessionId, version }: AccessClaims): Promise<AccessToken> {
    const accessToken = await this.jwt.signAsync(
      { typ: TYPE, sid: sessionId, ver: version },
      {
        secret: this.env.JWT_SECRET,
        algorithm: ALGORITHM,
        subject: personId,
        issuer: ISSUER,
        audience: AUDIENCE,
        expiresIn: ACCESS_TOKEN_LIVES_S,
      },
    );
    return { accessToken, expiresAt: new Date(Date.now() + ACCESS_TOKEN_LIVES_S * 1_000).toISOString() };
  }

  /** @throws SessionOverError for every token that is not one of ours, unchanged and in time */
  async verify(token: string): Promise<AccessClaims> {
    const claims = await this.jwt
      .verifyAsync<Record<string, unknown>>(token, {
        secret: this.env.JWT_SECRET,
        algorithms: [ALGORITHM],
        issuer: ISSUER,
        audience: AUDIENCE,
        clockTolerance: CLOCK_TOLERANCE_S,
      })
      .catch(() => undefined);
    const { typ, sub, sid, ver } = claims ?? {};
    if (typ !== TYPE || typeof sub !== 'string' || typeof sid !== 'string' || typeof ver !== 'number') throw new SessionOverError();
    return { personId: sub, sessionId: sid, version: ver };
  }
}
