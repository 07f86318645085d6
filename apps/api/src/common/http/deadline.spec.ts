import Fastify from 'fastify';
import { isUploadRoute, REQUEST_DEADLINE_MS, remainingMs, setDeadlines, UPLOAD_DEADLINE_MS } from './deadline';

describe('setDeadlines()', () => {
  it('tells the work of a request how long it has, longer for uploads, also behind a parsed body', async () => {
    const server = Fastify();
    setDeadlines(server);
    const tell = () => ({ leftMs: remainingMs() });
    server.get('/things', tell);
    server.post('/things', tell);
    server.post('/things/:id/photos', tell);
    const left = async (method: 'GET' | 'POST', url: string) => {
      const payload = method === 'POST' ? { payload: { a: 1 } } : {};
      return (await server.inject({ method, url, ...payload })).json<{ leftMs: number }>().leftMs;
    };
    for (const leftMs of [await left('GET', '/things'), await left('POST', '/things')]) {
      expect(leftMs).toBeGreaterThan(0);
      expect(leftMs).toBeLessThanOrEqual(REQUEST_DEADLINE_MS);
    }
    expect(await left('POST', '/things/1/photos')).toBeGreaterThan(REQUEST_DEADLINE_MS);
    expect(remainingMs()).toBeUndefined();
    await server.close();
  });

  it('ends a handler that outlives its route, and hands it a signal', async () => {
    const server = Fastify({ handlerTimeout: 20 });
    setDeadlines(server);
    let wasTold = false;
    server.get('/stuck', (request) => new Promise(() => request.signal.addEventListener('abort', () => (wasTold = true))));
    const answer = await server.inject({ url: '/stuck' });
    expect([answer.statusCode, answer.json<{ code: string }>().code, wasTold]).toEqual([503, 'FST_ERR_HANDLER_TIMEOUT', true]);
    await server.close();
  });
});

describe('isUploadRoute()', () => {
  it('means sending whole files, not reading them', () => {
    expect(isUploadRoute('POST', '/api/coupons/:couponId/photos')).toBe(true);
    expect(isUploadRoute('GET', '/api/coupons/:couponId/photos')).toBe(false);
    expect(isUploadRoute('POST', '/api/coupons')).toBe(false);
    expect(UPLOAD_DEADLINE_MS).toBeGreaterThan(REQUEST_DEADLINE_MS);
  });
});
