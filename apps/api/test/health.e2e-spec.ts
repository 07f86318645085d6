import { HealthService } from '../src/health/health.service';
import { createTestApp, type TestApp } from './support/app';
import { expectProblem } from './support/problem';

let test: TestApp;
beforeAll(async () => {
  test = await createTestApp();
});
afterAll(() => test.close());

describe('health', () => {
  it('is live without asking anything else', async () => {
    const answer = await test.app.inject({ url: '/api/health/live' });
    expect(answer.json()).toEqual({ status: 'ok' });
  });

  it('is ready with the database at the expected level', async () => {
    const answer = await test.app.inject({ url: '/api/health/ready' });
    expect([answer.statusCode, answer.body]).toEqual([200, '{"status":"ok"}']);
  });
});

describe('every answer', () => {
  it('of the api is data: nosniff, no referrer, never stored, nothing may run', async () => {
    const { headers } = await test.app.inject({ url: '/api/health/live' });
    expect(headers).toMatchObject({
      'x-content-type-options': 'nosniff',
      'referrer-policy': 'no-referrer',
      'cache-control': 'no-store',
      'content-security-policy': "default-src 'none'; frame-ancestors 'none'; sandbox",
    });
    expect(headers['strict-transport-security']).toBeUndefined();
    expect(headers['access-control-allow-origin']).toBeUndefined();
  });

  it('of an unknown address is a problem with the same header fields', async () => {
    const answer = await test.app.inject({ url: '/api/nowhere' });
    expectProblem(answer, 404, 'not-found');
    expect(answer.headers['x-content-type-options']).toBe('nosniff');
  });
});

describe('GET /problems/:code', () => {
  it('explains a problem type, without the api prefix', async () => {
    const answer = await test.app.inject({ url: '/problems/stale-version' });
    expect(answer.json()).toMatchObject({ code: 'stale-version', status: 412, meaning: expect.stringContaining('present state') });
  });

  it.each(['unheard-of', '__proto__', 'constructor'])('knows no type %s', async (code) => {
    expectProblem(await test.app.inject({ url: `/problems/${code}` }), 404, 'not-found');
  });
});

describe('a body', () => {
  const send = (payload: string, type = 'application/json') =>
    test.app.inject({ method: 'POST', url: '/api/auth/sign-in', headers: { 'content-type': type }, payload });

  it('that is no JSON is a bad request', async () => {
    expectProblem(await send('{"email":'), 400, 'bad-request');
  });

  it('that reaches for prototypes is a bad request', async () => {
    expectProblem(await send('{"email":"a@example.com","password":"x","__proto__":{"role":"owner"}}'), 400, 'bad-request');
  });

  it('of another type is refused', async () => {
    expectProblem(await send('<a/>', 'application/xml'), 415, 'unsupported-type');
  });

  it('beyond 256 kB is refused', async () => {
    expectProblem(await send(JSON.stringify({ email: 'x'.repeat(300_000) })), 413, 'too-large');
  });
});

describe('a shutdown', () => {
  it('begins with not being ready, while requests are still answered', async () => {
    const stopping = await createTestApp();
    stopping.app.get(HealthService).onModuleDestroy();
    expectProblem(await stopping.app.inject({ url: '/api/health/ready' }), 503, 'try-again');
    expect((await stopping.app.inject({ url: '/api/health/live' })).statusCode).toBe(200);
    await stopping.close();
  });
});

describe('a database that is away', () => {
  let lost: TestApp;
  beforeAll(async () => {
    lost = await createTestApp();
    await lost.database.drop();
  });
  afterAll(() => lost.close());

  it('makes the api not ready', async () => {
    expectProblem(await lost.app.inject({ url: '/api/health/ready' }), 503, 'try-again');
  });

  it('is answered with a time to wait and without details', async () => {
    const payload = { email: 'a@example.com', password: 'violet kettle on the roof' };
    const signIn = await lost.app.inject({ method: 'POST', url: '/api/auth/sign-in', payload });
    expectProblem(signIn, 503, 'try-again');
    expect(signIn.headers['retry-after']).toBe('1');
    expect(signIn.body).not.toMatch(/database|postgres|select/i);
  });
});
