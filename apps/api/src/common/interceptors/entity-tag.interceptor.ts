import { type CallHandler, type ExecutionContext, Injectable, type NestInterceptor } from '@nestjs/common';
import type { FastifyReply } from 'fastify';
import { type Observable, tap } from 'rxjs';
import { entityTag } from '../decorators/if-match.decorator';

/** Sets a strong ETag on every answer that carries its `version`. */
@Injectable()
export class EntityTagInterceptor implements NestInterceptor {
  intercept(context: ExecutionContext, next: CallHandler): Observable<unknown> {
    return next.handle().pipe(
      tap((body: unknown) => {
        if (!hasVersion(body)) return;
        context.switchToHttp().getResponse<FastifyReply>().header('ETag', entityTag(body.version));
      }),
    );
  }
}

function hasVersion(body: unknown): body is { version: number } {
  return typeof body === 'object' && body !== null && 'version' in body && Number.isInteger(body.version);
}
