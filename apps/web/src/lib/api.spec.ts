import { fakeServer, problem } from '../testing/fake-server';
import { makeSessionAnswer } from '../testing/sessions';
import { request } from './api';
import { closeSession, currentAccessToken, openSession } from './session';

const REFRESH = 'POST /api/auth/refresh';
let server: ReturnType<typeof fakeServer>;

beforeEach(() => openSession({ ...makeSessionAnswer(), accessToken: 'old' }));
afterEach(() => {
  server.restore();
  closeSession('left');
});

const onlyWith =
  (token: string) =>
  ({ headers }: { headers: Headers }) =>
    headers.get('authorization') === `Bearer ${token}` ? { body: { ok: true } } : problem(401, 'not-signed-in', 'Sign in first');

describe('a request', () => {
  it('renews the session once for all requests that find the token too old, and repeats each with its body', async () => {
    server = fakeServer({
      [REFRESH]: () => ({ body: { ...makeSessionAnswer(), accessToken: 'new' } }),
      'GET /api/recipes': onlyWith('new'),
      'POST /api/coupons': onlyWith('new'),
    });
    const answers = await Promise.all([request('get', '/api/recipes'), request('post', '/api/coupons', { body: { rows: 8 } })]);
    expect(answers).toEqual([{ ok: true }, { ok: true }]);
    expect(server.bodies(REFRESH)).toHaveLength(1);
    expect(server.bodies('POST /api/coupons')).toEqual([{ rows: 8 }, { rows: 8 }]);
  });

  it('ends the session when it cannot be renewed, and does not try again and again', async () => {
    server = fakeServer({ [REFRESH]: () => problem(401, 'session-over', 'This session is over'), 'GET /api/recipes': onlyWith('new') });
    await expect(request('get', '/api/recipes')).rejects.toMatchObject({ status: 401, code: 'not-signed-in' });
    expect(currentAccessToken()).toBeUndefined();
    expect(server.requests).toHaveLength(2);
  });

  it('keeps the session when the server is in trouble while renewing it', async () => {
    server = fakeServer({ [REFRESH]: () => problem(503, 'unavailable', 'Try again'), 'GET /api/recipes': onlyWith('new') });
    await expect(request('get', '/api/recipes')).rejects.toMatchObject({ status: 401 });
    expect(currentAccessToken()).toBe('old');
  });

  it('sends version and idempotency key, and leaves empty query values out', async () => {
    server = fakeServer({ 'PATCH /api/shop': () => ({ body: {} }) });
    await request('patch', '/api/shop', { version: 3, idempotencyKey: 'k', body: {}, query: { q: '', state: 'draft', page: undefined } });
    const [sent] = server.requests;
    expect([sent?.headers.get('if-match'), sent?.headers.get('idempotency-key'), String(sent?.query)]).toEqual([
      '"v3"',
      'k',
      'state=draft',
    ]);
  });

  it('tells a lost connection from a refusal', async () => {
    server = fakeServer({});
    await expect(request('get', '/api/recipes')).rejects.toMatchObject({ status: 0, code: 'unreachable' });
  });
});
