import type { FastifyServerOptions } from 'fastify';
import { uuidv7 } from 'uuidv7';
import type { Env } from '../../config/env.validation';
import { REQUEST_DEADLINE_MS, UPLOAD_DEADLINE_MS } from './deadline';

/** Largest JSON body. Whole files go through multipart with a limit of their own. */
export const JSON_BODY_LIMIT_BYTES = 256 * 1024;
export const UPLOAD_LIMIT_BYTES = 25 * 1024 * 1024;
const CONNECTION_TIMEOUT_MS = UPLOAD_DEADLINE_MS + 10_000;
const KEEP_ALIVE_TIMEOUT_MS = 65_000;
const MAX_PARAM_LENGTH = 100;

/**
 * Settings of the HTTP server. The socket-level limits must let a slow upload through, so they follow the upload deadline; every
 * other request is held to its own shorter deadline by `handlerTimeout`.
 */
export function serverOptions(env: Env): FastifyServerOptions {
  return {
    bodyLimit: JSON_BODY_LIMIT_BYTES,
    handlerTimeout: REQUEST_DEADLINE_MS,
    requestTimeout: UPLOAD_DEADLINE_MS,
    connectionTimeout: CONNECTION_TIMEOUT_MS,
    keepAliveTimeout: KEEP_ALIVE_TIMEOUT_MS,
    routerOptions: { maxParamLength: MAX_PARAM_LENGTH },
    onProtoPoisoning: 'error',
    onConstructorPoisoning: 'error',
    trustProxy: env.TRUSTED_PROXY_HOPS === 0 ? false : env.TRUSTED_PROXY_HOPS,
    forceCloseConnections: 'idle',
    return503OnClosing: true,
    genReqId: () => uuidv7(),
    logger: false,
  };
}
