import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Controller, Get, Module } from '@nestjs/common';
import { DocumentBuilder, SwaggerModule } from '@nestjs/swagger';
import { Public } from '../src/common/decorators/public.decorator';
import { createTestApp, type TestApp } from './support/app';
import { makeMember, makeShop, TEST_PASSWORD, type TestMember } from './support/factories';
import { expectProblem } from './support/problem';

const SECRET = 'select password_hash from person';
const NONCE = /^'nonce-([\w-]{22})'$/;

@Public()
@Controller('broken')
class BrokenController {
  @Get()
  fail(): void {
    throw new Error(SECRET);
  }
}

@Module({ controllers: [BrokenController] })
class BrokenModule {}

let test: TestApp;
let webRoot: string;
let owner: TestMember;
beforeAll(async () => {
  webRoot = mkdtempSync(join(tmpdir(), 'headers-'));
  mkdirSync(join(webRoot, 'assets'));
  writeFileSync(join(webRoot, 'index.html'), '<script nonce="__CSP_NONCE__" src="/assets/a-1.js"></script>');
  writeFileSync(join(webRoot, 'assets', 'a-1.js'), 'export {};');
  test = await createTestApp({ env: { WEB_ROOT: webRoot, PUBLIC_ORIGIN: 'https://plates.example' }, imports: [BrokenModule] });
  owner = await makeMember(test, await makeShop(test), 'owner');
});
afterAll(async () => {
  await test.close();
  rmSync(webRoot, { recursive: true });
});

type Answer = { readonly statusCode: number; readonly headers: Readonly<Record<string, unknown>>; readonly body: string };

/** Directives of a policy by name. */
const policyOf = ({ headers }: Answer) =>
  Object.fromEntries(
    String(headers['content-security-policy'])
      .split('; ')
      .map((directive) => {
        const [name = '', ...values] = directive.split(' ');
        return [name, values];
      }),
  );

const ON_EVERY_ANSWER = {
  'x-content-type-options': 'nosniff',
  'referrer-policy': 'no-referrer',
  'x-frame-options': 'DENY',
  'cross-origin-opener-policy': 'same-origin',
  'cross-origin-resource-policy': 'same-origin',
  'strict-transport-security': 'max-age=31536000; includeSubDomains',
};

/** Every operation that the api describes, with an id of nothing in the place of each parameter. */
function operations(): { method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE'; url: string }[] {
  const { paths } = SwaggerModule.createDocument(test.app, new DocumentBuilder().build());
  const described = Object.entries(paths).filter(([path]) => path !== '/api/broken');
  return described.flatMap(([path, item]) => {
    const url = path.replace(/\{[^}]+\}/g, '00000000-0000-7000-8000-000000000000');
    return (['GET', 'POST', 'PUT', 'PATCH', 'DELETE'] as const).flatMap((method) =>
      item[method.toLowerCase() as 'get'] === undefined ? [] : [{ method, url }],
    );
  });
}

describe('a page', () => {
  it('may load its own files and what carries the nonce of this answer, and nothing else', async () => {
    const page = await test.app.inject({ url: '/recipes' });
    const policy = policyOf(page);
    const [, nonce] = NONCE.exec(policy['script-src']?.[1] ?? '') ?? [];
    expect(policy).toEqual({
      'default-src': ["'self'"],
      'script-src': ["'self'", `'nonce-${nonce}'`],
      'style-src': ["'self'", `'nonce-${nonce}'`],
      'img-src': ["'self'", 'data:', 'blob:'],
      'font-src': ["'self'"],
      'connect-src': ["'self'"],
      'worker-src': ["'self'"],
      'object-src': ["'none'"],
      'base-uri': ["'none'"],
      'form-action': ["'self'"],
      'frame-ancestors': ["'none'"],
      'require-trusted-types-for': ["'script'"],
      'trusted-types': ['proofplate'],
    });
    expect(page.body).toContain(`nonce="${nonce}"`);
    expect(page.headers).toMatchObject({ ...ON_EVERY_ANSWER, 'cache-control': 'no-store' });
  });

  it('gets a nonce that was never used before', async () => {
    const nonces = new Set<unknown>();
    for (let number = 0; number < 50; number += 1) nonces.add(policyOf(await test.app.inject({ url: '/' }))['script-src']?.[1]);
    expect(nonces.size).toBe(50);
  });
});

