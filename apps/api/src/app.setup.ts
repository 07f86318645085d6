import cookie from '@fastify/cookie';
import multipart from '@fastify/multipart';
import { FastifyAdapter, type NestFastifyApplication } from '@nestjs/platform-fastify';
import { ProblemDetailsFilter } from './common/filters/problem-details.filter';
import { setDeadlines } from './common/http/deadline';
import { serverOptions, UPLOAD_LIMIT_BYTES } from './common/http/http-options';
import { shedLoad } from './common/http/load-shedding';
import { setSecurityHeaders } from './common/http/security-headers';
import { servePages } from './common/http/web-pages';
import { EntityTagInterceptor } from './common/interceptors/entity-tag.interceptor';
import { RequestValidationPipe } from './common/pipes/validation.pipe';
import { Env } from './config/env.validation';

/** The HTTP server under Nest, before anything is registered on it. */
export const createAdapter = (env: Env) => new FastifyAdapter(serverOptions(env));

/** What main, the tests and the OpenAPI writer share: pipes, filters, headers, limits, pages. */
export async function configureApp(app: NestFastifyApplication): Promise<void> {
  const env = app.get(Env);
  const fastify = app.getHttpAdapter().getInstance();
  setSecurityHeaders(fastify, { isHttps: env.isServedOverHttps });
  setDeadlines(fastify);
  shedLoad(fastify);
  await app.register(cookie);
  await app.register(multipart, { limits: { fileSize: UPLOAD_LIMIT_BYTES, files: 1, fields: 10, parts: 11 }, throwFileSizeLimit: true });
  app.setGlobalPrefix('api', { exclude: ['problems/:code'] });
  app.useGlobalPipes(new RequestValidationPipe());
  app.useGlobalFilters(new ProblemDetailsFilter());
  app.useGlobalInterceptors(new EntityTagInterceptor());
  app.enableShutdownHooks();
  if (env.WEB_ROOT !== undefined) await servePages(app, env.WEB_ROOT);
}
