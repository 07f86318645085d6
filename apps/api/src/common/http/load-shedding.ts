import type { FastifyInstance } from 'fastify';
import { problem } from '../filters/problem';
import { problemBody } from '../filters/problem-details.filter';

/** Requests that one process works on at once; beyond it an early 503 is kinder than a late one. */
export const MAX_REQUESTS_IN_FLIGHT = 200;
const LIVENESS = '/api/health/live';

/** Answers 503 with Retry-After as soon as too many requests are in flight. Liveness is always answered. */
export function shedLoad(fastify: FastifyInstance, maxInFlight = MAX_REQUESTS_IN_FLIGHT): void {
  const counted = new WeakSet<object>();
  let inFlight = 0;
  const release = (request: object) => {
    if (counted.delete(request)) inFlight -= 1;
  };
  fastify.addHook('onRequest', async (request, reply) => {
    if (request.url === LIVENESS) return;
    if (inFlight >= maxInFlight) {
      const busy = problem('try-again', undefined, { 'retry-after': '1' });
      return reply
        .code(busy.status)
        .headers(busy.headers)
        .type('application/problem+json; charset=utf-8')
        .send(problemBody(busy, request.id));
    }
    counted.add(request.raw);
    inFlight += 1;
    // 'close' also comes when the client goes away in the middle, which no reply hook reports
    reply.raw.once('close', () => release(request.raw));
  });
}