describe('every operation of the api', () => {
  it('answers anonymous callers and owners alike with data that nobody caches, frames, sniffs or runs', async () => {
    const all = operations();
    expect(all.length).toBeGreaterThan(100);
    const wrong: object[] = [];
    for (const operation of all) {
      for (const headers of [{}, owner.headers]) {
        // sign-out-everywhere would end the session that the rest is asked with
        if (operation.url.endsWith('sign-out-everywhere') && headers === owner.headers) continue;
        const answer = await test.app.inject({ ...operation, headers, ...(operation.method === 'GET' ? {} : { payload: {} }) });
        const policy = policyOf(answer);
        const isData =
          Object.entries(ON_EVERY_ANSWER).every(([name, value]) => answer.headers[name] === value) &&
          answer.headers['cache-control'] === 'no-store' &&
          policy['default-src']?.join() === "'none'" &&
          policy['frame-ancestors']?.join() === "'none'" &&
          !String(answer.headers['content-type']).startsWith('text/html');
        if (!isData || answer.statusCode >= 500) wrong.push({ ...operation, status: answer.statusCode, headers: answer.headers });
      }
    }
    expect(wrong).toEqual([]);
  }, 60_000);

  it('lets no other origin read', async () => {
    for (const origin of ['https://evil.example', 'null', 'https://plates.example.evil.example']) {
      const answer = await test.app.inject({ url: '/api/session', headers: { ...owner.headers, origin } });
      expect(answer.headers['access-control-allow-origin']).toBeUndefined();
    }
  });
});

describe('a failure', () => {
  it('of our own says nothing of what is inside', async () => {
    const answer = await test.app.inject({ url: '/api/broken' });
    expectProblem(answer, 500, 'internal-error');
    expect(answer.body).not.toMatch(/select|password_hash|Error|\.ts|\.js|at /);
    expect(answer.headers).toMatchObject({ ...ON_EVERY_ANSWER, 'cache-control': 'no-store' });
  });

  it.each<[string, () => Promise<Answer>, number]>([
    ['an unknown address', async () => test.app.inject({ url: '/api/nowhere' }), 404],
    ['another method', async () => test.app.inject({ method: 'PUT', url: '/api/session' }), 404],
    [
      'a body that is no JSON',
      async () =>
        test.app.inject({ method: 'POST', url: '/api/auth/sign-in', headers: { 'content-type': 'application/json' }, payload: '{' }),
      400,
    ],
    [
      'a poisoned body',
      async () =>
        test.app.inject({
          ...{ method: 'POST', url: '/api/auth/sign-in', headers: { 'content-type': 'application/json' } },
          payload: '{"__proto__": {"role": "owner"}}',
        }),
      400,
    ],
    [
      'a body of another type',
      async () => test.app.inject({ method: 'POST', url: '/api/auth/sign-in', headers: { 'content-type': 'text/xml' }, payload: '<a/>' }),
      415,
    ],
    [
      'a body that is too long',
      async () => test.app.inject({ method: 'POST', url: '/api/auth/sign-in', payload: { email: 'a'.repeat(300_000) } }),
      413,
    ],
  ])('by the caller (%s) carries the same header fields and no stack', async (_, ask, status) => {
    const answer = await ask();
    expect(answer.statusCode).toBe(status);
    expect(answer.headers).toMatchObject({ ...ON_EVERY_ANSWER, 'cache-control': 'no-store' });
    expect(answer.body).not.toMatch(/node_modules|\.ts:|\.js:|\n\s+at /);
  });
});

describe('the refresh cookie', () => {
  const signIn = () =>
    test.app.inject({ method: 'POST', url: '/api/auth/sign-in', payload: { email: owner.email, password: TEST_PASSWORD } });
  const ATTRIBUTES = 'Path=/; HttpOnly; Secure; SameSite=Strict';

  it('is bound to this host and out of reach of scripts and of other sites', async () => {
    expect(String((await signIn()).headers['set-cookie'])).toMatch(
      new RegExp(`^__Host-proofplate-refresh=[\\w-]{43}; Max-Age=2592000; ${ATTRIBUTES}$`),
    );
  });

  it('is taken back under the same name and attributes', async () => {
    const [cookie] = String((await signIn()).headers['set-cookie']).split(';');
    const signOut = await test.app.inject({
      ...{ method: 'POST', url: '/api/auth/sign-out' },
      headers: { cookie, origin: 'https://plates.example', 'x-requested-by': 'test' },
    });
    expect(String(signOut.headers['set-cookie'])).toMatch(/^__Host-proofplate-refresh=;.*Expires=Thu, 01 Jan 1970 00:00:00 GMT/);
    for (const attribute of ATTRIBUTES.split('; ')) expect(String(signOut.headers['set-cookie'])).toContain(attribute);
    expect(signOut.headers['clear-site-data']).toBe('"cache"');
  });

  it('is set by nothing but signing in and out, and its token stands in no body', async () => {
    const answer = await signIn();
    const token = /refresh=([\w-]{43})/.exec(String(answer.headers['set-cookie']))?.[1] ?? 'no token';
    expect(answer.body).not.toContain(token);
    expect((await test.app.inject({ url: '/api/session', headers: owner.headers })).headers['set-cookie']).toBeUndefined();
  });
});
