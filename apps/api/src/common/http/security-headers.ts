import { randomBytes } from 'node:crypto';
import type { FastifyInstance } from 'fastify';

const NONCE_BYTES = 16;
const ONE_YEAR_S = 31_536_000;
const API_PATH = /^\/(?:api|problems)(?:\/|$|\?)/;

/** Policy of pages: own files only, scripts and styles of ours or with this answer's nonce, no inline anything (Trusted Types on). */
export function pagePolicy(nonce: string): string {
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}'`,
    `style-src 'self' 'nonce-${nonce}'`,
    "img-src 'self' data: blob:",
    "font-src 'self'",
    "connect-src 'self'",
    "worker-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
    "require-trusted-types-for 'script'",
    'trusted-types proofplate',
  ].join('; ');
}

/** Answers of the api are data: nothing in them may be run or shown as a page. */
export const API_POLICY = "default-src 'none'; frame-ancestors 'none'; sandbox";

export const newNonce = () => randomBytes(NONCE_BYTES).toString('base64url');

/** Header fields that every answer carries, errors included. A route may set a stricter or more fitting value before it answers. */
export function setSecurityHeaders(fastify: FastifyInstance, { isHttps }: { isHttps: boolean }): void {
  fastify.addHook('onSend', async (request, reply) => {
    const defaults: Record<string, string> = {
      'x-content-type-options': 'nosniff',
      'referrer-policy': 'no-referrer',
      'x-frame-options': 'DENY',
      'cross-origin-opener-policy': 'same-origin',
      'cross-origin-resource-policy': 'same-origin',
      'permissions-policy': 'geolocation=(), microphone=(), payment=(), usb=()',
      ...(isHttps ? { 'strict-transport-security': `max-age=${ONE_YEAR_S}; includeSubDomains` } : {}),
      ...(API_PATH.test(request.url)
        ? { 'cache-control': 'no-store', 'content-security-policy': API_POLICY }
        : { 'content-security-policy': pagePolicy(newNonce()) }),
    };
    for (const [name, value] of Object.entries(defaults)) if (!reply.hasHeader(name)) reply.header(name, value);
  });
}
