import { applyDecorators, UseInterceptors } from '@nestjs/common';
import { ApiHeader } from '@nestjs/swagger';
import { IdempotencyInterceptor } from '../interceptors/idempotency.interceptor';

/**
 * A creating or signing call: needs Idempotency-Key, runs its effect once, and answers a repeat with the first answer
 * (`Idempotency-Replayed: true`). The key is stored in the transaction of the effect, so the handler must use `UnitOfWork.run`.
 */
export const Idempotent = () =>
  applyDecorators(
    UseInterceptors(IdempotencyInterceptor),
    ApiHeader({
      name: 'Idempotency-Key',
      required: true,
      description: '8 to 128 visible characters, new for each act and the same for each retry',
      schema: { type: 'string', minLength: 8, maxLength: 128 },
    }),
  );
