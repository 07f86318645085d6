import { createParamDecorator, type ExecutionContext } from '@nestjs/common';
import type { FastifyRequest } from 'fastify';

/** Where a call comes from, for limits and the list of account events. */
export type Device = { readonly address: string; readonly userAgent: string | undefined };

export const CurrentDevice = createParamDecorator((_: unknown, context: ExecutionContext): Device => {
  const request = context.switchToHttp().getRequest<FastifyRequest>();
  return { address: request.ip, userAgent: request.headers['user-agent'] };
});
