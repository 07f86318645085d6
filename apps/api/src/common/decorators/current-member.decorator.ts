import { createParamDecorator, type ExecutionContext } from '@nestjs/common';
import type { FastifyRequest } from 'fastify';
import type { Actor } from '../actor';
import { UnauthenticatedError } from '../errors/domain-error';

declare module 'fastify' {
  interface FastifyRequest {
    /** Set by the guard that checks the access token. */
    actor?: Actor;
  }
}

/** Who is calling. @throws UnauthenticatedError on a route without a session */
export function actorOf(context: ExecutionContext): Actor {
  const { actor } = context.switchToHttp().getRequest<FastifyRequest>();
  if (actor === undefined) throw new UnauthenticatedError('Sign in, then try again.');
  return actor;
}

/** The signed-in member as a handler argument: `@CurrentMember() actor: Actor`. */
export const CurrentMember = createParamDecorator((_: unknown, context: ExecutionContext) => actorOf(context));
