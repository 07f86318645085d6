import { existsSync, readFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import fastifyStatic from '@fastify/static';
import type { NestFastifyApplication } from '@nestjs/platform-fastify';
import { newNonce, pagePolicy } from './security-headers';

const NONCE_MARK = '__CSP_NONCE__';
/** Addresses that never are pages: an unknown one is an honest 404 instead of the start page. */
const NO_PAGE = /^\/(?:api|problems|assets)(?:\/|$|\?)/;
const IMMUTABLE = 'public, max-age=31536000, immutable';

/** Serves the built web application: hashed files for ever, every other address as the start page with a nonce of its own. */
export async function servePages(app: NestFastifyApplication, webRoot: string): Promise<void> {
  const index = join(webRoot, 'index.html');
  if (!existsSync(index)) throw new Error('WEB_ROOT holds no index.html: build the web application first');
  const page = readFileSync(index, 'utf8');
  await app.register(fastifyStatic, {
    root: resolve(webRoot),
    wildcard: false,
    index: false,
    globIgnore: ['**/index.html'],
    cacheControl: false,
    setHeaders: (reply, path) => {
      void reply.header('cache-control', path.includes('/assets/') ? IMMUTABLE : 'no-cache');
    },
  });
  // not setNotFoundHandler: Nest sets its own and Fastify refuses a second one
  const fastify = app.getHttpAdapter().getInstance();
  fastify.get('/*', (request, reply) => {
    if (NO_PAGE.test(request.url)) return reply.callNotFound();
    const nonce = newNonce();
    return reply
      .headers({ 'content-security-policy': pagePolicy(nonce), 'cache-control': 'no-store' })
      .type('text/html; charset=utf-8')
      .send(page.replaceAll(NONCE_MARK, nonce));
  });
}
