import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createTestApp, type TestApp } from './support/app';
import { expectProblem } from './support/problem';

let test: TestApp;
let webRoot: string;
beforeAll(async () => {
  webRoot = mkdtempSync(join(tmpdir(), 'pages-'));
  mkdirSync(join(webRoot, 'assets'));
  writeFileSync(
    join(webRoot, 'index.html'),
    '<meta name="csp-nonce" content="__CSP_NONCE__"><script nonce="__CSP_NONCE__" src="/assets/a-1.js"></script>',
  );
  writeFileSync(join(webRoot, 'assets', 'a-1.js'), 'export {};');
  test = await createTestApp({ env: { WEB_ROOT: webRoot, PUBLIC_ORIGIN: 'https://plates.example' } });
});
afterAll(async () => {
  await test.close();
  rmSync(webRoot, { recursive: true });
});

const get = (url: string) => test.app.inject({ url });

describe('a page', () => {
  it.each(['/', '/index.html', '/recipes/some/deep/address'])('at %s is the start page with the nonce of its policy', async (url) => {
    const page = await get(url);
    const nonce = /'nonce-([\w-]{22})'/.exec(String(page.headers['content-security-policy']))?.[1];
    expect(nonce).toBeDefined();
    expect(page.headers['content-type']).toBe('text/html; charset=utf-8');
    expect(page.body).toBe(`<meta name="csp-nonce" content="${nonce}"><script nonce="${nonce}" src="/assets/a-1.js"></script>`);
    expect(page.headers['cache-control']).toBe('no-store');
  });

  it('gets another nonce each time, and nothing inline is allowed', async () => {
    const policies = [await get('/'), await get('/')].map((page) => String(page.headers['content-security-policy']));
    expect(policies[0]).not.toBe(policies[1]);
    expect(policies[0]).not.toContain('unsafe');
    expect(policies[0]).toContain("require-trusted-types-for 'script'");
    expect(policies[0]).toContain("base-uri 'none'");
  });

  it('asks for https for a year when it is served over https', async () => {
    expect((await get('/')).headers['strict-transport-security']).toBe('max-age=31536000; includeSubDomains');
  });
});

describe('a file', () => {
  it('with a hash in its name is kept for ever', async () => {
    const file = await get('/assets/a-1.js');
    expect([file.statusCode, file.headers['cache-control']]).toEqual([200, 'public, max-age=31536000, immutable']);
    expect(file.headers['x-content-type-options']).toBe('nosniff');
  });

  it('that is not there is an honest 404, not the start page', async () => {
    expectProblem(await get('/assets/gone.js'), 404, 'not-found');
  });

  it.each(['/assets/../../etc/passwd', '/..%2f..%2fetc%2fpasswd', '/assets/%2e%2e/index.html'])(
    'outside the folder is out of reach (%s)',
    async (url) => {
      expect((await get(url)).body).not.toContain('root:');
    },
  );
});

describe('the api beside the pages', () => {
  it('keeps its own addresses', async () => {
    expectProblem(await get('/api/nowhere'), 404, 'not-found');
    expectProblem(await get('/problems/nothing'), 404, 'not-found');
    expect((await get('/api/health/live')).statusCode).toBe(200);
  });

  it('sets its cookie for this host over https only', async () => {
    const signUp = await test.app.inject({
      method: 'POST',
      url: '/api/auth/sign-up',
      payload: {
        shopName: 'Bright Mark Works',
        name: 'Ada Brandt',
        email: 'ada@example.com',
        password: 'violet kettle on the roof',
        unitSystem: 'inch',
        timeZone: 'UTC',
        locale: 'en-US',
      },
    });
    expect(signUp.headers['set-cookie']).toMatch(
      /^__Host-proofplate-refresh=[\w-]{43}; Max-Age=2592000; Path=\/; HttpOnly; Secure; SameSite=Strict$/,
    );
  });
});
