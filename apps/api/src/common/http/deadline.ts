import { AsyncLocalStorage } from 'node:async_hooks';
import type { FastifyInstance } from 'fastify';

export const REQUEST_DEADLINE_MS = 10_000;
export const UPLOAD_DEADLINE_MS = 60_000;
/** Routes that receive whole files get the longer deadline. */
const UPLOAD_ROUTE = /\/(?:photos?|uploads?|imports?|files?)$/;

type Deadline = { readonly atMs: number };
const deadlineStorage = new AsyncLocalStorage<Deadline>();

export const isUploadRoute = (method: string | string[], url: string) => [method].flat().includes('POST') && UPLOAD_ROUTE.test(url);

/** Gives each request its deadline; Fastify answers 503 when it passes, and the unit of work refuses to commit after it. */
export function setDeadlines(fastify: FastifyInstance): void {
  fastify.addHook('onRoute', (route) => {
    if (isUploadRoute(route.method, route.url)) route.handlerTimeout = UPLOAD_DEADLINE_MS;
  });
  const deadlines = new WeakMap<object, Deadline>();
  fastify.addHook('onRequest', (request, _reply, done) => {
    const allowedMs = isUploadRoute(request.method, request.routeOptions.url ?? '') ? UPLOAD_DEADLINE_MS : REQUEST_DEADLINE_MS;
    deadlines.set(request, { atMs: performance.now() + allowedMs });
    done();
  });
  // entered only here: reading the body runs in the socket's own async context, which would lose it
  fastify.addHook('preValidation', (request, _reply, done) => {
    const deadline = deadlines.get(request);
    if (deadline === undefined) done();
    else deadlineStorage.run(deadline, done);
  });
}

/** Time left for the request that is running, by the monotonic clock; undefined outside a request. */
export function remainingMs(): number | undefined {
  const deadline = deadlineStorage.getStore();
  return deadline === undefined ? undefined : deadline.atMs - performance.now();
}
