import { createParamDecorator, type ExecutionContext } from '@nestjs/common';
import type { FastifyRequest } from 'fastify';
import { BadRequestError, PreconditionRequiredError } from '../errors/domain-error';

const STRONG_VERSION_TAG = /^"v([1-9]\d{0,8})"$/;

/** Strong entity tag of a version number. */
export const entityTag = (version: number) => `"v${version}"`;

/** @throws PreconditionRequiredError when absent, BadRequestError when it is not one strong tag of ours */
export function versionFromIfMatch(header: string | undefined): number {
  if (header === undefined)
    throw new PreconditionRequiredError('Send the header If-Match with the ETag of the version that you read, for example "v3".');
  const version = STRONG_VERSION_TAG.exec(header.trim())?.[1];
  if (version === undefined) throw new BadRequestError('If-Match must hold one ETag as this server gave it, for example "v3".');
  return Number(version);
}

/** The version that the caller read, from If-Match: `@IfMatch() version: number`. Document it with `@ApiIfMatch()`. */
export const IfMatch = createParamDecorator((_: unknown, context: ExecutionContext) =>
  versionFromIfMatch(context.switchToHttp().getRequest<FastifyRequest>().headers['if-match']),
);
