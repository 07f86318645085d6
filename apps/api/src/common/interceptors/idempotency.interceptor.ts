import { type CallHandler, type ExecutionContext, Injectable, type NestInterceptor } from '@nestjs/common';
import type { FastifyReply, FastifyRequest } from 'fastify';
import { defer, from, lastValueFrom, type Observable } from 'rxjs';
import { IdempotencyKeyRequiredError } from '../errors/request.errors';
import { type IdempotencyContext, idempotencyStorage } from '../idempotency/idempotency-context';
import { requestFingerprint } from '../idempotency/request-fingerprint';

const KEY_FORM = /^[\x21-\x7e]{8,128}$/;

/** Hands key and fingerprint of the request to the unit of work that the handler opens. */
@Injectable()
export class IdempotencyInterceptor implements NestInterceptor {
  intercept(context: ExecutionContext, next: CallHandler): Observable<unknown> {
    const http = context.switchToHttp();
    const idempotency = contextOf(http.getRequest<FastifyRequest>());
    const answer = async () => {
      const body = await idempotencyStorage.run(idempotency, () => lastValueFrom(next.handle(), { defaultValue: undefined }));
      if (idempotency.replayed) http.getResponse<FastifyReply>().header('Idempotency-Replayed', 'true');
      return body;
    };
    return defer(() => from(answer()));
  }
}

function contextOf(request: FastifyRequest): IdempotencyContext {
  const key = request.headers['idempotency-key'];
  if (typeof key !== 'string' || !KEY_FORM.test(key)) throw new IdempotencyKeyRequiredError();
  return {
    route: `${request.method} ${request.routeOptions.url ?? request.url}`,
    key,
    requestHash: requestFingerprint(request),
    claimed: false,
    replayed: false,
  };
}
