import type { IncomingMessage } from 'node:http';
import type { Params } from 'nestjs-pino';
import type { Env } from '../../config/env.validation';

/** Header fields and body members that never reach a log. */
const REDACTED = [
  'req.headers.authorization',
  'req.headers.cookie',
  'res.headers["set-cookie"]',
  '*.password',
  '*.token',
  '*.accessToken',
  '*.refreshToken',
];

/** One line per request: method, path without its query, status, time. Queries may carry signatures, bodies carry passwords. */
export function logSettings(env: Env): Params {
  return {
    pinoHttp: {
      level: env.LOG_LEVEL,
      redact: { paths: REDACTED, censor: '[hidden]' },
      quietReqLogger: true,
      autoLogging: { ignore: isHealthCheck },
      serializers: {
        req: (request: { id: unknown; method: string; url: string; remoteAddress?: string }) => ({
          id: request.id,
          method: request.method,
          path: request.url.split('?')[0],
          remoteAddress: request.remoteAddress,
        }),
        res: (response: { statusCode: number }) => ({ status: response.statusCode }),
      },
    },
    forRoutes: ['{*path}'],
  };
}

/** Health is asked for every few seconds. Nest mounts the logger, which shortens `url`; the address as it came stands beside it. */
function isHealthCheck(request: IncomingMessage & { readonly originalUrl?: string }): boolean {
  return (request.originalUrl ?? request.url ?? '').startsWith('/api/health/');
}
